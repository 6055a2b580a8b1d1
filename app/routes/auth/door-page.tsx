import type { ReactNode } from "react";
import { doorText } from "~/text/en/auth";

/** The page outside the door: one narrow card under the wordmark. */
export function DoorPage({ title, children }: { title: string; children: ReactNode }) {
  return (
    <main className="mx-auto flex min-h-dvh max-w-md flex-col px-4 py-8 sm:py-16">
      <p className="font-stencil text-3xl text-ink">{doorText.wordmark}</p>
      <p className="mt-1 text-mute">{doorText.motto}</p>
      <section className="mt-8 rounded-md border border-line bg-card p-5 sm:p-8">
        <h1 className="text-2xl font-bold">{title}</h1>
        <div className="mt-5 space-y-5">{children}</div>
      </section>
    </main>
  );
}
