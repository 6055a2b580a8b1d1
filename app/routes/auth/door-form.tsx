import type { FieldMetadata } from "@conform-to/react";
import type { ComponentProps, ReactNode } from "react";
import { refusalText } from "~/text/en/refusals";
import { Button } from "~/ui/button";
import { CONTROL } from "~/ui/fields/field";

/** What went wrong, said to a screen reader at once. */
export function Fault({ id, children }: { id?: string; children: ReactNode }) {
  return (
    <p id={id} role="alert" className="mt-2 border-l-4 border-red pl-3 font-bold text-red">
      {children}
    </p>
  );
}

interface DoorFieldProps {
  field: FieldMetadata<string>;
  label: string;
  hint: string;
  input: ComponentProps<"input"> & { key?: string | undefined };
}

/** One labeled input with its hint and, under it, what is wrong and how to put it right. */
export function DoorField({ field, label, hint, input }: DoorFieldProps) {
  const { key, className = "", ...props } = input;
  const fault = field.errors?.[0];
  return (
    <div>
      <label htmlFor={field.id} className="font-bold">
        {label}
      </label>
      <input
        key={key}
        {...props}
        required={false}
        aria-invalid={fault ? true : undefined}
        aria-describedby={fault ? `${field.errorId} ${field.descriptionId}` : field.descriptionId}
        className={`${CONTROL} mt-2 min-h-14 w-full ${className}`}
      />
      {fault && <Fault id={field.errorId}>{refusalText.field(fault)}</Fault>}
      <p id={field.descriptionId} className="mt-2 text-mute">
        {hint}
      </p>
    </div>
  );
}

interface DoorButtonProps extends Omit<ComponentProps<"button">, "type"> {
  busy: boolean;
  busyLabel: string;
  quiet?: boolean;
}

/** The one thing to do, or a quieter one beside it. While it works it says so and takes no second press. */
export function DoorButton({ busy, busyLabel, quiet = false, children, ...rest }: DoorButtonProps) {
  return (
    <Button
      type="submit"
      size="walk"
      kind={quiet ? "quiet" : "main"}
      wide={!quiet}
      busy={busy && busyLabel}
      {...rest}
    >
      {children}
    </Button>
  );
}
