import type { Role } from "../../domain/actor";

export const roleText: Record<Role, string> = {
  driver: "Driver",
  mechanic: "Mechanic",
  dispatcher: "Dispatcher",
  manager: "Manager",
};

/** "driver and mechanic" */
export function roleList(roles: readonly Role[]): string {
  return new Intl.ListFormat("en-US").format(roles.map((role) => roleText[role].toLowerCase()));
}
