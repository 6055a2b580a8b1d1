import type { FaultValues, RefusalCode } from "../../domain/refusals";
import { API_FAULTS } from "./api-faults";
import { PEOPLE_FAULTS } from "./people-faults";
import { SETUP_FAULTS } from "./setup-faults";

const TITLES: Record<RefusalCode, string> = {
  "not-found": "There is no such record here.",
  "not-allowed": "You may not do this.",
  invalid: "Some of this needs another look.",
  "same-id-other-body": "This was already sent with other content. Both are kept for the office.",
  "in-progress": "This is still being worked on. Try again in a moment.",
  "not-clear": "The key stays on the peg.",
  "already-ended": "This has already been ended.",
  "own-red-tag": "Whoever raised a red tag does not sign it off. Ask a certifier.",
  "second-certifier":
    "The driver was not satisfied with your sign-off. A second certifier must look.",
  "two-people": "Your firm asks for a second person: whoever found it does not sign it off.",
  "not-from-photos": "This one is signed off at the truck, not from photos.",
  "nothing-to-limit": "Only a yellow tag can run under a limit.",
  "last-manager": "Somebody must stay manager here. Make another person manager first.",
  "invitation-ended": "This invitation has ended. Ask whoever sent it for a new one.",
  stale: "The truck changed while you were looking. Look again.",
};

type Words = string | ((values: FaultValues) => string);

const FIELDS: Record<string, Words> = {
  ...API_FAULTS,
  ...SETUP_FAULTS,
  ...PEOPLE_FAULTS,
  "choose-one": "Choose one.",
  "fill-in": "Fill this in.",
  "too-long": "That is too long. Shorten it.",
  "too-large": "That is more than can be. Type a smaller number.",
  "zero-or-more": "Type 0 or a larger number.",
  "above-zero": "Type a number above 0.",
  "signature-empty": "Type your name to sign.",
  "reason-empty": "Say why no repair is needed.",
  "run-name-empty": "Name the run.",
  "date-past": "Choose today or a later day.",
  "date-future": "Choose today or an earlier day.",
  "unknown-walk": "That walk is not on this truck.",
  "unknown-tag": "This photo names a tag that is not in the walk.",
  "too-many-photos": "Six photos a tag at most.",
  "takeover-needs-base": "A takeover names the walk it takes over; other walks name none.",
  "not-a-sha256": "Send the SHA-256 as 64 hex digits.",
};

/** Words for refusals: one table for commands, one for fields. */
export const refusalText = {
  title: (code: RefusalCode): string => TITLES[code],
  /** Is this a field's fault that there are words for? */
  knows: (code: string): boolean => Object.hasOwn(FIELDS, code),
  field: (code: string, values: FaultValues = {}): string => {
    const words = FIELDS[code] ?? code;
    return typeof words === "function" ? words(values) : words;
  },
};
