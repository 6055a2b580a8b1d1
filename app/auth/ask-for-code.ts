import type { RouterContextProvider } from "react-router";
import { config } from "../config";
import { clientOf, databaseOf } from "../context";
import { refuse } from "../domain/refusals";
import { makeToken } from "../domain/tokens";
import { systemClock } from "../services/clock";
import { sendCode } from "./authenticator";
import { takeSend } from "./codes/send-limits";
import { BROWSER_COOKIE, readToken, setToken } from "./cookies";

type Context = Readonly<RouterContextProvider>;

/**
 * Sends a code to an address for the browser behind this request. Answers the cookie to set, or
 * the refusal when too many were asked for; both are the same for addresses nobody here has.
 */
export async function askForCode(request: Request, context: Context, email: string) {
  const database = databaseOf(context);
  const { secret } = config();
  const clientAddress = clientOf(context).address;
  const wait = await takeSend(database, { email, clientAddress, secret });
  if (wait !== null) {
    const fault = { pointer: "/email", code: "too-many-codes", values: { minutes: wait } };
    return refuse("invalid", { fields: [fault] });
  }
  const browser = (await readToken(request, BROWSER_COOKIE)) ?? makeToken();
  await sendCode({ db: database.db, secret, browser, now: systemClock.now() }, email);
  return { ok: true as const, cookie: await setToken(BROWSER_COOKIE, browser) };
}
