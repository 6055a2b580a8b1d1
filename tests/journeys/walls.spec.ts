import { join, resolve } from "node:path";
import { pathToFileURL } from "node:url";
import { expect, test } from "@playwright/test";
import { signIn } from "./people";

interface BuiltRoute {
  id: string;
  parentId?: string;
  path?: string;
  index?: boolean;
  module: { loader?: unknown; action?: unknown };
}

/** Who may open what, said here once more and apart from the permission table. */
const OPEN = new Set(["/", "/safety", "/pieces", "/sign-in", "/sign-out", "/invitation/x"]);
const HOST = "tallowcreek.example";
const ROLES: [email: string, mayOpen: RegExp][] = [
  [`amos.delacroix@${HOST}`, /^\/(account|walk|api)/],
  [`gil.santoro@${HOST}`, /^\/(account|bench|board|api\/v1\/photos)/],
  [`joy.halloran@${HOST}`, /^\/(account|board|api\/v1\/photos\/[^/]+\/)/],
];

async function builtRoutes() {
  const file = join(resolve("build-test"), "server/index.js");
  const { routes } = (await import(pathToFileURL(file).href)) as {
    routes: Record<string, BuiltRoute>;
  };
  const addressOf = (route: BuiltRoute): string => {
    const above = route.parentId ? routes[route.parentId] : undefined;
    return `${above ? addressOf(above) : ""}${route.path ? `/${route.path}` : ""}`;
  };
  return Object.values(routes)
    .filter((route) => route.id !== "root")
    .map((route) => ({
      address: addressOf(route).replace(/:\w+/g, "x") || "/",
      loader: route.module.loader !== undefined,
      action: route.module.action !== undefined,
    }));
}

test("K7: no loader and no action of the build answers a stranger", async ({
  request,
  baseURL,
}) => {
  const routes = (await builtRoutes()).filter(({ address }) => !OPEN.has(address));
  expect(routes.length).toBeGreaterThan(20);
  for (const { address, loader, action } of routes) {
    expect(loader || action, `${address} has neither loader nor action`).toBe(true);
    const turnedAway = (status: number) => [302, 401, 405].includes(status);
    if (loader) {
      const answer = await request.get(address, { maxRedirects: 0 });
      expect(turnedAway(answer.status()), `GET ${address}: ${answer.status()}`).toBe(true);
      const { location = "/sign-in" } = answer.headers();
      expect(location, address).toContain("/sign-in");
    }
    if (action) {
      const method = address.startsWith("/api/v1/photos/") ? "PUT" : "POST";
      const sent = {
        method,
        maxRedirects: 0,
        headers: { Origin: baseURL ?? "" },
        form: { a: "b" },
      };
      const answer = await request.fetch(address, sent);
      expect(turnedAway(answer.status()), `${method} ${address}: ${answer.status()}`).toBe(true);
      const cross = await request.fetch(address, {
        ...sent,
        headers: { Origin: "https://else.example" },
      });
      expect(cross.status(), `cross-site ${address}`).toBe(403);
    }
  }
});

test("K7: no loader answers a person of the wrong role", async ({ browser }) => {
  const routes = (await builtRoutes()).filter(
    ({ address, loader }) => loader && !OPEN.has(address),
  );
  for (const [email, mayOpen] of ROLES) {
    const page = await signIn(browser, email);
    for (const { address } of routes) {
      const answer = await page.request.get(address, { maxRedirects: 0 });
      const expected = mayOpen.test(address) ? [200, 302, 404] : [403];
      expect(expected, `${email} at ${address}: ${answer.status()}`).toContain(answer.status());
    }
  }
});
