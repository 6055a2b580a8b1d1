import { useState } from "react";
import { loop } from "~/text/en/loop";
import { tagText } from "~/text/en/ui";
import { walkText } from "~/text/en/walk";
import { type Check, COULD_NOT_CHECK, NOT_FITTED } from "~/trade/sheet/check";
import { CheckField } from "~/ui/fields/check-field";
import { ChoiceTiles } from "~/ui/fields/choice-tiles";
import { plainField } from "~/ui/fields/field-shape";
import { SelectField } from "~/ui/fields/select-field";
import { TextField } from "~/ui/fields/text-field";
import { fieldOf, GOOD, RAN, SEEN } from "./read-walk";
import { placeOf } from "./walk-gaps";

const asOptions = (words: Readonly<Record<string, string>>, prefix = "") =>
  Object.entries(words).map(([value, label]) => ({ value: prefix + value, label }));

function goodOptions(check: Check) {
  if (check.kind === "drain") {
    return [
      { value: GOOD, label: walkText.drainDry },
      { value: RAN, label: walkText.drainRan },
    ];
  }
  return [{ value: GOOD, label: walkText.lookGood }];
}

function optionsOf(check: Check, numeric: boolean, tagged: boolean) {
  const problems = check.problems.map(({ key, label, colour }) => ({
    value: key,
    label: `${label} (${tagText[colour].toLowerCase()})`,
  }));
  return [
    { value: "", label: numeric ? "–" : walkText.notYet },
    ...(numeric ? [] : goodOptions(check)),
    ...(tagged && check.kind === "look"
      ? [{ label: walkText.hangs, options: asOptions(walkText.seen, SEEN) }]
      : []),
    { label: walkText.problem, options: problems },
  ];
}

/** One check of the sheet with the answers its kind takes. */
export function CheckAnswer({ check, tagged }: { check: Check; tagged: boolean }) {
  const [chosen, setChosen] = useState("");
  const { key, label, good, reading, kind, steps } = check;
  const numeric = reading !== null || kind === "count";
  return (
    <div
      id={placeOf(key)}
      tabIndex={-1}
      className="scroll-mt-4 space-y-3 outline-none"
      onChange={(event) => {
        const target = event.target as unknown as HTMLSelectElement;
        if (target.name === fieldOf(key, "answer")) setChosen(target.value);
      }}
    >
      {steps.length > 0 && (
        <div className="text-mute">
          <p>{walkText.steps(label)}</p>
          <ol className="mt-1 list-decimal space-y-1 pl-6">
            {steps.map((step) => (
              <li key={step}>{step}</li>
            ))}
          </ol>
        </div>
      )}
      {numeric && (
        <TextField
          field={plainField(fieldOf(key, "value"))}
          label={reading ? `${label}, ${reading.unit}` : label}
          hint={reading ? good : walkText.counted(check.expected ?? 0)}
          inputMode="decimal"
        />
      )}
      {reading?.asksHeardOpen && (
        <ChoiceTiles
          field={plainField(fieldOf(key, "heard"))}
          label={walkText.heard(label)}
          choices={[
            { value: "yes", label: loop.yes },
            { value: "no", label: loop.no },
          ]}
          columns={2}
        />
      )}
      <SelectField
        field={plainField(fieldOf(key, "answer"))}
        label={numeric ? walkText.problemAt(label) : label}
        hint={numeric ? undefined : good}
        optional={numeric}
        alone={kind === "drain"}
        options={optionsOf(check, numeric, tagged)}
      />
      {kind === "drain" && <DrainMore check={check} chosen={chosen} />}
      {kind === "level" && chosen === GOOD && (
        <TextField
          field={plainField(fieldOf(key, "value"))}
          label={walkText.toppedUp(label)}
          inputMode="decimal"
          optional
        />
      )}
      <ProblemMore check={check} chosen={chosen} />
    </div>
  );
}

/** How much came out of a drain, what it was, and that the drain is shut again. */
function DrainMore({ check: { key, label }, chosen }: { check: Check; chosen: string }) {
  if (chosen !== GOOD && chosen !== RAN) return null;
  return (
    <>
      {chosen === RAN && (
        <>
          <SelectField
            field={plainField(fieldOf(key, "amount"), { value: "cup" })}
            label={walkText.amount(label)}
            options={asOptions(walkText.amounts)}
          />
          <SelectField
            field={plainField(fieldOf(key, "what"), { value: "clean-oil" })}
            label={walkText.what(label)}
            options={asOptions(walkText.whats)}
          />
        </>
      )}
      <CheckField field={plainField(fieldOf(key, "shut"))} label={walkText.shut(label)} />
    </>
  );
}

/** What goes onto the tag beside its problem. */
function ProblemMore({ check, chosen }: { check: Check; chosen: string }) {
  const { key, label } = check;
  const problem = check.problems.find((one) => one.key === chosen);
  if (!problem || chosen === NOT_FITTED) return null;
  const noReason = chosen !== COULD_NOT_CHECK;
  return (
    <>
      <TextField
        field={plainField(fieldOf(key, "note"))}
        label={noReason ? walkText.note(label) : walkText.reason(label)}
        optional={noReason}
      />
      {problem.colour !== "red" && noReason && (
        <CheckField field={plainField(fieldOf(key, "hold"))} label={walkText.hold(label)} />
      )}
      <label className="block font-bold">
        {walkText.photo(label)}
        <input
          type="file"
          name={fieldOf(key, "photo")}
          accept="image/*"
          className="mt-1 block min-h-14 w-full font-normal file:mr-3 file:min-h-12 file:rounded-md file:border-2 file:border-ink file:bg-card file:px-4 file:font-bold file:text-ink"
        />
      </label>
    </>
  );
}
