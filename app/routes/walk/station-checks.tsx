import { type MouseEvent, useState } from "react";
import { cautions } from "~/text/en/cautions";
import { loop } from "~/text/en/loop";
import { tagText } from "~/text/en/ui";
import type { Check, Station } from "~/trade/sheet/check";
import { Button } from "~/ui/button";
import { Caution } from "~/ui/caution";
import { CheckField } from "~/ui/fields/check-field";
import { plainField } from "~/ui/fields/field-shape";
import { SelectField } from "~/ui/fields/select-field";
import { TextField } from "~/ui/fields/text-field";
import { fieldOf, GOOD } from "./read-walk";

/** What a drain, a level or a look may be answered with, before its problems. */
function goodAnswers(check: Check): { value: string; label: string }[] {
  if (check.kind === "drain") {
    return [
      { value: GOOD, label: loop.walk.drainDry },
      { value: "ran", label: loop.walk.drainRan },
    ];
  }
  return [{ value: GOOD, label: loop.walk.good }];
}

function problemsOf(check: Check) {
  return {
    label: loop.walk.problem,
    options: check.problems.map((problem) => ({
      value: problem.key,
      label: `${problem.label} (${tagText[problem.colour].toLowerCase()})`,
    })),
  };
}

function CheckAnswer({ check }: { check: Check }) {
  const [wrong, setWrong] = useState(false);
  const { key, label, good, reading } = check;
  const numeric = reading !== null || check.kind === "count";
  const options = numeric
    ? [{ value: "", label: "–" }, problemsOf(check)]
    : [{ value: "", label: "–" }, ...goodAnswers(check), problemsOf(check)];
  return (
    <li
      className="space-y-2 border-t border-line py-4"
      onChange={(event) => {
        const target = event.target as unknown as { tagName: string; value: string };
        if (target.tagName !== "SELECT") return;
        setWrong(!["", GOOD, "ran"].includes(target.value));
      }}
    >
      {numeric && (
        <TextField
          field={plainField(fieldOf(key, "value"))}
          label={reading ? `${label}, ${reading.unit}` : label}
          hint={reading ? good : loop.walk.counted(check.expected ?? 0)}
          inputMode="decimal"
        />
      )}
      {reading?.asksHeardOpen && (
        <CheckField field={plainField(fieldOf(key, "heard"))} label={loop.walk.heard} />
      )}
      <SelectField
        field={plainField(fieldOf(key, "answer"))}
        label={numeric ? `${label}: ${loop.walk.problem.toLowerCase()}` : label}
        hint={numeric ? undefined : good}
        options={options}
      />
      {wrong && (
        <>
          <TextField
            field={plainField(fieldOf(key, "note"))}
            label={`${label}: ${loop.walk.note.toLowerCase()}`}
            optional
          />
          <label className="block font-bold">
            {`${label}: ${loop.walk.photo.toLowerCase()}`}
            <input
              type="file"
              name={fieldOf(key, "photo")}
              accept="image/jpeg,image/png,image/webp"
              className="mt-1 block w-full font-normal"
            />
          </label>
        </>
      )}
    </li>
  );
}

/** One press answers every look of a station that has no answer yet. */
function fillGood(event: MouseEvent<HTMLButtonElement>) {
  const station = event.currentTarget.closest("fieldset");
  for (const select of station?.querySelectorAll("select") ?? []) {
    const takesGood = [...select.options].some((option) => option.value === GOOD);
    if (select.value === "" && takesGood) select.value = GOOD;
  }
}

/** One station of the sheet: its cautions, its checks, and one press for "seen, all good". */
export function StationChecks({ station }: { station: Station }) {
  const keys = [station.caution, ...station.checks.map((check) => check.caution)];
  const shown = [...new Set(keys.filter((key) => key !== null))];
  return (
    <fieldset className="rounded-lg border-2 border-ink bg-card px-4 pb-4">
      <legend className="px-2 text-xl font-bold">{station.label}</legend>
      <p className="text-mute">{station.engine}</p>
      <div className="my-3 space-y-2">
        {shown.map((key) => (
          <Caution key={key} shape={cautions[key].shape} title={cautions[key].title}>
            {cautions[key].text}
          </Caution>
        ))}
      </div>
      <ul>
        {station.checks.map((check) => (
          <CheckAnswer key={check.key} check={check} />
        ))}
      </ul>
      <Button size="walk" wide onClick={fillGood}>
        {loop.walk.good}
      </Button>
    </fieldset>
  );
}
