import type { ReactNode } from "react";
import { Form, NavLink, Outlet, useRouteLoaderData } from "react-router";
import { requirePermission, requireSignedIn } from "~/auth/require-permission";
import { office } from "~/text/en/office";
import { uiText } from "~/text/en/ui";
import { Button } from "~/ui/button";
import { PageFrame } from "~/ui/page-frame";
import type { Route } from "./+types/office-layout";
import { OfficeError } from "./page-parts";

export function loader({ context }: Route.LoaderArgs) {
  const actor = requirePermission(context, "truck.manage");
  return { name: actor.name, carrier: requireSignedIn(context).carrierName };
}

const PARTS = [
  { to: "/office", label: office.title, end: true },
  { to: "/office/trucks", label: office.start.trucks },
  { to: "/office/yards", label: office.start.yards },
  { to: "/office/checks", label: office.start.checks },
  { to: "/office/people", label: office.start.people },
  { to: "/office/policy", label: office.start.policy },
];

export default function OfficeLayout() {
  return (
    <Frame>
      <Outlet />
    </Frame>
  );
}

function Frame({ children }: { children: ReactNode }) {
  const person = useRouteLoaderData<typeof loader>("routes/office/office-layout");
  return (
    <PageFrame
      person={person && { ...person, to: "/account" }}
      out={
        <Form method="post" action="/sign-out">
          <Button type="submit">{uiText.signOut}</Button>
        </Form>
      }
    >
      <nav aria-label={office.sections} className="mb-6 border-b border-line print:hidden">
        <ul className="flex flex-wrap gap-x-6">
          {PARTS.map(({ to, label, end }) => (
            <li key={to}>
              <NavLink
                to={to}
                end={end}
                className="inline-flex min-h-11 items-center border-b-4 border-transparent no-underline hover:border-line aria-[current=page]:border-enamel aria-[current=page]:font-bold"
              >
                {label}
              </NavLink>
            </li>
          ))}
        </ul>
      </nav>
      {children}
    </PageFrame>
  );
}

export const meta: Route.MetaFunction = () => [{ title: `${office.title} · ${office.product}` }];

export function ErrorBoundary() {
  return (
    <Frame>
      <OfficeError />
    </Frame>
  );
}
