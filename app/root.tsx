import "./app.css";
import type { ReactNode } from "react";
import { Links, Meta, Outlet, Scripts, ScrollRestoration } from "react-router";
import type { Route } from "./+types/root";
import { crossSiteMiddleware } from "./auth/cross-site";
import { sessionMiddleware } from "./auth/session";
import { readableFormMiddleware } from "./http/readable-form";
import { RootError } from "./ui/root-error";
import { ThemeScript } from "./ui/theme-switch";

export const middleware: Route.MiddlewareFunction[] = [
  crossSiteMiddleware,
  readableFormMiddleware,
  sessionMiddleware,
];

export function Layout({ children }: { children: ReactNode }) {
  return (
    <html lang="en-US" suppressHydrationWarning>
      <head>
        <meta charSet="utf-8" />
        <meta name="viewport" content="width=device-width, initial-scale=1" />
        <link rel="icon" href="/icon.svg" type="image/svg+xml" />
        <link rel="apple-touch-icon" href="/apple-touch-icon.png" />
        <ThemeScript />
        <Meta />
        <Links />
      </head>
      <body>
        {children}
        <ScrollRestoration />
        <Scripts />
      </body>
    </html>
  );
}

export default function App() {
  return <Outlet />;
}

export function ErrorBoundary({ error }: Route.ErrorBoundaryProps) {
  return <RootError error={error} />;
}
