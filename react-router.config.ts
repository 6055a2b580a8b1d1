import type { Config } from "@react-router/dev/config";

export default {
  ssr: true,
  buildDirectory: process.env.KEYPEG_BUILD_DIR ?? "build",
  routeDiscovery: { mode: "initial" },
  prerender: ["/safety"],
  // The router compares Origin with the address it is asked at, which behind a proxy that ends TLS
  // is never the same. app/auth/cross-site compares with the public origin, on every route.
  allowedActionOrigins: ["**"],
  future: {
    v8_middleware: true,
    v8_passThroughRequests: true,
    v8_splitRouteModules: true,
    v8_trailingSlashAwareDataRequests: true,
    v8_viteEnvironmentApi: true,
  },
} satisfies Config;
