import type { ReactNode } from "react";
import { NavLink, Outlet, useRouteLoaderData } from "react-router";
import { frameOf } from "~/auth/frame-of";
import { requirePermission } from "~/auth/require-permission";
import { office } from "~/text/en/office";
import { PlaceFrame } from "~/ui/place-frame";
import type { Route } from "./+types/office-layout";
import { OfficeError } from "./page-parts";

export function loader({ context }: Route.LoaderArgs) {
  requirePermission(context, "truck.manage");
  return { frame: frameOf(context) };
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
  const read = useRouteLoaderData<typeof loader>("routes/office/office-layout");
  return (
    <PlaceFrame frame={read?.frame ?? null}>
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
    </PlaceFrame>
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
