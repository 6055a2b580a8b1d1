/** The key itself, on the ring behind its tag: its blade shows below the card. */
export function KeyBlade({ large = false }: { large?: boolean }) {
  return (
    <svg
      viewBox="0 0 20 44"
      aria-hidden="true"
      strokeLinejoin="round"
      className={`absolute left-[16%] -z-20 -rotate-6 ${large ? "-bottom-9 h-16 w-7" : "-bottom-5 h-9 w-4"}`}
    >
      <path
        d="M4 0h12v14l-3.5 3 3.5 3v4l-3.5 3 3.5 3v4L11 43H8l-4-6z"
        className="fill-line stroke-ink"
        strokeWidth="2"
      />
      <path d="M8 0v34" className="stroke-mute" strokeWidth="1.5" />
    </svg>
  );
}
