export const authText = {
  signedOut: "Sign in first.",
  notAllowed: "Your role does not open this. Ask your manager.",
  crossSite: "This came from another site. Open Keypeg and send it from there.",
} as const;

export const doorText = {
  motto: "The key stays on the peg until the truck is right.",
} as const;

export const signInText = {
  metaTitle: "Sign in · Keypeg",
  title: "Sign in",
  emailLabel: "E-mail address",
  emailHint: "The address your firm invited. We send it a six-digit code; there is no password.",
  send: "Send the code",
  sending: "Sending the code…",

  codeTitle: "Type the code",
  sentTo: (email: string) => `If ${email} belongs to somebody here, a code is on its way to it.`,
  codeLabel: "Six-digit code",
  codeHint: "It works for ten minutes, in this browser only.",
  signIn: "Sign in",
  checking: "Checking the code…",
  again: "Send a new code",
  change: "Use another address",
  notThere: "No mail after a minute? Look under spam, then send a new code.",
} as const;

export const invitationText = {
  metaTitle: "Invitation · Keypeg",
  title: (carrier: string) => `Join ${carrier}`,
  offer: (inviter: string, carrier: string, roles: string) =>
    `${inviter} added you at ${carrier} as ${roles}.`,
  address: "Your address here",
  name: "Your name here",
  after: "Joining sends a six-digit code to that address. Type it to sign in.",
  accept: "Join and send the code",
  accepting: "Joining…",
  acceptedTitle: "You have joined already",
  accepted: (carrier: string) => `This invitation to ${carrier} was taken up. Sign in with a code.`,
  endedTitle: "This invitation has ended",
  ended:
    "It was taken back, replaced by a newer one, or is older than seven days. Ask whoever sent it for a new one.",
  unknownTitle: "No invitation here",
  unknown: "The link is not whole. Open it from the mail again, or ask for a new invitation.",
  signIn: "Sign in",
} as const;
