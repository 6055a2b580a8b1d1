import { useState } from "react";
import { Button, ButtonLink } from "~/ui/button";
import { ErrorSummary } from "~/ui/error-summary";
import { AmountField } from "~/ui/fields/amount-field";
import { CheckField } from "~/ui/fields/check-field";
import { ChoiceTiles } from "~/ui/fields/choice-tiles";
import { plainField } from "~/ui/fields/field-shape";
import { SelectField } from "~/ui/fields/select-field";
import { SignatureField } from "~/ui/fields/signature-field";
import { TextAreaField, TextField } from "~/ui/fields/text-field";
import { TagDrawing } from "~/ui/tag-glyph";
import { Shown } from "./piece-section";

const faultyUnit = plainField("unit", {
  value: "T 118",
  errors: ["T 118 is not a unit number here. Write it as it is painted: T-118."],
});
const faultyStop = plainField("stop", {
  value: "29",
  errors: ["The pump's limit is 27 inHg. Enter 27 or less."],
});
const units = [
  { value: "inHg", label: "inHg" },
  { value: "kPa", label: "kPa" },
] as const;

export function ShowFields() {
  const [refused, setRefused] = useState(false);
  return (
    <>
      <Shown name="Buttons">
        <div className="flex flex-wrap items-center gap-3">
          <Button kind="main" size="walk">
            Seen, all good
          </Button>
          <Button size="walk">Problem</Button>
          <Button kind="danger" size="walk">
            Not satisfied
          </Button>
          <Button kind="main">Sign off</Button>
          <Button>Add a part</Button>
          <ButtonLink to="/pieces">Print the sheet</ButtonLink>
          <Button kind="danger">Take off the page</Button>
          <Button disabled>Not yet</Button>
          <Button kind="main" busy="Sending the walk">
            Send
          </Button>
        </div>
      </Shown>
      <div className="grid grid-cols-1 items-start gap-8 lg:grid-cols-2">
        <form className="max-w-xl space-y-5">
          <TextField field={plainField("name")} label="Name of the yard" hint="As people say it." />
          <AmountField
            field={plainField("elevation", { value: "1980" })}
            unit={plainField("elevation-unit", { value: "m" })}
            units={[{ value: "m", label: "m" }]}
            label="Elevation"
          />
          <AmountField
            field={plainField("relief", { value: "21" })}
            unit={plainField("relief-unit", { value: "inHg" })}
            units={units}
            label="Vacuum relief opens at"
            hint="What the maker's plate says."
          />
          <SelectField
            field={plainField("kind", { value: "vane" })}
            label="Pump"
            options={[
              { value: "vane", label: "Vane" },
              { value: "ring", label: "Liquid ring" },
              { value: "blower", label: "Blower" },
            ]}
          />
          <TextField field={plainField("until")} type="date" label="May run until" optional />
          <TextAreaField
            field={plainField("note")}
            label="What was done"
            hint="Parts by name, and what was found."
          />
          <CheckField
            field={plainField("guard", { value: "on" })}
            label="Guard on, shavings seen through it"
          />
          <CheckField
            field={plainField("two")}
            label="Ask for two people"
            hint="Whoever found it does not sign it off."
          />
        </form>
        <form className="max-w-xl space-y-5">
          {refused ? (
            <ErrorSummary
              fields={[
                ["Unit number", faultyUnit],
                ["Stop value", faultyStop],
              ]}
            />
          ) : (
            <Button onClick={() => setRefused(true)}>Show the error summary</Button>
          )}
          <TextField field={faultyUnit} label="Unit number" />
          <AmountField
            field={faultyStop}
            unit={plainField("stop-unit", { value: "inHg" })}
            units={units}
            label="Stop value"
            hint="The lowest of tank, pump and gauge."
          />
          <ChoiceTiles
            field={plainField("answer", { value: "same" })}
            label="Open tag: sight glass hazed"
            columns={3}
            choices={[
              { value: "same", label: "Same" },
              { value: "worse", label: "Worse" },
              { value: "gone", label: "Gone" },
            ]}
          />
          <ChoiceTiles
            field={plainField("problem")}
            label="What is wrong with the float ball"
            choices={[
              {
                value: "missing",
                label: "Missing",
                note: "Red tag: the key stays",
                drawing: <TagDrawing colour="red" />,
              },
              {
                value: "dented",
                label: "Dented, still floats",
                note: "Yellow tag: no vacuum work",
                drawing: <TagDrawing colour="yellow" />,
              },
              {
                value: "scuffed",
                label: "Scuffed",
                note: "White tag: to watch",
                drawing: <TagDrawing colour="white" />,
              },
            ]}
          />
          <SignatureField
            field={plainField("signature")}
            signer="Odalys Brandt"
            wording="I walked this truck today. The answers are what I saw, and I have read the tags left open on it."
          />
        </form>
      </div>
    </>
  );
}
