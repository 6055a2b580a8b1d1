/**
 * A brass peg on the board's rail. With a key on it, the ring goes over the peg and through the
 * tag's hole: in front of the card on its left, behind it on its right.
 */
export function Peg({ empty = false }: { empty?: boolean }) {
  return (
    <svg
      viewBox="0 0 44 54"
      aria-hidden="true"
      strokeLinecap="round"
      className="pointer-events-none absolute -top-7 left-1/2 z-10 h-[3.375rem] w-11 -translate-x-1/2"
    >
      {!empty && (
        <>
          <circle cx="22" cy="42" r="7" className="fill-paper stroke-ink" strokeWidth="2" />
          <path
            d="M22 8c8 0 11 8 11 19"
            className="fill-none stroke-mute"
            strokeWidth="2.5"
            strokeLinecap="butt"
          />
          <path
            d="M22 8c-8 0-11 9-11 19s4 14 10 15"
            className="fill-none stroke-mute"
            strokeWidth="2.5"
          />
        </>
      )}
      <circle cx="22" cy="11" r="8.5" className="fill-brass stroke-brass-dark" strokeWidth="1.5" />
      <circle cx="22" cy="11" r="4.5" className="fill-none stroke-brass-dark" strokeWidth="1.5" />
    </svg>
  );
}

/** The rail the pegs stand on, drawn by every cell to the row's end so that rows may wrap. */
export function Rail() {
  return (
    <span
      aria-hidden="true"
      className="absolute -left-8 -top-5 h-3 w-[200rem] border-y border-line bg-card print:hidden"
    />
  );
}
