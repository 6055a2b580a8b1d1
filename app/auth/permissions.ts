import type { Actor, Role } from "../domain/actor";

/** Who may do what: one table, read by the server at every loader and action and by the screens. */
const PERMISSIONS = {
  "walk.read": ["driver", "mechanic", "dispatcher", "manager"],
  "walk.sign": ["driver"],
  "acknowledgement.sign": ["driver"],
  "photo.put": ["driver", "mechanic"],
  "photo.read": ["driver", "mechanic", "dispatcher", "manager"],
  "truck.read": ["driver", "mechanic", "dispatcher", "manager"],
  "truck.manage": ["manager"],
  "bench.read": ["mechanic", "manager"],
  "tag.sign-off": ["mechanic", "manager", "driver"],
  "run-limit.sign": ["mechanic", "manager"],
  "round.record": ["mechanic"],
  "board.read": ["dispatcher", "mechanic", "manager"],
  "handover.make": ["dispatcher"],
  "people.manage": ["manager"],
  "policy.manage": ["manager"],
  "account.own": ["driver", "mechanic", "dispatcher", "manager"],
} as const satisfies Record<string, readonly Role[]>;

export type Permission = keyof typeof PERMISSIONS;

/** May this person do this? A permission opens a screen or a command; K10 decides on the tag itself. */
export function may(actor: Pick<Actor, "roles">, permission: Permission): boolean {
  const allowed: readonly Role[] = PERMISSIONS[permission];
  return actor.roles.some((role) => allowed.includes(role));
}
