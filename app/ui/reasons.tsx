/** Reasons against a key, each with what would clear it. */
export function Reasons({
  title,
  told,
}: {
  title?: string;
  told: readonly { why: string; clears: string }[];
}) {
  if (told.length === 0) return null;
  return (
    <section>
      {title && <h2 className="mb-2 text-xl font-bold">{title}</h2>}
      <ul className="space-y-3">
        {told.map(({ why, clears }) => (
          <li key={why} className="border-l-4 border-brass pl-3">
            <p className="font-bold">{why}</p>
            <p>{clears}</p>
          </li>
        ))}
      </ul>
    </section>
  );
}
