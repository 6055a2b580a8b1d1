import { z } from "zod";
import { ROLES } from "../../domain/actor";

/** What each template needs. Checked again when the row is read. */
export const MAIL_PROPS = {
  "sign-in-code": z.object({ code: z.string() }),
  invitation: z.object({
    carrierName: z.string(),
    invitedBy: z.string(),
    roles: z.array(z.enum(ROLES)),
    path: z.string(),
  }),
  "red-tag": z.object({ unitNumber: z.string(), title: z.string() }),
  "key-freed": z.object({ unitNumber: z.string(), title: z.string() }),
} as const;

export type Template = keyof typeof MAIL_PROPS;
export type MailProps = { [T in Template]: z.infer<(typeof MAIL_PROPS)[T]> };

/** Templates whose props open a door: a code, a link. Blanked as soon as the mail is gone or given up. */
export const HOLDS_SECRET: Record<Template, boolean> = {
  "sign-in-code": true,
  invitation: true,
  "red-tag": false,
  "key-freed": false,
};
