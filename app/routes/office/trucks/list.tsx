import { Link } from "react-router";
import { requirePermission } from "~/auth/require-permission";
import { dbOf } from "~/context";
import { listTrucks } from "~/domain/trucks/list-trucks";
import { listYards } from "~/domain/yards/read-yards";
import { office, unitKinds } from "~/text/en/office";
import { ButtonLink } from "~/ui/button";
import { EmptyState } from "~/ui/empty-state";
import { PageTitle } from "~/ui/page-frame";
import { Table } from "~/ui/table";
import { SavedNote } from "../page-parts";
import { StandingOf } from "../standing-of";
import type { Route } from "./+types/list";

export async function loader({ context }: Route.LoaderArgs) {
  const actor = requirePermission(context, "truck.manage");
  const db = dbOf(context);
  return {
    trucks: await listTrucks(db, actor),
    hasYard: (await listYards(db, actor)).length > 0,
  };
}

export default function Trucks({ loaderData: { trucks, hasYard } }: Route.ComponentProps) {
  const words = office.trucks;
  const { columns } = words;
  return (
    <>
      <PageTitle title={words.title}>
        {hasYard && (
          <ButtonLink kind="main" to="/office/trucks/new">
            {words.add}
          </ButtonLink>
        )}
      </PageTitle>
      <SavedNote />
      {!hasYard && (
        <EmptyState
          title={words.noYard}
          action={<ButtonLink to="/office/yards/new">{office.yards.add}</ButtonLink>}
        />
      )}
      {hasYard && trucks.length === 0 && <EmptyState title={words.none} />}
      {trucks.length > 0 && (
        <Table
          caption={words.title}
          captionHidden
          rows={trucks}
          rowKey={(truck) => truck.id}
          columns={[
            {
              key: "unit",
              head: columns.unit,
              rowHead: true,
              cell: ({ unitNumber }) => (
                <Link
                  to={`/office/trucks/${unitNumber}`}
                  className="-my-2 inline-flex min-h-11 items-center font-stencil text-xl font-normal text-enamel underline"
                >
                  {unitNumber}
                </Link>
              ),
            },
            { key: "kind", head: columns.kind, cell: ({ kind }) => unitKinds[kind] },
            { key: "yard", head: columns.yard, cell: ({ yardName }) => yardName },
            {
              key: "standing",
              head: columns.standing,
              cell: (truck) => <StandingOf standing={truck.standing} inService={truck.inService} />,
            },
          ]}
        />
      )}
    </>
  );
}

export const meta: Route.MetaFunction = () => [
  { title: `${office.trucks.title} · ${office.product}` },
];
