import { build } from "esbuild";

/** Bundles a TypeScript entry for Node: packages stay outside, `~/` is app/. */
export function bundle(root, entry, outfile) {
  return build({
    entryPoints: [entry],
    outfile,
    bundle: true,
    platform: "node",
    format: "esm",
    target: "node20",
    packages: "external",
    jsx: "automatic",
    alias: { "~": `${root}/app` },
    sourcemap: "inline",
    logLevel: "warning",
  });
}
