import type { ReactNode } from "react";

export type NoticeTone = "plain" | "good" | "limit" | "stop" | "must";

const BARS: Record<NoticeTone, string> = {
  plain: "border-ink",
  good: "border-green",
  limit: "border-yellow",
  stop: "border-red",
  must: "border-blue",
};

/** Words that stay on the screen until what they say is over. */
export function Notice({
  tone = "plain",
  title,
  announce = false,
  action,
  children,
}: {
  tone?: NoticeTone;
  /** Says the tone in words: "Inside 19 to 23." */
  title?: ReactNode;
  /** Read out when it appears: `true` at the next pause, "now" at once. */
  announce?: boolean | "now";
  action?: ReactNode;
  children?: ReactNode;
}) {
  const role = announce === "now" ? "alert" : announce ? "status" : undefined;
  return (
    <div
      role={role}
      className={`flex flex-wrap items-center justify-between gap-x-4 gap-y-3 rounded-r-md border-l-[6px] bg-card px-4 py-3 ${BARS[tone]}`}
    >
      <div className="min-w-0 max-w-prose">
        {title && <strong>{title}</strong>} {children}
      </div>
      {action}
    </div>
  );
}
