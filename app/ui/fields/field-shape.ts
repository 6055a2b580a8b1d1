/** What a field's pieces need to know of it. A Conform field has all of it already. */
export interface FieldShape {
  id: string;
  name: string;
  errorId: string;
  descriptionId: string;
  formId?: string;
  /** Changes when the form is reset, so that the control starts again. */
  key?: string | undefined;
  initialValue?: unknown;
  /** Keys of `refusalText.field`, or words. */
  errors?: readonly string[] | undefined;
  maxLength?: number | undefined;
}

/** A field for a form that is not Conform's. */
export function plainField(
  name: string,
  { value, errors, id = name }: { value?: string; errors?: readonly string[]; id?: string } = {},
): FieldShape {
  return {
    id,
    name,
    errorId: `${id}-error`,
    descriptionId: `${id}-description`,
    initialValue: value,
    errors,
  };
}

/** What was typed or stored, as the text a control starts with. */
export function startOf(field: FieldShape): string | undefined {
  return typeof field.initialValue === "string" ? field.initialValue : undefined;
}

export function isFaulty(field: FieldShape): boolean {
  return (field.errors?.length ?? 0) > 0;
}

/** Ids of what describes a field: its fault first, then its hint. */
export function describedBy(field: FieldShape, hint: unknown): string | undefined {
  const ids = [isFaulty(field) && field.errorId, hint && field.descriptionId].filter(Boolean);
  return ids.length > 0 ? ids.join(" ") : undefined;
}

/** Attributes that tie a control to its label, hint and faults. */
export function controlProps(field: FieldShape, hint: unknown) {
  return {
    id: field.id,
    name: field.name,
    form: field.formId,
    maxLength: field.maxLength,
    "aria-invalid": isFaulty(field) || undefined,
    "aria-describedby": describedBy(field, hint),
  };
}
