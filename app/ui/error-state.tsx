import type { ReactNode } from "react";

/** What could not be shown or done, why if it is known, and what to do next. */
export function ErrorState({
  title,
  next,
  children,
  action,
  heading: Heading = "h2",
}: {
  title: string;
  /** What to do now, in one line. */
  next: ReactNode;
  children?: ReactNode;
  action?: ReactNode;
  heading?: "h1" | "h2";
}) {
  return (
    <div role="alert" className="rounded-lg border-2 border-red bg-card px-5 py-5">
      <Heading className="text-xl font-bold">{title}</Heading>
      {children && <div className="mt-1 max-w-prose text-mute">{children}</div>}
      <p className="mt-3 max-w-prose font-bold">{next}</p>
      {action && <div className="mt-4 flex flex-wrap gap-3">{action}</div>}
    </div>
  );
}
