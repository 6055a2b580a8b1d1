import nodemailer, { type Transporter } from "nodemailer";
import { config } from "../config";

export interface Mail {
  to: string;
  subject: string;
  html: string;
  text: string;
  /** Same id for the same mail, so that a mail sent twice can be recognised. */
  messageId: string;
}

let transport: Transporter | null = null;

/** Sends one mail over SMTP. Throws when the server does not take it. */
export async function sendMail(mail: Mail): Promise<void> {
  transport ??= nodemailer.createTransport(config().smtpUrl);
  await transport.sendMail({ from: config().mailFrom, ...mail });
}
