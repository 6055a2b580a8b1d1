export const apiText = {
  method: "This address does not take that method.",
  notJson: "The body is not JSON.",
  photoUnknown: "No record here promised this picture.",
  photoType: "Send a JPEG, PNG or WebP picture.",
  photoHash: "The picture that came is not the one the record promised.",
  photoStoreAway: "The picture store does not answer. Keep the picture and send it again.",
} as const;
