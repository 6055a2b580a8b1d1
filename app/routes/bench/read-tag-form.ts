import { allowRunSchema } from "~/domain/tags/allow-run";
import { signOffSchema } from "~/domain/tags/sign-off";
import type { Limit } from "~/trade/limits";
import { toSi } from "~/trade/units";

/** Names of a tag form's fields, all of which are kept when it is refused. */
export const TYPED = [
  "intent",
  "kind",
  "work",
  "parts",
  "roadTested",
  "remote",
  "reason",
  "signature",
  "limit",
  "amount",
  "untilDay",
] as const;

/** What the limit select may hold beside the kinds of limits. */
export const AS_TAGGED = "as-tagged";
export const NO_LIMIT = "none";

const text = (form: FormData, name: string) => String(form.get(name) ?? "");

export function readSignOff(form: FormData) {
  return signOffSchema.safeParse({
    id: text(form, "id"),
    tagId: text(form, "tagId"),
    kind: text(form, "kind"),
    work: text(form, "work"),
    parts: text(form, "parts") || null,
    roadTested: form.has("roadTested") ? true : null,
    remote: form.has("remote"),
    reason: text(form, "reason"),
    signature: { name: text(form, "signature"), wording: "sign-off" },
  });
}

/** The limit as chosen, SI; NaN where its number is missing, which no schema takes. */
function limitOf(chosen: string, typed: string, tagged: Limit | null): unknown {
  const amount = typed.trim() === "" ? Number.NaN : Number(typed.replace(",", "."));
  switch (chosen) {
    case AS_TAGGED:
      return tagged;
    case NO_LIMIT:
      return null;
    case "vacuum-no-deeper":
      return { kind: chosen, vacuumPa: toSi(amount, "inHg") };
    case "fill-no-more":
      return { kind: chosen, fillL: toSi(amount, "gal") * 1000 };
    case "hose-no-longer":
      return { kind: chosen, hoseM: toSi(amount, "ft") };
    default:
      return { kind: chosen };
  }
}

export function readAllowRun(form: FormData, tagged: Limit | null) {
  return allowRunSchema.safeParse({
    id: text(form, "id"),
    tagId: text(form, "tagId"),
    limit: limitOf(text(form, "limit"), text(form, "amount"), tagged),
    untilDay: text(form, "untilDay"),
    signature: { name: text(form, "signature"), wording: "run-limit" },
  });
}

/** Where a limit's number is wrong, the form's one amount field says so. */
export const LIMIT_NAMES = { vacuumPa: "amount", fillL: "amount", hoseM: "amount", kind: "limit" };
