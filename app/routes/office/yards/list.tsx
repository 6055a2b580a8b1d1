import { Link } from "react-router";
import { requirePermission } from "~/auth/require-permission";
import { dbOf } from "~/context";
import { listYards } from "~/domain/yards/read-yards";
import { shownClock } from "~/domain/yards/shown-clock";
import { shownElevation } from "~/domain/yards/yard-input";
import { office, withUnit } from "~/text/en/office";
import { ButtonLink } from "~/ui/button";
import { EmptyState } from "~/ui/empty-state";
import { PageTitle } from "~/ui/page-frame";
import { SavedNote } from "../page-parts";
import type { Route } from "./+types/list";

export async function loader({ context }: Route.LoaderArgs) {
  const actor = requirePermission(context, "truck.manage");
  const yards = await listYards(dbOf(context), actor);
  return {
    yards: yards.map(({ elevationM, shopOpensMinute, ...yard }) => ({
      ...yard,
      elevation: withUnit(shownElevation(elevationM), "ft"),
      opens: shownClock(shopOpensMinute),
    })),
  };
}

export default function Yards({ loaderData: { yards } }: Route.ComponentProps) {
  const words = office.yards;
  return (
    <>
      <PageTitle title={words.title}>
        <ButtonLink kind="main" to="/office/yards/new">
          {words.add}
        </ButtonLink>
      </PageTitle>
      <SavedNote />
      {yards.length === 0 ? (
        <EmptyState title={words.none} />
      ) : (
        <ul className="divide-y divide-line border-y border-line">
          {yards.map((yard) => (
            <li
              key={yard.id}
              className="grid gap-x-6 py-3 sm:grid-cols-[minmax(10rem,2fr)_2fr_1fr_2fr_1fr] sm:items-center"
            >
              <Link
                to={`/office/yards/${yard.id}`}
                className="inline-flex min-h-11 items-center font-bold text-enamel underline"
              >
                {yard.name}
              </Link>
              <span>{yard.zone.replaceAll("_", " ")}</span>
              <span className="tabular-nums">{yard.elevation}</span>
              <span className="tabular-nums">{words.opens(yard.opens)}</span>
              <span>{words.trucks(yard.trucks)}</span>
            </li>
          ))}
        </ul>
      )}
    </>
  );
}

export const meta: Route.MetaFunction = () => [
  { title: `${office.yards.title} · ${office.product}` },
];
