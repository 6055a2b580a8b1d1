import type { ReactNode } from "react";
import { Rail } from "./peg";

/** One yard's rail of pegs: its name and count, then its key tags in a row that may wrap. */
export function PegRow({
  yard,
  note,
  children,
}: {
  yard: string;
  /** "6 trucks" */
  note?: string;
  /** `Pegged` cells. */
  children: ReactNode;
}) {
  return (
    <section
      aria-label={yard}
      className="border-b border-line py-6 last:border-0 lg:grid lg:grid-cols-[9rem_1fr] lg:gap-6"
    >
      <div>
        <h2 className="text-lg font-bold">{yard}</h2>
        {note && <p className="text-sm text-mute">{note}</p>}
      </div>
      <ul className="grid grid-cols-[repeat(auto-fill,minmax(min(100%,8.75rem),1fr))] items-start gap-x-4 gap-y-10 overflow-hidden px-2 pb-9 pt-3 sm:grid-cols-[repeat(auto-fill,minmax(10.5rem,1fr))] sm:gap-x-6">
        {children}
      </ul>
    </section>
  );
}

/** A key tag's place on the rail. */
export function Pegged({ children }: { children: ReactNode }) {
  return (
    <li className="relative">
      <div className="absolute inset-x-0 top-7">
        <Rail />
      </div>
      {children}
    </li>
  );
}
