import { AirPath, type AirPathPart } from "~/ui/air-path/air-path";
import { Caution } from "~/ui/caution";
import { type StationState, StationStrip } from "~/ui/station-strip";
import { Shown } from "./piece-section";

const NAMES = [
  "Approach",
  "Hood",
  "Pump side",
  "Cab",
  "Curb side",
  "Rear",
  "Driver side",
  "Run-up",
  "Pull-out",
];

export function strip(states: string) {
  const words: Record<string, StationState> = {
    d: "done",
    n: "now",
    t: "tagged",
    r: "tagged",
    ".": "to-come",
  };
  return NAMES.map((name, index) => ({
    key: name,
    name,
    state: words[states[index] ?? "."] ?? "to-come",
    colour: states[index] === "r" ? ("red" as const) : ("yellow" as const),
  }));
}

const PARTS: readonly AirPathPart[] = [
  { key: "tank", label: "Tank", shape: "tank", state: "good", to: "/pieces?part=tank" },
  {
    key: "primary",
    label: "Primary shutoff",
    shape: "shutoff",
    state: "held",
    note: "float ball missing",
    to: "/pieces?part=primary",
  },
  {
    key: "trap",
    label: "Secondary trap (scrubber)",
    shape: "trap",
    state: "to-check",
    to: "/pieces?part=trap",
  },
  { key: "filter", label: "Pre-filter", shape: "filter", state: "good", to: "/pieces?part=filter" },
  {
    key: "valve",
    label: "Changeover valve",
    shape: "valve",
    state: "good",
    to: "/pieces?part=valve",
  },
  {
    key: "pump",
    label: "Pump",
    shape: "pump",
    state: "watch",
    note: "weeping at the seal",
    to: "/pieces?part=pump",
  },
  {
    key: "catch",
    label: "Oil catch",
    shape: "catch",
    state: "limit",
    note: "no drain valve handle",
    to: "/pieces?part=catch",
  },
  { key: "can", label: "Deodorizer can", shape: "can", state: "good" },
  { key: "outlet", label: "Outlet", shape: "outlet", state: "good" },
];

export function ShowWalk() {
  return (
    <>
      <div className="grid max-w-3xl grid-cols-1 gap-5">
        <Shown name="Station strip">
          <div className="space-y-3">
            <StationStrip stations={strip("n........")} />
            <StationStrip stations={strip("ddrddtdn.")} />
            <StationStrip stations={strip("ddddddddd")} />
          </div>
        </Shown>
      </div>
      <Shown name="Cautions, before the check they belong to">
        <div className="grid grid-cols-1 gap-3 lg:grid-cols-3">
          <Caution shape="warning" title="Stored vacuum or pressure">
            Vent the tank and see the gauge on zero before you open a drain.
          </Caution>
          <Caution shape="must" title="Chocks first">
            Chock the wheels before any brake is released.
          </Caution>
          <Caution shape="must-not" title="Never tighten under pressure">
            Bleed to zero first. No clamp is touched before.
          </Caution>
        </div>
      </Shown>
      <Shown name="Air path, vacuum">
        <AirPath parts={PARTS} mode="vacuum" />
      </Shown>
      <Shown name="Air path, pressure: air is drawn back through the oil catch">
        <AirPath parts={PARTS.slice(4)} mode="pressure" />
      </Shown>
    </>
  );
}
