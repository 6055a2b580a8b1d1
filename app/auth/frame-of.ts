import type { RouterContextProvider } from "react-router";
import { loop } from "../text/en/loop";
import { may, type Permission } from "./permissions";
import { requireSignedIn } from "./require-permission";

const PLACES: { to: string; label: string; needs: Permission }[] = [
  { to: "/walk", label: loop.places.walk, needs: "walk.sign" },
  { to: "/bench", label: loop.places.bench, needs: "bench.read" },
  { to: "/board", label: loop.places.board, needs: "board.read" },
  { to: "/office", label: loop.places.office, needs: "truck.manage" },
];

/** Who is signed in and which places the permission table opens to them. */
export function frameOf(context: Readonly<RouterContextProvider>) {
  const { actor, carrierName } = requireSignedIn(context);
  return {
    name: actor.name,
    carrier: carrierName,
    places: PLACES.filter(({ needs }) => may(actor, needs)).map(({ to, label }) => ({ to, label })),
  };
}
