import { data, type RouterContextProvider, redirect } from "react-router";
import { askedContext, type SignedIn, signedInOf } from "../context";
import type { Actor } from "../domain/actor";
import { problem } from "../http/problem";
import { authText } from "../text/en/auth";
import { signInPath } from "./next-path";
import { may, type Permission } from "./permissions";

type Context = Readonly<RouterContextProvider>;

/** Who is signed in. Signed out: pages go to the sign-in page and come back, the API answers 401. */
export function requireSignedIn(context: Context): SignedIn {
  const signedIn = signedInOf(context);
  if (signedIn) return signedIn;
  const asked = context.get(askedContext);
  if (asked.api) throw problem(401, "signed-out", { title: authText.signedOut });
  throw redirect(signInPath(asked.path));
}

/** The guard at the top of every loader and action: who acts, if they may. Wrong role: 403. */
export function requirePermission(context: Context, permission: Permission): Actor {
  const { actor } = requireSignedIn(context);
  if (may(actor, permission)) return actor;
  if (context.get(askedContext).api) {
    throw problem(403, "not-allowed", { title: authText.notAllowed });
  }
  throw data({ code: "not-allowed" }, { status: 403 });
}
