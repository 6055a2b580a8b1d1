import type { runLimits, tagChanges } from "../../db/schema/tags";

type Change = typeof tagChanges.$inferSelect;
type Leave = typeof runLimits.$inferSelect;

/**
 * The newest "worse" of a tag and the leave to run that is in force, from rows in order of time.
 * A tag found worse after the leave was signed ends that leave.
 */
export function asItHangs(
  tagId: string,
  changes: readonly Change[],
  leaves: readonly Leave[],
): { worse: Change | null; leave: Leave | null } {
  const worse = changes.filter((one) => one.tagId === tagId && one.seen === "worse").at(-1);
  const newest = leaves.filter((one) => one.tagId === tagId).at(-1);
  const stands = newest && (!worse || newest.signedAt > worse.changedAt);
  return { worse: worse ?? null, leave: stands ? newest : null };
}
