import { v7 as uuidv7 } from "uuid";
import type { Db } from "../../db/client";
import { audit } from "../../db/schema/people";
import type { Actor } from "../actor";

/** Who changed what in the setup of trucks and yards. */
export async function writeSetupAudit(
  tx: Db,
  actor: Actor,
  at: Date,
  action: string,
  subjectId: string,
  detail: unknown = null,
): Promise<void> {
  await tx.insert(audit).values({
    carrierId: actor.carrierId,
    id: uuidv7(),
    at,
    actorId: actor.personId,
    action,
    subjectId,
    detail,
  });
}
