import { join, resolve } from "node:path";
import { pathToFileURL } from "node:url";

interface BuiltRoute {
  id: string;
  parentId?: string;
  path?: string;
  module: { loader?: unknown; action?: unknown };
}

/** A route of the production build: its address with `:params` in it, and what answers there. */
export interface Answering {
  address: string;
  loader: boolean;
  action: boolean;
}

/** Every route in the manifest of the build under test. */
export async function builtRoutes(): Promise<Answering[]> {
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
      address: addressOf(route) || "/",
      loader: route.module.loader !== undefined,
      action: route.module.action !== undefined,
    }));
}
