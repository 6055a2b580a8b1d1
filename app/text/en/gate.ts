import type { Limit } from "../../trade/limits";
import type { GateReason } from "../../trade/standing/gate";
import type { Reason } from "../../trade/standing/standing";
import { fromSi } from "../../trade/units";

const inches = (pa: number) => `${Math.round(fromSi(pa, "inHg") * 10) / 10} inHg`;
const gallons = (liters: number) => `${Math.floor(fromSi(liters / 1000, "gal") + 0.1)} gal`;
const feet = (meters: number) => `${Math.floor(fromSi(meters, "ft") + 0.01)} ft`;

/** A limit in words, with its number. */
export function limitText(limit: Limit): string {
  switch (limit.kind) {
    case "no-pressure-off-load":
      return "No pressure off-load";
    case "no-vacuum-work":
      return "No vacuum work";
    case "no-towing":
      return "No towing";
    case "no-hazmat":
      return "No hazmat";
    case "vacuum-no-deeper":
      return `No vacuum work deeper than ${inches(limit.vacuumPa)}`;
    case "fill-no-more":
      return `Fill no more than ${gallons(limit.fillL)}`;
    case "hose-no-longer":
      return `Hose no longer than ${feet(limit.hoseM)}`;
  }
}

const DATED = (id: string) => id.replaceAll("-", " ");

/** What is due soon or overdue, and does not hold the key yet. */
export function warningText(kind: string): string {
  if (kind === "weekly" || kind === "monthly") return `The ${kind} round is overdue.`;
  if (kind === "weekly-shop") return "The shop's part of the weekly round is overdue.";
  return `Its date comes up soon: ${DATED(kind)}.`;
}

/** Why, and what would clear it. */
export interface Told {
  why: string;
  clears: string;
}

/** Every reason against a key in words: why it stays, and what clears it. */
export function reasonText(reason: Reason | GateReason): Told {
  switch (reason.code) {
    case "gate-fault":
      return {
        why: "The standing could not be worked out.",
        clears: "A manager looks at it and has it worked out anew.",
      };
    case "out-of-service":
      return { why: "Out of service.", clears: "A manager puts it back in service." };
    case "red-tag":
      return { why: `Red tag: ${tagTitle(reason.title)}`, clears: "A certifier signs it off." };
    case "yellow-needs-certifier":
      return {
        why: `Yellow tag on a road-safety part: ${reason.title}`,
        clears: "A certifier signs it off, or lets it run under a limit until a date.",
      };
    case "yellow-date-passed":
      return {
        why: `Its leave to run has ended: ${reason.title}`,
        clears: "A certifier signs it off, or gives it a later date.",
      };
    case "test-passed-date":
      return {
        why: `Past its date: ${DATED(reason.id)}.`,
        clears: "The test is done and its new date entered.",
      };
    case "test-not-on-file":
      return {
        why: `Not on file: ${DATED(reason.id)}.`,
        clears: "The office enters the date on its paper.",
      };
    case "round-overdue":
      return {
        why: `The ${reason.id} round is past its grace.`,
        clears: "The shop does the round.",
      };
    case "walk-due":
      return { why: "No walk counts now.", clears: "A driver walks the truck." };
    case "not-acknowledged":
      return {
        why: "What was signed off or is open has not been seen by the driver.",
        clears: "The driver acknowledges it.",
      };
    case "limit":
      return {
        why: limitText(reason.limit),
        clears: "The tag behind it is signed off, or the run-up is done in a new walk.",
      };
    case "already-out":
      return { why: "The key is out already.", clears: "It comes back to the peg." };
    case "driver-has-no-walk":
      return {
        why: "This driver has no walk on this truck that counts now.",
        clears: "They walk it, or take over another's walk.",
      };
    case "driver-has-not-acknowledged":
      return {
        why: `This driver has not acknowledged ${reason.count === 1 ? "one thing" : `${reason.count} things`} signed off or open.`,
        clears: "They look at it on their phone and sign.",
      };
    case "need-unanswered":
      return { why: "A need of the run is not answered.", clears: "Answer every need." };
    case "limit-against-need":
      return {
        why: `The run needs what a limit forbids: ${limitText(reason.limit)}.`,
        clears: "Another truck, or the tag behind it is signed off.",
      };
    case "not-built-for":
      return {
        why: `The truck is not built for this run: ${limitText(reason.limit)}.`,
        clears: "Another truck.",
      };
    case "over-tank":
      return {
        why: `The load is more than the tank holds (${gallons(reason.tankL)}).`,
        clears: "A larger truck, or less on board.",
      };
  }
}

/** A tag's title; a driver's refusal of a sign-off has one of its own. */
export function tagTitle(title: string): string {
  return title === "not-satisfied" ? "The driver is not satisfied with the repair" : title;
}
