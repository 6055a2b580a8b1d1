import { handOverSchema } from "~/domain/handovers/hand-over";
import { takeBackSchema } from "~/domain/handovers/take-back";
import { toSi } from "~/trade/units";

/** The form's names of the needs. */
export const NEED_NAMES = {
  pressureOffLoad: "pressure",
  vacuumPa: "vacuum",
  fillL: "fill",
  hoseM: "hose",
};

/** A number as typed, or null when nothing was; NaN, which no schema takes, when it is no number. */
function typedNumber(form: FormData, name: string): number | null {
  const text = String(form.get(name) ?? "")
    .trim()
    .replace(",", ".");
  return text === "" ? null : Number(text);
}

function inSi(value: number | null, unit: string): number | null {
  return value === null ? null : toSi(value, unit);
}

/** Yes, no, or not answered. */
function yesNo(form: FormData, name: string): boolean | null {
  const said = form.get(name);
  return said === "yes" ? true : said === "no" ? false : null;
}

/** The handover form in SI. Needs that were not answered stay null: the gate refuses them. */
export function handOverInput(form: FormData) {
  const fill = inSi(typedNumber(form, "fill"), "gal");
  const parsed = handOverSchema.safeParse({
    id: form.get("id"),
    truckId: form.get("truckId"),
    driverId: form.get("driverId"),
    runName: form.get("runName") ?? "",
    needs: {
      pressureOffLoad: yesNo(form, "pressure"),
      towing: yesNo(form, "towing"),
      hazmat: yesNo(form, "hazmat"),
      vacuumPa: inSi(typedNumber(form, "vacuum"), "inHg"),
      fillL: fill === null ? null : fill * 1000,
      hoseM: inSi(typedNumber(form, "hose"), "ft"),
    },
  });
  return parsed.success ? { ...parsed, back: false as const } : parsed;
}

export function takeBackInput(form: FormData) {
  const note = String(form.get("note") ?? "").trim();
  const parsed = takeBackSchema.safeParse({
    id: form.get("id"),
    handoverId: form.get("handoverId"),
    aboard: form.get("aboard"),
    pumpHours: typedNumber(form, "pumpHours"),
    endsDay: form.has("endsDay"),
    note: note === "" ? null : note,
  });
  return parsed.success ? { ...parsed, back: true as const } : parsed;
}
