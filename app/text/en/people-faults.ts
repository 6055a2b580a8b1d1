import type { FaultValues } from "../../domain/refusals";

function tries(values: FaultValues): string {
  return values.triesLeft === 1 ? "One try is left." : `${values.triesLeft} tries are left.`;
}

/** What is wrong with a field of a person, an invitation or a sign-in, and how to put it right. */
export const PEOPLE_FAULTS: Record<string, string | ((values: FaultValues) => string)> = {
  "email-form": "Type an e-mail address, such as sam@firm.com.",
  "person-name": "Type the person's name, from 2 to 80 letters.",
  "roles-empty": "Choose at least one role.",
  "certifier-role": "A dispatcher alone cannot certify. Add a second role, or take this off.",
  "on-call-place": "Choose a place in the line from the list.",
  "already-member": "This person works here already. Change their roles in the list instead.",
  "member-deactivated": "This person was deactivated. Reactivate them in the list instead.",
  "carrier-name": "Type the carrier's name, from 2 to 120 letters.",
  elevation: "Type the elevation in meters, from -430 to 5100.",

  "code-form": "Type the six digits from the mail.",
  "code-wrong": (values) => `That is not the code we sent. Look again. ${tries(values)}`,
  "code-out-of-tries": "Five wrong codes: this one no longer works. Ask for a new code.",
  "code-expired": "This code is older than ten minutes. Ask for a new code.",
  "code-used": "This code was used or replaced by a newer one. Ask for a new code.",
  "code-none": "No code was asked for in this browser. Type your address first.",
  "too-many-codes": ({ minutes = 60 }) =>
    `Too many codes were asked for. Use the last one sent, or wait ${minutes} minutes.`,
};
