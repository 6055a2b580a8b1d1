import { z } from "zod";
import { ROLES } from "../actor";
import { typedLine } from "../typed-line";

/** An e-mail address, lower-cased: one person, however it was typed. */
export const emailSchema = z
  .string({ error: "email-form" })
  .trim()
  .toLowerCase()
  .max(254, "email-form")
  .pipe(z.email({ error: "email-form" }));

export const personNameSchema = typedLine("person-name", 2, 80);

export const phoneSchema = z
  .string({ error: "phone-form" })
  .trim()
  .regex(/^[+()\d .-]{3,32}$/, "phone-form")
  .nullable()
  .default(null);

const place = {
  roles: z.array(z.enum(ROLES, { error: "roles-empty" })).min(1, "roles-empty"),
  certifier: z.boolean().default(false),
  yardId: z.uuid({ error: "yard-unknown" }).nullable().default(null),
};

/** Dispatchers never sign off (K10): a certifier is something else as well. */
function certifierHasRole(input: { roles: readonly string[]; certifier: boolean }): boolean {
  const { roles, certifier } = input;
  return !certifier || roles.length === 0 || roles.some((role) => role !== "dispatcher");
}
const certifierFault = { path: ["certifier"], error: "certifier-role" };

export const inviteSchema = z
  .object({ id: z.uuid(), email: emailSchema, name: personNameSchema, ...place })
  .refine(certifierHasRole, certifierFault);
export type InviteInput = z.infer<typeof inviteSchema>;

export const membershipSchema = z
  .object({
    personId: z.uuid(),
    ...place,
    /** Place in the line of those called: 1 is called first; null is never called. */
    onCall: z
      .int({ error: "on-call-place" })
      .min(1, "on-call-place")
      .max(99, "on-call-place")
      .nullable()
      .default(null),
  })
  .refine(certifierHasRole, certifierFault);
export type MembershipInput = z.infer<typeof membershipSchema>;
