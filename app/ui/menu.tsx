import { DropdownMenu } from "radix-ui";
import type { ReactNode } from "react";
import { Link } from "react-router";
import { buttonClass } from "./button";

export interface MenuItem {
  key: string;
  label: string;
  /** Goes there, or does that. */
  to?: string;
  onSelect?: () => void;
  danger?: boolean;
}

const ITEM =
  "flex min-h-12 w-full cursor-pointer items-center rounded-sm px-3 no-underline outline-none data-highlighted:bg-enamel data-highlighted:text-card";

/** What else can be done here, behind one button. Nothing a person needs every day. */
export function Menu({ label, items }: { label: ReactNode; items: readonly MenuItem[] }) {
  return (
    // Not modal: a modal one writes a style element, which the content policy refuses.
    <DropdownMenu.Root modal={false}>
      <DropdownMenu.Trigger className={buttonClass({})}>
        {label}
        <svg viewBox="0 0 12 8" aria-hidden="true" className="h-2 w-3">
          <path d="m1 1.5 5 5 5-5" className="fill-none stroke-current" strokeWidth="2" />
        </svg>
      </DropdownMenu.Trigger>
      <DropdownMenu.Content
        align="end"
        sideOffset={6}
        collisionPadding={16}
        className="z-40 min-w-48 max-w-[calc(100vw-2rem)] rounded-md border-2 border-ink bg-card p-1.5 text-ink"
      >
        {items.map(({ key, label: words, to, onSelect, danger }) => (
          <DropdownMenu.Item
            key={key}
            asChild={to !== undefined}
            onSelect={onSelect}
            className={`${ITEM} ${danger ? "font-bold text-red data-highlighted:bg-red" : ""}`}
          >
            {to === undefined ? words : <Link to={to}>{words}</Link>}
          </DropdownMenu.Item>
        ))}
      </DropdownMenu.Content>
    </DropdownMenu.Root>
  );
}
