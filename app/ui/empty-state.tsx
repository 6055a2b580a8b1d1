import type { ReactNode } from "react";

/** Nothing here, said plainly, with what would bring something here. */
export function EmptyState({
  title,
  children,
  action,
}: {
  title: string;
  children?: ReactNode;
  action?: ReactNode;
}) {
  return (
    <div className="rounded-lg border-2 border-dashed border-edge px-5 py-6">
      <svg viewBox="0 0 44 24" aria-hidden="true" className="mb-3 h-6 w-11">
        <path d="M2 12h40" className="stroke-line" strokeWidth="6" strokeLinecap="round" />
        <circle cx="22" cy="12" r="8.5" className="fill-brass stroke-brass-dark" />
        <circle cx="22" cy="12" r="4.5" className="fill-none stroke-brass-dark" />
      </svg>
      <p className="text-lg font-bold">{title}</p>
      {children && <div className="mt-1 max-w-prose text-mute">{children}</div>}
      {action && <div className="mt-4">{action}</div>}
    </div>
  );
}
