import type { Actor, Role } from "../domain/actor";
import { ROLES } from "../domain/actor";

const PLACES: Record<Role, string> = {
  driver: "/walk",
  mechanic: "/bench",
  dispatcher: "/board",
  manager: "/office",
};

/** Where a person's day starts: the place of the first of their roles. */
export function firstPlace(actor: Pick<Actor, "roles">): string {
  const role = ROLES.find((candidate) => actor.roles.includes(candidate));
  return role ? PLACES[role] : "/account";
}
