import { wordmark } from "~/text/en/ui";

/** The product's name in stencil. */
export function Wordmark({ large = false }: { large?: boolean }) {
  return (
    <span className={`font-stencil leading-none tracking-wide ${large ? "text-4xl" : "text-2xl"}`}>
      {wordmark}
    </span>
  );
}
