import { Link } from "react-router";
import { requirePermission } from "~/auth/require-permission";
import { dbOf } from "~/context";
import { listTrucks } from "~/domain/trucks/list-trucks";
import { listYards } from "~/domain/yards/read-yards";
import { office, unitKinds } from "~/text/en/office";
import { Empty, MainLink, PageHead, SavedNote, TextLink } from "../page-parts";
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
      <PageHead title={words.title}>
        {hasYard && <MainLink to="/office/trucks/new">{words.add}</MainLink>}
      </PageHead>
      <SavedNote />
      {!hasYard && (
        <Empty>
          {words.noYard} <TextLink to="/office/yards/new">{office.yards.add}</TextLink>
        </Empty>
      )}
      {hasYard && trucks.length === 0 && <Empty>{words.none}</Empty>}
      {trucks.length > 0 && (
        <table className="w-full border-y border-line text-left">
          <thead>
            <tr className="border-b border-line text-base text-mute">
              <th scope="col" className="py-2 pr-4">
                {columns.unit}
              </th>
              <th scope="col" className="hidden py-2 pr-4 sm:table-cell">
                {columns.kind}
              </th>
              <th scope="col" className="py-2 pr-4">
                {columns.yard}
              </th>
              <th scope="col" className="py-2">
                {columns.standing}
              </th>
            </tr>
          </thead>
          <tbody className="divide-y divide-line">
            {trucks.map((truck) => (
              <tr key={truck.id}>
                <th scope="row" className="py-1 pr-4 font-normal">
                  <Link
                    to={`/office/trucks/${truck.unitNumber}`}
                    className="inline-flex min-h-11 items-center font-stencil text-xl text-enamel underline"
                  >
                    {truck.unitNumber}
                  </Link>
                </th>
                <td className="hidden py-1 pr-4 sm:table-cell">{unitKinds[truck.kind]}</td>
                <td className="py-1 pr-4">{truck.yardName}</td>
                <td className="py-1">
                  <StandingOf standing={truck.standing} inService={truck.inService} />
                </td>
              </tr>
            ))}
          </tbody>
        </table>
      )}
    </>
  );
}

export const meta: Route.MetaFunction = () => [
  { title: `${office.trucks.title} · ${office.product}` },
];
