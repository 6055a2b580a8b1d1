export const authText = {
  signedOut: "Sign in first.",
  notAllowed: "Your role does not open this. Ask your manager.",
  crossSite: "This came from another site. Open Keypeg and send it from there.",
} as const;
