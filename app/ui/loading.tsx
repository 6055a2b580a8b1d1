import { uiText } from "~/text/en/ui";

/** Words while something loads or is sent; three pegs pass a key along beside them. */
export function Loading({ children = uiText.loading }: { children?: string }) {
  return (
    <p role="status" className="flex items-center gap-3 text-mute">
      <span aria-hidden="true" className="flex gap-1.5">
        {["", "[animation-delay:.3s]", "[animation-delay:.6s]"].map((delay) => (
          <span
            key={delay}
            className={`size-2.5 motion-safe:animate-pulse rounded-full bg-brass ${delay}`}
          />
        ))}
      </span>
      {children}
    </p>
  );
}
