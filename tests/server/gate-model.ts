/**
 * A naive gate, written apart from `standing()`: it keeps every event in one list and answers
 * one question by walking through all of it. Slow and plain on purpose. Times in ms UTC.
 */
export type ModelColour = "white" | "yellow" | "red";

export interface ModelNeeds {
  pressure: boolean;
  vacuumPa: number;
}

export type ModelEvent =
  | {
      at: number;
      what: "walk";
      id: string;
      by: string;
      from: number;
      clears: boolean;
      skipsPressure: boolean;
    }
  | {
      at: number;
      what: "takeover";
      id: string;
      by: string;
      from: number;
      clears: boolean;
      base: string;
    }
  | { at: number; what: "after"; by: string; from: number }
  | {
      at: number;
      what: "tag";
      id: string;
      by: string;
      colour: ModelColour;
      road: boolean;
      maxVacuumPa: number | null;
    }
  | { at: number; what: "signed-off"; tag: string; id: string }
  | {
      at: number;
      what: "leave";
      tag: string;
      id: string;
      by: string;
      until: number;
      maxVacuumPa: number | null;
    }
  | { at: number; what: "saw"; by: string; ids: string[] }
  | { at: number; what: "fitting"; hasRelief: boolean }
  | { at: number; what: "service"; on: boolean }
  | { at: number; what: "policy"; walkHours: number }
  | { at: number; what: "test"; kind: string; holdsAt: number }
  | { at: number; what: "round"; holdsAt: number }
  | { at: number; what: "out"; by: string }
  | { at: number; what: "back"; by: string; endsDay: boolean };

const HOUR = 3_600_000;

export function mayTakeKey(
  events: readonly ModelEvent[],
  driver: string,
  needs: ModelNeeds,
  now: number,
  start: { walkHours: number; reviewDays: number; roundHoldsAt: number },
): boolean {
  let out = false;
  let inService = true;
  let walkHours = start.walkHours;
  let lastFitting = -1;
  let hasRelief = true;
  let roundHoldsAt = start.roundHoldsAt;
  const testHolds: Record<string, number> = {};
  const open: Record<string, Extract<ModelEvent, { what: "tag" }>> = {};
  const leaves: Record<string, Extract<ModelEvent, { what: "leave" }>> = {};
  const ended: { id: string; at: number }[] = [];
  const seen: string[] = [];
  events.forEach((event, index) => {
    if (event.what === "out") out = true;
    if (event.what === "back") out = false;
    if (event.what === "service") inService = event.on;
    if (event.what === "policy") walkHours = event.walkHours;
    if (event.what === "fitting") {
      lastFitting = index;
      hasRelief = event.hasRelief;
    }
    if (event.what === "round") roundHoldsAt = event.holdsAt;
    if (event.what === "test") testHolds[event.kind] = event.holdsAt;
    if (event.what === "tag") open[event.id] = event;
    if (event.what === "leave") leaves[event.tag] = event;
    if (event.what === "signed-off") {
      delete open[event.tag];
      ended.push({ id: event.id, at: event.at });
    }
    if (event.what === "saw" && event.by === driver) seen.push(...event.ids);
  });

  if (out || !inService || roundHoldsAt <= now) return false;
  if (needs.pressure && !hasRelief) return false;
  for (const holds of Object.values(testHolds)) if (holds <= now) return false;

  for (const tag of Object.values(open)) {
    const leave = leaves[tag.id];
    if (tag.colour === "red") return false;
    if (tag.colour === "yellow") {
      if (tag.road && (!leave || leave.until <= now)) return false;
      const max = leave ? leave.maxVacuumPa : tag.maxVacuumPa;
      if (max !== null && needs.vacuumPa > max) return false;
    }
    if (leave) {
      if (leave.by !== driver && !seen.includes(leave.id)) return false;
    } else if (tag.by !== driver && !seen.includes(tag.id)) return false;
  }

  const counts = (event: ModelEvent, index: number) =>
    (event.what === "walk" || event.what === "takeover") && event.clears && index > lastFitting;
  const endOf = (by: string, from: number) => {
    let end = from + walkHours * HOUR;
    for (const event of events) {
      if (event.what === "after" && event.by === by && event.from > from)
        end = Math.min(end, event.from);
      if (event.what === "back" && event.by === by && event.endsDay && event.at > from) {
        end = Math.min(end, event.at);
      }
    }
    return end;
  };

  let mine: { from: number; end: number } | null = null;
  let skipsPressure = false;
  let newest = -1;
  events.forEach((event, index) => {
    if (!counts(event, index)) return;
    if (event.what === "walk") {
      if (event.from > newest) {
        newest = event.from;
        skipsPressure = event.skipsPressure;
      }
      if (event.by === driver && (!mine || event.from > mine.from)) {
        mine = { from: event.from, end: endOf(driver, event.from) };
      }
    }
    if (event.what === "takeover" && event.by === driver && (!mine || event.from > mine.from)) {
      const baseAt = events.findIndex((other) => other.what === "walk" && other.id === event.base);
      const base = events[baseAt];
      let end = event.from;
      if (base?.what === "walk" && counts(base, baseAt) && endOf(base.by, base.from) > event.from) {
        end = Math.min(endOf(driver, event.from), base.from + walkHours * HOUR);
      }
      mine = { from: event.from, end };
    }
  });
  const own = mine as { from: number; end: number } | null;
  if (!own || own.end <= now) return false;
  for (const end of ended) {
    if (end.at > own.from - start.reviewDays * 24 * HOUR && !seen.includes(end.id)) return false;
  }
  return !(skipsPressure && needs.pressure);
}
