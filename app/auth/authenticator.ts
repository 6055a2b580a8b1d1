import { randomBytes } from "node:crypto";
import { Authenticator } from "remix-auth";
import { Strategy } from "remix-auth/strategy";
import { TOTPStrategy } from "remix-auth-totp";
import type { Db } from "../db/client";
import type { Result } from "../domain/refusals";
import { CODE_LASTS, issueCode } from "./codes/issue-code";
import { redeemCode } from "./codes/redeem-code";
import type { Started } from "./sessions/start-session";

/** Where a sign-in happens: this browser, on this server, now. */
export interface SignInAt {
  db: Db;
  secret: string;
  browser: string;
  now: Date;
}

export interface Redemption {
  code: string;
  device: string;
  previousToken: string | null;
}

type Outcome = Result<Started>;

/** Judges a typed code by `sign_in_codes`. It is given no cookie, so none can sway it. */
class TableStrategy extends Strategy<Outcome, string> {
  name = "table";
  async authenticate(request: Request): Promise<Outcome> {
    const form = await request.formData();
    return this.verify(String(form.get("code") ?? ""));
  }
}

/** The strategies see a form of ours and none of the browser's cookies. */
function formRequest(field: "email" | "code", value: string): Request {
  const body = new FormData();
  body.set(field, value);
  return new Request("https://sign-in.invalid/", { method: "POST", body });
}

/**
 * Makes a six-digit code through the one-time-password strategy and hands it to the table and the
 * outbox. The strategy's own cookie (unsigned: address, sealed secret) and its magic link are
 * thrown away with the key they were sealed under.
 */
export async function sendCode(at: SignInAt, email: string): Promise<void> {
  const { db, secret, browser, now } = at;
  const gone = "/";
  let issued: Promise<void> | null = null;
  const maker = new TOTPStrategy<Outcome>(
    {
      secret: randomBytes(32).toString("hex"),
      emailSentRedirect: gone,
      successRedirect: gone,
      failureRedirect: gone,
      totpGeneration: { charSet: "0123456789", digits: 6, period: CODE_LASTS / 1000 },
      sendTOTP: ({ code }) => {
        issued = issueCode(db, { email, browser, code, secret }, now);
        return issued;
      },
    },
    () => Promise.reject(new Error("this strategy makes codes and judges none")),
  );
  const authenticator = new Authenticator<Outcome>().use(maker);
  try {
    await authenticator.authenticate(maker.name, formRequest("email", email));
  } catch (answer) {
    // It ends in a redirect whether or not the code went out.
    if (!(answer instanceof Response)) throw answer;
  }
  if (issued === null) throw new Error("the strategy made no code");
  await issued;
}

/** Judges a typed code; a right one starts a session for the address its row names. */
export function redeem(at: SignInAt, sent: Redemption): Promise<Outcome> {
  const judge = new TableStrategy((code) =>
    redeemCode(at.db, { ...sent, code, browser: at.browser, secret: at.secret }, at.now),
  );
  const authenticator = new Authenticator<Outcome>().use(judge);
  return authenticator.authenticate(judge.name, formRequest("code", sent.code));
}
