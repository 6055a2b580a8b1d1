import { redirect } from "react-router";
import { clearToken, SESSION_COOKIE } from "~/auth/cookies";
import { dbOf, signedInOf } from "~/context";
import { revokeSession } from "~/domain/people/own-sessions";
import type { Route } from "./+types/sign-out";

/** Nothing to read here: somebody followed an old address. */
export function loader() {
  return redirect("/");
}

/** Ends the session in the table, so that a copied cookie ends too. */
export async function action({ context }: Route.ActionArgs) {
  const signedIn = signedInOf(context);
  if (signedIn) {
    const { actor, sessionId } = signedIn;
    await revokeSession(dbOf(context), actor, { sessionId });
  }
  return redirect("/sign-in", { headers: { "Set-Cookie": await clearToken(SESSION_COOKIE) } });
}
