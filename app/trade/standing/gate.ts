import { LIMIT_BITS, type Limit, type NeedsMask } from "../limits";
import type { StandingFacts, StandingPolicy } from "./facts";
import { type Reason, standing } from "./standing";

/** Why the key stays on the peg for this driver and these needs. */
export type GateReason =
  | Exclude<Reason, { code: "walk-due" } | { code: "not-acknowledged" } | { code: "limit" }>
  | { code: "already-out" }
  | { code: "driver-has-no-walk" }
  | { code: "driver-has-not-acknowledged"; count: number }
  | { code: "need-unanswered"; need: "mask" | "vacuum" | "fill" | "hose" }
  | { code: "limit-against-need"; limit: Limit }
  | { code: "not-built-for"; limit: Limit }
  | { code: "over-tank"; tankL: number };

function against(limit: Limit, needs: NeedsMask): boolean {
  switch (limit.kind) {
    case "vacuum-no-deeper":
      return (needs.vacuumPa ?? 0) > Math.round(limit.vacuumPa);
    case "fill-no-more":
      return (needs.fillL ?? 0) > Math.round(limit.fillL);
    case "hose-no-longer":
      return (needs.hoseMm ?? 0) > Math.round(limit.hoseM * 1000);
    default:
      return ((needs.mask ?? 0) & LIMIT_BITS[limit.kind]) !== 0;
  }
}

function needReasons(
  limits: readonly Limit[],
  { tankL, cannot }: StandingFacts,
  needs: NeedsMask,
): GateReason[] {
  const reasons: GateReason[] = [];
  if (needs.mask === null) reasons.push({ code: "need-unanswered", need: "mask" });
  if (needs.vacuumPa === null) reasons.push({ code: "need-unanswered", need: "vacuum" });
  if (needs.fillL === null) reasons.push({ code: "need-unanswered", need: "fill" });
  if (needs.hoseMm === null) reasons.push({ code: "need-unanswered", need: "hose" });
  for (const limit of limits) {
    if (against(limit, needs)) reasons.push({ code: "limit-against-need", limit });
  }
  for (const limit of cannot) {
    if (against(limit, needs)) reasons.push({ code: "not-built-for", limit });
  }
  if (tankL !== null && needs.fillL !== null && needs.fillL > Math.round(tankL)) {
    reasons.push({ code: "over-tank", tankL });
  }
  return reasons;
}

/**
 * Every reason against handing this truck's key to this driver for these needs at `now`
 * (ms UTC); empty when K1 holds. `ignoreHandover` is the handover being decided: it does
 * not stand in its own way.
 */
export function gateReasons(
  facts: StandingFacts,
  policy: StandingPolicy,
  ask: { driverId: string; needs: NeedsMask; ignoreHandover?: string },
  now: number,
): GateReason[] {
  const state = standing(facts, policy, now);
  const reasons: GateReason[] = [];
  for (const reason of state.reasons) {
    if (reason.code === "walk-due" || reason.code === "not-acknowledged") continue;
    if (reason.code !== "limit") reasons.push(reason);
  }
  if (facts.out && facts.out.handoverId !== ask.ignoreHandover)
    reasons.push({ code: "already-out" });
  const own = state.clearances.find((clearance) => clearance.driverId === ask.driverId);
  if (!own || own.validUntil <= now) reasons.push({ code: "driver-has-no-walk" });
  else if (own.unseen.length > 0) {
    reasons.push({ code: "driver-has-not-acknowledged", count: own.unseen.length });
  }
  return [...reasons, ...needReasons(state.limits, facts, ask.needs)];
}
