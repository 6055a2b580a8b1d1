import { and, eq } from "drizzle-orm";
import type { Db } from "../../db/client";
import { carriers, policies } from "../../db/schema/carriers";
import { type PolicySettings, policySettings } from "./settings";

export interface Policy {
  version: number;
  settings: PolicySettings;
}

/** The carrier's policy in force. Settings added since it was stored take their defaults. */
export async function readPolicy(db: Db, carrierId: string): Promise<Policy> {
  const [row] = await db
    .select({ version: policies.version, settings: policies.settings })
    .from(carriers)
    .innerJoin(
      policies,
      and(eq(policies.carrierId, carriers.id), eq(policies.version, carriers.policyVersion)),
    )
    .where(eq(carriers.id, carrierId));
  if (!row) throw new Error("carrier without a policy");
  return { version: row.version, settings: policySettings.parse(row.settings) };
}
