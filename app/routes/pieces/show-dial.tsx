import { Dial, type DialProps } from "~/ui/dial/dial";
import { plainField } from "~/ui/fields/field-shape";
import { Shown } from "./piece-section";

export const scales = {
  vacuum: { unit: "inHg", max: 30, numbered: 10 },
  pressure: { unit: "psi", max: 30, numbered: 10 },
} as const;

export const vacuumMarks = { band: { from: 19, to: 23 }, stop: 26, greatest: 28, uncertainty: 0.6 };

/** Filler: a screen judges with the product's own rules. */
export function verdict(value: number): ReturnType<NonNullable<DialProps["verdict"]>> {
  if (value < 19) return { tone: "limit", title: "Below 19.", text: "A yellow tag goes on." };
  if (value <= 23) return { tone: "good", title: "Inside 19 to 23." };
  return { tone: "stop", title: "Above 23.", text: "Neutral, PTO out. A red tag goes on." };
}

export function ShowDial() {
  return (
    <div className="grid grid-cols-1 items-start gap-10 md:grid-cols-2 xl:grid-cols-4">
      <Shown name="Unset">
        <Dial
          {...scales}
          side="vacuum"
          field={plainField("dial-1")}
          label="Vacuum relief, gauge when steady"
          marks={vacuumMarks}
          verdict={verdict}
          usual="20.5 to 21.5 inHg"
        />
      </Shown>
      <Shown name="In band">
        <Dial
          {...scales}
          side="vacuum"
          field={plainField("dial-2", { value: "21.0" })}
          label="Vacuum relief, gauge when steady"
          marks={vacuumMarks}
          verdict={verdict}
          usual="20.5 to 21.5 inHg"
        />
      </Shown>
      <Shown name="High in the mountains, out of band, refused">
        <Dial
          {...scales}
          side="vacuum"
          field={plainField("dial-3", {
            value: "17.5",
            errors: ["The relief opened, so a reading is needed from a steady gauge."],
          })}
          label="Vacuum relief, gauge when steady"
          marks={{ band: { from: 19, to: 22 }, stop: 23, greatest: 23.5 }}
          verdict={verdict}
        />
      </Shown>
      <Shown name="Pressure half">
        <Dial
          {...scales}
          side="pressure"
          field={plainField("dial-4", { value: "14.5" })}
          label="Pressure relief, gauge when steady"
          marks={{ band: { from: 13, to: 16 }, stop: 18, uncertainty: 1 }}
          verdict={() => ({ tone: "good", title: "Inside 13 to 16." })}
        />
      </Shown>
    </div>
  );
}
