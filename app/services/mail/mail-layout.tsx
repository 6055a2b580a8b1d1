import {
  Body,
  Button,
  Container,
  Head,
  Heading,
  Hr,
  Html,
  Preview,
  Section,
  Text,
} from "@react-email/components";
import { type MailWords, mailFooter } from "../../text/en/mail";

const INK = "#1B2420";
const FACE = "'Atkinson Hyperlegible', Verdana, 'DejaVu Sans', sans-serif";

const styles = {
  body: {
    backgroundColor: "#F3EFE6",
    color: INK,
    fontFamily: FACE,
    margin: 0,
    padding: "24px 12px",
  },
  card: {
    backgroundColor: "#FFFDF8",
    border: "1px solid #D6CFBF",
    borderBottom: "6px solid #0E4A52",
    borderRadius: "10px",
    maxWidth: "520px",
    padding: "28px 28px 20px",
  },
  heading: { fontSize: "24px", lineHeight: "30px", margin: "0 0 16px" },
  text: { fontSize: "17px", lineHeight: "26px", margin: "0 0 14px" },
  code: {
    backgroundColor: "#F3EFE6",
    borderRadius: "8px",
    fontSize: "40px",
    fontWeight: 700,
    letterSpacing: "8px",
    lineHeight: "64px",
    margin: "0 0 18px",
    textAlign: "center",
  },
  button: {
    backgroundColor: "#0E4A52",
    borderRadius: "8px",
    color: "#FFFFFF",
    fontSize: "17px",
    fontWeight: 700,
    padding: "14px 22px",
  },
  rule: { borderColor: "#D6CFBF", margin: "24px 0 14px" },
  footer: { color: "#5C665F", fontSize: "14px", lineHeight: "20px", margin: 0 },
} as const;

/** The one layout every mail is set in. */
export function MailLayout({ words, origin }: { words: MailWords; origin: string }) {
  return (
    <Html lang="en-US">
      <Head />
      <Preview>{words.preview}</Preview>
      <Body style={styles.body}>
        <Container style={styles.card}>
          <Heading as="h1" style={styles.heading}>
            {words.heading}
          </Heading>
          {words.before.map((line) => (
            <Text key={line} style={styles.text}>
              {line}
            </Text>
          ))}
          {words.code && <Text style={styles.code}>{words.code}</Text>}
          {words.action && (
            <Section style={{ margin: "4px 0 20px" }}>
              <Button href={origin + words.action.path} style={styles.button}>
                {words.action.label}
              </Button>
            </Section>
          )}
          {words.after.map((line) => (
            <Text key={line} style={styles.text}>
              {line}
            </Text>
          ))}
          <Hr style={styles.rule} />
          <Text style={styles.footer}>{mailFooter}</Text>
        </Container>
      </Body>
    </Html>
  );
}
