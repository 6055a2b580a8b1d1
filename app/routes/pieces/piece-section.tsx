import type { ReactNode } from "react";

/** One family of pieces under its heading. */
export function PieceSection({
  id,
  title,
  children,
}: {
  id: string;
  title: string;
  children: ReactNode;
}) {
  return (
    <section aria-labelledby={id} className="mb-14">
      <h2 id={id} className="mb-5 border-b border-line pb-1 text-2xl font-bold">
        {title}
      </h2>
      <div className="space-y-6">{children}</div>
    </section>
  );
}

/** One state, with its name over it. */
export function Shown({ name, children }: { name: string; children: ReactNode }) {
  return (
    <div>
      <h3 className="mb-2 text-sm text-mute">{name}</h3>
      {children}
    </div>
  );
}
