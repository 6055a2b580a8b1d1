import type { ReactNode } from "react";
import { doorText } from "~/text/en/auth";
import { ThemeSwitch } from "~/ui/theme-switch";
import { Wordmark } from "~/ui/wordmark";

/** The page outside the door: one narrow card under the wordmark. */
export function DoorPage({ title, children }: { title: string; children: ReactNode }) {
  return (
    <main className="mx-auto flex min-h-dvh max-w-md flex-col px-4 py-8 sm:py-16">
      <div className="flex items-center justify-between gap-4">
        <Wordmark large />
        <ThemeSwitch />
      </div>
      <p className="mt-1 text-mute">{doorText.motto}</p>
      <section className="mt-8 rounded-lg border-2 border-ink bg-card p-5 sm:p-8">
        <h1 className="text-2xl font-bold">{title}</h1>
        <div className="mt-5 space-y-5">{children}</div>
      </section>
    </main>
  );
}
