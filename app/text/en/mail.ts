import type { MailProps } from "../../services/mail/mail-props";
import { roleList } from "./roles";

export interface MailWords {
  subject: string;
  /** The line a mail program shows beside the subject. */
  preview: string;
  heading: string;
  before: string[];
  code?: string;
  action?: { label: string; path: string };
  after: string[];
}

/** A tag's title, whose one machine-made value has words of its own. */
function tagTitle(title: string): string {
  return title === "not-satisfied" ? "the next driver is not satisfied with a sign-off" : title;
}

/** Every mail Keypeg sends, as words. HTML and plain text are both made from these. */
export const mailText: { [T in keyof MailProps]: (props: MailProps[T]) => MailWords } = {
  "sign-in-code": ({ code }) => ({
    subject: `${code} is your Keypeg code`,
    preview: "It works for ten minutes, in the browser that asked for it.",
    heading: "Your sign-in code",
    before: [
      "Type this code in the browser where you asked for it. It works for ten minutes, once.",
    ],
    code,
    after: [
      "Nobody at Keypeg or at your firm ever asks for this code.",
      "If you did not ask for it, do nothing: without the code nobody gets in.",
    ],
  }),
  invitation: ({ carrierName, invitedBy, roles, path }) => ({
    subject: `${carrierName} asks you to join on Keypeg`,
    preview: `${invitedBy} added you as ${roleList(roles)}.`,
    heading: `Join ${carrierName}`,
    before: [
      `${invitedBy} added you at ${carrierName} as ${roleList(roles)}.`,
      "Keypeg is where walkarounds, tags and keys are kept. There is no password: you sign in with a code sent to this address.",
    ],
    action: { label: "See the invitation", path },
    after: ["The invitation works for seven days, once. If you do not know the firm, do nothing."],
  }),
  "red-tag": ({ unitNumber, title }) => ({
    subject: `${unitNumber} is held: ${tagTitle(title)}`,
    preview: "The key stays on the peg until a certifier signs it off.",
    heading: `${unitNumber} is held`,
    before: [
      `Red tag: ${tagTitle(title)}.`,
      "The key stays on the peg until a certifier signs it off and the driver acknowledges it.",
    ],
    action: { label: "Open Keypeg", path: "/" },
    after: [],
  }),
  "key-freed": ({ unitNumber, title }) => ({
    subject: `${unitNumber}: no red tag holds the key now`,
    preview: `Signed off: ${tagTitle(title)}.`,
    heading: `${unitNumber}: no red tag holds the key now`,
    before: [
      `Signed off: ${tagTitle(title)}.`,
      "The driver reads the sign-off and acknowledges it; then the key may come off the peg.",
    ],
    action: { label: "Open Keypeg", path: "/" },
    after: [],
  }),
};

export const mailFooter =
  "Keypeg: the key stays on the peg until the truck is right. This mail was sent by a machine; answers to it are not read.";
