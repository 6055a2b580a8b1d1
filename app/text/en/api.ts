export const apiText = {
  method: "This address does not take that method.",
  notJson: "The body is not JSON.",
  photoType: "Send a JPEG, PNG or WebP picture.",
  photoHash: "The picture that came is not the one the record promised.",
  photoBroken: "This picture cannot be read. Take it again.",
  photoStore: "The picture could not be kept just now. It will be sent again.",
} as const;
