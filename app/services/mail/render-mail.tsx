import { render } from "@react-email/components";
import { type MailWords, mailFooter, mailText } from "../../text/en/mail";
import { MailLayout } from "./mail-layout";
import { MAIL_PROPS, type Template } from "./mail-props";

export interface RenderedMail {
  subject: string;
  html: string;
  text: string;
}

function wordsOf<T extends Template>(template: T, props: unknown): MailWords {
  const words: (props: never) => MailWords = mailText[template];
  return words(MAIL_PROPS[template].parse(props) as never);
}

function plainText(words: MailWords, origin: string): string {
  const action = words.action ? [`${words.action.label}: ${origin}${words.action.path}`] : [];
  const code = words.code ? [words.code] : [];
  const lines = [words.heading, ...words.before, ...code, ...action, ...words.after];
  return `${[...lines, `-- \n${mailFooter}`].join("\n\n")}\n`;
}

/** One mail as HTML and as plain text, both from the same words. Throws when the props do not fit. */
export async function renderMail(
  template: Template,
  props: unknown,
  origin: string,
): Promise<RenderedMail> {
  const words = wordsOf(template, props);
  return {
    subject: words.subject,
    html: await render(<MailLayout words={words} origin={origin} />),
    text: plainText(words, origin),
  };
}
