import { type KeyboardEvent, useState } from "react";
import type { Option } from "./select-field";

/** The state behind a combobox: what is typed, what fits it, what is marked, what is chosen. */
export function useCombobox(options: readonly Option[], start: string | undefined) {
  const [chosen, setChosen] = useState(() => options.find(({ value }) => value === start) ?? null);
  const [typed, setTyped] = useState(chosen?.label ?? "");
  const [open, setOpen] = useState(false);
  const [marked, setMarked] = useState(-1);
  const wanted = typed.trim().toLowerCase();
  const fitting =
    chosen?.label === typed
      ? options
      : options.filter(({ label }) => label.toLowerCase().includes(wanted));

  function choose(option: Option | undefined) {
    if (!option) return;
    setChosen(option);
    setTyped(option.label);
    close();
  }
  function close() {
    setOpen(false);
    setMarked(-1);
  }
  function type(text: string) {
    setTyped(text);
    setChosen(
      options.find(({ label }) => label.toLowerCase() === text.trim().toLowerCase()) ?? null,
    );
    setOpen(true);
    setMarked(-1);
  }
  function move(by: 1 | -1) {
    setOpen(true);
    const count = fitting.length;
    if (count === 0) return;
    setMarked((now) => (now < 0 && by < 0 ? count - 1 : (now + by + count) % count));
  }
  function onKeyDown(event: KeyboardEvent) {
    if (event.key === "ArrowDown") move(1);
    else if (event.key === "ArrowUp") move(-1);
    else if (event.key === "Escape" && open) close();
    else if (event.key === "Enter" && open && marked >= 0) choose(fitting[marked]);
    else return;
    event.preventDefault();
  }
  return { chosen, typed, open, marked, fitting, choose, close, type, onKeyDown, setOpen };
}
