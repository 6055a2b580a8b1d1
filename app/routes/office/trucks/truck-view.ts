import { figures } from "~/domain/trucks/fitting-attributes";
import { fittingFields } from "~/domain/trucks/fitting-fields";
import type { SetPointLine, TestLine, TruckSetup } from "~/domain/trucks/truck-setup";
import {
  dayLabel,
  fittingGroups,
  limitedBy,
  office,
  readings,
  testLabel,
  withUnit,
} from "~/text/en/office";
import { greatestVacuum } from "~/trade/atmosphere";
import type { Fitting } from "~/trade/fittings";
import { fromSi } from "~/trade/units";
import { plateLine } from "./shown-plate";

function setPointView({ reading, set, limit }: SetPointLine, yard: TruckSetup["yard"]) {
  const words = office.truck;
  const relief = reading === "vacuum-relief" || reading === "pressure-relief";
  const { label, unit: usual } = readings[reading];
  const base = { reading, label, owed: relief && set === null };
  if (!set) {
    const shown = limit && withUnit(figures(fromSi(limit.valueSi, usual)), usual);
    const note = limit && shown ? words.limit(shown, limitedBy[limit.by]) : null;
    return { ...base, set: false, value: null, rest: note, unreachable: null };
  }
  const { unit, entered } = set;
  const amount = (value: number | null) => (value === null ? null : withUnit(value, unit));
  const stop =
    amount(entered.stop) ??
    (limit && relief ? withUnit(figures(fromSi(limit.valueSi, unit)), unit) : null);
  const most = greatestVacuum(yard.elevationM);
  return {
    ...base,
    set: true,
    value: withUnit(entered.setPoint, unit),
    rest: [words.band(amount(entered.low), amount(entered.high)), stop && words.stopAt(stop)]
      .filter(Boolean)
      .join(", "),
    unreachable:
      reading === "vacuum-relief" && set.setPointSi > most
        ? words.unreachable(airLimit(most, unit), yard.name)
        : null,
  };
}

function testView({ required, recorded, state }: TestLine) {
  const words = office.truck;
  const { test, everyMonths, source } = required;
  const dates = recorded
    ? [
        words.lastDay(dayLabel(recorded.dueOn)),
        recorded.passedOn && words.passed(dayLabel(recorded.passedOn)),
      ]
    : [];
  return {
    test,
    label: testLabel(test),
    state,
    rule: everyMonths === null ? words.permitLead : words.everyLine(everyMonths, source),
    dates: dates.filter(Boolean).join(", "),
    note: recorded?.note ?? null,
    mayEnd: test === "permit" && recorded !== null,
  };
}

function fittingView(fitting: Fitting) {
  const { id, kind } = fitting;
  return { id, kind, line: plateLine(fitting), hasPlate: fittingFields(kind).length > 0 };
}

/** The air's own limit, to the tenth a gauge can be read to. */
function airLimit(pascals: number, unit: string): string {
  return withUnit(Number(fromSi(pascals, unit).toPrecision(3)), unit);
}

/** One truck's setup as lines to be shown. */
export function truckView({ truck, yard, ...setup }: TruckSetup) {
  return {
    truck,
    yard: { id: yard.id, name: yard.name },
    fittings: fittingGroups.flatMap(({ label, kinds }) => {
      const fitted = setup.fittings.filter(({ kind }) => kinds.includes(kind));
      return fitted.length === 0 ? [] : [{ label, fitted: fitted.map(fittingView) }];
    }),
    removed: setup.removed.map((fitting) => ({
      id: fitting.id,
      kind: fitting.kind,
      line: plateLine(fitting),
      on: fitting.removedAt ? dayLabel(fitting.removedAt.toISOString().slice(0, 10)) : "",
    })),
    setPoints: setup.setPoints.map((line) => setPointView(line, yard)),
    tests: setup.tests.map(testView),
    testsLeftOver: setup.testsLeftOver.map((test) => ({
      kind: test.kind,
      label: testLabel(test.kind),
      dates: office.truck.lastDay(dayLabel(test.dueOn)),
    })),
  };
}
export type TruckView = ReturnType<typeof truckView>;
