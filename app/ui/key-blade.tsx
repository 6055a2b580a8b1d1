/** The key itself, on the ring behind its tag: its blade shows below the card. */
export function KeyBlade({ large = false }: { large?: boolean }) {
  return (
    <svg
      viewBox="0 0 26 54"
      aria-hidden="true"
      strokeLinejoin="round"
      className={`absolute left-[16%] -z-20 -rotate-6 ${large ? "-bottom-11 h-22 w-11" : "-bottom-7 h-14 w-7"}`}
    >
      <path
        d="M6 0h14v24l3 2.5-3 2.5v5l-3.5 2.5 3.5 2.5v5L14.5 52h-3L6 46Z"
        className="fill-line stroke-ink"
        strokeWidth="2.2"
      />
      <path d="M11 0v43" className="stroke-mute" strokeWidth="2" />
    </svg>
  );
}
