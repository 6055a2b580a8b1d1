import { shownAmount } from "~/domain/trucks/fitting-attributes";
import { fittingFields } from "~/domain/trucks/fitting-fields";
import { office, optionLabel, withUnit } from "~/text/en/office";
import type { Fitting } from "~/trade/fittings";
import type { ShownPlate } from "./fitting-form";

/** A stored plate as the form shows it, in the usual units. */
export function shownPlate({ kind, attributes }: Pick<Fitting, "kind" | "attributes">): ShownPlate {
  const { type, grade, count } = attributes;
  const plate: ShownPlate = { type, grade, count };
  for (const field of fittingFields(kind)) {
    if (field.as !== "amount") continue;
    const stored = attributes[field.name];
    if (stored === undefined) continue;
    plate[field.name] = { value: shownAmount(field, stored), unit: field.units[0] };
  }
  plate.flags = fittingFields(kind).flatMap((field) =>
    field.as === "flag" && attributes[field.name] ? [field.name] : [],
  );
  return plate;
}

/** A plate in one line: "Vane, 27 inHg, 15 psi, 360 cfm". */
export function plateLine({ kind, attributes }: Pick<Fitting, "kind" | "attributes">): string {
  const parts = fittingFields(kind).flatMap((field): string[] => {
    if (field.as === "amount") {
      const stored = attributes[field.name];
      if (stored === undefined) return [];
      return [withUnit(shownAmount(field, stored), field.units[0])];
    }
    if (field.as === "count")
      return attributes.count === undefined ? [] : [`× ${attributes.count}`];
    if (field.as === "choice") {
      const chosen = attributes[field.name];
      return chosen === undefined ? [] : [optionLabel(chosen)];
    }
    return [];
  });
  if (attributes.specificationPlate) parts.push(office.truck.specificationPlate);
  return parts.join(", ");
}
