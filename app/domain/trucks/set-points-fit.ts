import type { Db } from "../../db/client";
import { judgeSetPoint, type SetPointFault } from "../../trade/set-points";
import type { TruckKey } from "../gate/read-facts";
import type { FieldFault } from "../refusals";
import type { AmountName } from "./fitting-fields";
import { readFittings, readSetPointRows, type SetPointRow } from "./read-setup";

const PLATE_FIELD: Readonly<Record<string, AmountName>> = {
  "vacuum-relief": "maxVacuumPa",
  "pressure-relief": "maxPressurePa",
  "pump-speed": "maxRpm",
};

function faultOf(row: SetPointRow, fault: SetPointFault): FieldFault | null {
  const value =
    fault.field in row.entered ? row.entered[fault.field as keyof typeof row.entered] : null;
  const values = { what: row.reading, value: `${value ?? row.entered.setPoint} ${row.unit}` };
  if (fault.code === "over-limit") {
    const name = PLATE_FIELD[row.reading];
    return name
      ? {
          pointer: `/attributes/${name}/value`,
          code: "set-point-over-plate",
          values: { ...values, by: fault.by },
        }
      : null;
  }
  if (fault.code !== "under-plate") return null;
  return { pointer: "/attributes/minRpm/value", code: "set-point-under-plate", values };
}

/** The set points in force that the plates no longer allow, as faults of the plate just typed. */
export async function setPointsOffPlate(tx: Db, key: TruckKey): Promise<FieldFault[]> {
  const fitted = await readFittings(tx, key);
  const rows = await readSetPointRows(tx, key);
  return rows.flatMap((row) => {
    const input = { reading: row.reading, unit: row.unit, ...row.entered };
    // The yard's height only ever warns, so any will do.
    const verdict = judgeSetPoint(input, fitted, { elevationM: 0 });
    if (verdict.ok) return [];
    const faults = verdict.faults.flatMap((fault) => faultOf(row, fault) ?? []);
    return faults.slice(0, 1);
  });
}
