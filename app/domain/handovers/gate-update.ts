import { sql } from "drizzle-orm";
import type { Db } from "../../db/client";
import { uuidBytes } from "../../db/columns";
import type { NeedsMask } from "../../trade/limits";

export interface GateAsk {
  carrierId: string;
  truckId: string;
  driverId: string;
  handoverId: string;
  policyVersion: number;
  needs: NeedsMask;
}

/**
 * The gate: the verdict is the WHERE of this UPDATE, and it is the first statement of its
 * transaction. True when the key may leave the peg. An unanswered need is NULL, and
 * comparing with NULL refuses.
 */
export async function tryGate(tx: Db, ask: GateAsk, now: Date): Promise<boolean> {
  const { needs } = ask;
  const [result] = await tx.execute(sql`
UPDATE trucks t SET gate_seq = gate_seq + 1, out_handover = ${uuidBytes(ask.handoverId)}
WHERE t.carrier_id = ${uuidBytes(ask.carrierId)} AND t.id = ${uuidBytes(ask.truckId)}
  AND t.policy_version = ${ask.policyVersion}
  AND t.in_service AND t.gate_fault IS NULL AND t.out_handover IS NULL AND t.open_reds = 0
  AND (t.yellow_block_at IS NULL OR t.yellow_block_at > ${now})
  AND (t.tests_block_at IS NULL OR t.tests_block_at > ${now})
  AND (t.rounds_block_at IS NULL OR t.rounds_block_at > ${now})
  AND (t.rounds_block_hours IS NULL OR t.pump_hours < t.rounds_block_hours)
  AND t.limits_mask & ${needs.mask} = 0
  AND (t.limit_vacuum_pa IS NULL OR t.limit_vacuum_pa >= ${needs.vacuumPa}) AND ${needs.vacuumPa} IS NOT NULL
  AND (t.limit_fill_l IS NULL OR t.limit_fill_l >= ${needs.fillL}) AND ${needs.fillL} IS NOT NULL
  AND (t.limit_hose_mm IS NULL OR t.limit_hose_mm >= ${needs.hoseMm}) AND ${needs.hoseMm} IS NOT NULL
  AND EXISTS (SELECT 1 FROM clearances c WHERE c.carrier_id = t.carrier_id AND c.truck_id = t.id
    AND c.driver_id = ${uuidBytes(ask.driverId)} AND c.tags_seq = t.tags_seq AND c.valid_until > ${now})`);
  return (result as { affectedRows: number }).affectedRows === 1;
}
