import { redirect } from "react-router";
import { firstPlace } from "~/auth/first-place";
import { signedInOf } from "~/context";
import type { Route } from "./+types/home";

/** The bare address leads to where one's day starts, or to the door. */
export function loader({ context }: Route.LoaderArgs) {
  const signedIn = signedInOf(context);
  return redirect(signedIn ? firstPlace(signedIn.actor) : "/sign-in");
}
