import { FieldFaults, type FieldProps } from "./field";
import { controlProps } from "./field-shape";

/** One yes or no. The whole line is the target. */
export function CheckField({ field, label, hint }: Omit<FieldProps, "optional">) {
  return (
    <div>
      <label htmlFor={field.id} className="flex min-h-12 items-center gap-3 py-1">
        <span className="relative size-8 shrink-0">
          <input
            key={field.key}
            type="checkbox"
            defaultChecked={field.initialValue === "on"}
            {...controlProps(field, hint)}
            className="peer size-full appearance-none rounded-sm border-2 border-edge bg-card checked:border-enamel checked:bg-enamel hover:border-ink forced-colors:appearance-auto"
          />
          <svg
            viewBox="0 0 32 32"
            aria-hidden="true"
            className="pointer-events-none absolute inset-0 hidden fill-none stroke-card peer-checked:block forced-colors:hidden"
          >
            <path d="m8 17 6 6L25 9" strokeWidth="4" strokeLinecap="round" strokeLinejoin="round" />
          </svg>
        </span>
        {label}
      </label>
      {hint && (
        <p id={field.descriptionId} className="pl-11 text-sm text-mute">
          {hint}
        </p>
      )}
      <FieldFaults field={field} />
    </div>
  );
}
