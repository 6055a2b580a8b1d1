import type { Actor } from "../actor";
import type { PolicySettings } from "../policy/settings";
import type { RefusalCode } from "../refusals";

/** What K10 needs to know of a tag. */
export interface SignableTag {
  kind: "defect" | "not-satisfied";
  colour: "white" | "yellow" | "red";
  raisedBy: string;
  /** Raised on a driver's walk, not at the bench. */
  fromWalk: boolean;
  roadSafety: boolean;
  driverFix: boolean;
  remote: boolean;
  /** Who signed the sign-off that the driver was not satisfied with. */
  disputedSigner: string | null;
}

/**
 * K10: may this person end this tag? Null when they may, else the refusal.
 * A driver ends only what is on the driver-fix list, where the carrier allows it; a red tag of
 * their own otherwise never. Dispatchers never sign off. From photos only where the check allows.
 */
export function whySignerMayNot(
  actor: Actor,
  tag: SignableTag,
  policy: Pick<PolicySettings, "driverFix" | "twoPeople">,
  remote: boolean,
): RefusalCode | null {
  const own = tag.raisedBy === actor.personId;
  const certifies =
    actor.certifier &&
    (actor.roles.includes("mechanic") ||
      actor.roles.includes("manager") ||
      actor.roles.includes("driver"));
  const fixes = actor.roles.includes("driver") && tag.driverFix && policy.driverFix && !remote;
  if (own && tag.fromWalk && tag.colour === "red" && !fixes) return "own-red-tag";
  if (!certifies && !fixes) return "not-allowed";
  if (tag.disputedSigner === actor.personId) return "second-certifier";
  if (tag.kind === "not-satisfied" && own) return "own-red-tag";
  if (own && policy.twoPeople && !fixes) return "two-people";
  if (remote && (!tag.remote || tag.roadSafety)) return "not-from-photos";
  return null;
}
