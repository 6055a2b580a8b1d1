import { z } from "zod";
import type { Db } from "~/db/client";
import type { Actor } from "~/domain/actor";
import { changeMembership } from "~/domain/people/change-membership";
import { deactivatePerson } from "~/domain/people/deactivate-person";
import { endSessions } from "~/domain/people/end-sessions";
import { membershipSchema } from "~/domain/people/person-input";
import { reactivatePerson } from "~/domain/people/reactivate-person";

const that = (intent: "deactivate" | "reactivate" | "end-sessions") =>
  z.object({ intent: z.literal(intent), personId: z.uuid() });

/** Everything the page of a person can ask for. */
export const personIntents = z.discriminatedUnion("intent", [
  that("deactivate"),
  that("reactivate"),
  that("end-sessions"),
  membershipSchema.safeExtend({ intent: z.literal("change") }),
]);

/** Runs what was asked; `note` names what the list then says about it. */
export async function runPersonIntent(db: Db, actor: Actor, input: z.infer<typeof personIntents>) {
  switch (input.intent) {
    case "change":
      return { done: await changeMembership(db, actor, input), note: "person" };
    case "deactivate":
      return { done: await deactivatePerson(db, actor, input), note: "deactivated" };
    case "reactivate":
      return { done: await reactivatePerson(db, actor, input), note: "reactivated" };
    case "end-sessions":
      return { done: await endSessions(db, actor, input), note: "sessions-ended" };
  }
}
