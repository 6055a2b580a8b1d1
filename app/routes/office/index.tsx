import { Link } from "react-router";
import { requirePermission } from "~/auth/require-permission";
import { dbOf } from "~/context";
import { officeCounts } from "~/domain/trucks/office-counts";
import { office } from "~/text/en/office";
import { PageTitle } from "~/ui/page-frame";
import type { Route } from "./+types/index";

export async function loader({ context }: Route.LoaderArgs) {
  const actor = requirePermission(context, "truck.manage");
  return { counts: await officeCounts(dbOf(context), actor) };
}

export default function OfficeStart({ loaderData: { counts } }: Route.ComponentProps) {
  const words = office.start;
  const parts = [
    {
      to: "/office/trucks",
      label: words.trucks,
      line: words.trucksLine(counts.trucks, counts.outOfService),
      what: words.trucksWhat,
    },
    {
      to: "/office/yards",
      label: words.yards,
      line: words.yardsLine(counts.yards),
      what: words.yardsWhat,
    },
    {
      to: "/office/people",
      label: words.people,
      line: words.peopleLine(counts.people),
      what: words.peopleWhat,
    },
    {
      to: "/office/policy",
      label: words.policy,
      line: words.policyLine(counts.policyVersion),
      what: words.policyWhat,
    },
    {
      to: "/office/checks",
      label: words.checks,
      line: words.checksLine(counts.ownChecks),
      what: words.checksWhat,
    },
  ];
  return (
    <>
      <PageTitle title={office.title} lead={words.lead} />
      <ul className="divide-y divide-line border-y border-line">
        {parts.map(({ to, label, line, what }) => (
          <li key={to} className="grid gap-x-6 py-3 sm:grid-cols-[10rem_14rem_1fr]">
            <Link
              to={to}
              className="inline-flex min-h-11 items-center font-bold text-enamel underline"
            >
              {label}
            </Link>
            <span className="self-center">{line}</span>
            <span className="self-center text-mute">{what}</span>
          </li>
        ))}
      </ul>
    </>
  );
}

export const meta: Route.MetaFunction = () => [{ title: `${office.title} · ${office.product}` }];
