import { FieldFaults, type FieldProps } from "./field";
import { controlProps } from "./field-shape";

/** One yes or no. The whole line is the target. */
export function CheckField({ field, label, hint }: Omit<FieldProps, "optional">) {
  return (
    <div>
      <label htmlFor={field.id} className="flex min-h-12 items-center gap-3 py-1">
        <input
          key={field.key}
          type="checkbox"
          defaultChecked={field.initialValue === "on"}
          {...controlProps(field, hint)}
          className="size-7 shrink-0 accent-enamel"
        />
        {label}
      </label>
      {hint && (
        <p id={field.descriptionId} className="pl-10 text-sm text-mute">
          {hint}
        </p>
      )}
      <FieldFaults field={field} />
    </div>
  );
}
