import { useEffect, useId, useRef } from "react";
import { uiText } from "~/text/en/ui";
import { CONTROL, Field, type FieldProps } from "./field";
import { controlProps, startOf } from "./field-shape";
import type { Option } from "./select-field";
import { useCombobox } from "./use-combobox";

/** One of many, found by typing part of it. The form carries the value, the screen the label. */
export function ComboboxField({
  field,
  label,
  hint,
  optional,
  options,
}: FieldProps & { options: readonly Option[] }) {
  const box = useCombobox(options, startOf(field));
  const listId = useId();
  const list = useRef<HTMLDivElement>(null);
  const { name, ...control } = controlProps(field, hint);
  const optionId = (index: number) => `${listId}-${index}`;
  useEffect(() => {
    list.current?.children[box.marked]?.scrollIntoView({ block: "nearest" });
  }, [box.marked]);
  return (
    <Field field={field} label={label} hint={hint} optional={optional}>
      <div className="relative">
        <input type="hidden" name={name} form={field.formId} value={box.chosen?.value ?? ""} />
        <input
          {...control}
          type="text"
          role="combobox"
          autoComplete="off"
          spellCheck={false}
          aria-autocomplete="list"
          aria-expanded={box.open}
          aria-controls={listId}
          aria-activedescendant={box.marked >= 0 ? optionId(box.marked) : undefined}
          value={box.typed}
          onChange={(event) => box.type(event.target.value)}
          onClick={() => box.setOpen(true)}
          onBlur={box.close}
          onKeyDown={box.onKeyDown}
          className={`${CONTROL} w-full`}
        />
        <div
          ref={list}
          id={listId}
          role="listbox"
          aria-label={label}
          hidden={!box.open}
          className="absolute inset-x-0 top-full z-30 mt-1 max-h-64 overflow-y-auto rounded-md border-2 border-ink bg-card p-1.5"
        >
          {box.fitting.map((option, index) => (
            // biome-ignore lint/a11y/useFocusableInteractive: focus stays in the input, which names the marked option
            <div
              key={option.value}
              id={optionId(index)}
              role="option"
              aria-selected={option.value === box.chosen?.value}
              // Before the input loses focus and the list with it.
              onPointerDown={(event) => {
                event.preventDefault();
                box.choose(option);
              }}
              className={`flex min-h-12 cursor-pointer items-center rounded-sm px-3 hover:bg-line aria-selected:font-bold ${index === box.marked ? "bg-enamel text-card hover:bg-enamel" : ""}`}
            >
              {option.label}
            </div>
          ))}
        </div>
        <p
          role="status"
          className={box.open && box.fitting.length === 0 ? "mt-1 text-sm text-mute" : "sr-only"}
        >
          {box.open &&
            (box.fitting.length === 0
              ? uiText.combobox.none
              : uiText.combobox.count(box.fitting.length))}
        </p>
      </div>
    </Field>
  );
}
