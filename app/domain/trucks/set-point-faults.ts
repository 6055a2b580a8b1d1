import type { SetPointFault } from "../../trade/set-points";
import { unitsOf } from "../../trade/units";
import type { FieldFault } from "../refusals";
import { figures } from "./fitting-attributes";

function pressureUnits(): string {
  return unitsOf("pressure").join(", ");
}

/** What is wrong with a set point, as faults of the fields typed in `unit`. */
export function setPointFaults(faults: readonly SetPointFault[], unit: string): FieldFault[] {
  return faults.map((fault) => faultOf(fault, unit));
}

function faultOf(fault: SetPointFault, unit: string): FieldFault {
  const pointer = `/${fault.field}`;
  switch (fault.code) {
    case "unknown-reading":
      return { pointer, code: "reading-unknown" };
    case "unknown-unit":
      return { pointer, code: "unknown-unit", values: { units: pressureUnits() } };
    case "wrong-unit":
      return {
        pointer,
        code: "wrong-unit",
        values: { unit, units: unitsOf(fault.expected).join(", ") },
      };
    case "not-a-positive-number":
      return { pointer, code: fault.code };
    case "over-limit":
      return {
        pointer,
        code: fault.code,
        values: { by: fault.by, limit: figures(fault.limit), unit },
      };
    case "under-plate":
      return { pointer, code: fault.code, values: { limit: figures(fault.limit), unit } };
    case "band-leaves-out-set-point": {
      const code = fault.field === "low" ? "low-over-set-point" : "high-under-set-point";
      return { pointer, code, values: { setPoint: fault.setPoint, unit } };
    }
    case "stop-below-band":
      return { pointer, code: fault.code, values: { high: fault.high, unit } };
  }
}
