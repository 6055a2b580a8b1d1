// Runs a TypeScript file: node scripts/run.mjs <file.ts> [arguments]
import { mkdirSync } from "node:fs";
import { basename, join, resolve } from "node:path";
import { pathToFileURL } from "node:url";
import { bundle } from "./lib/bundle.mjs";

const root = resolve(import.meta.dirname, "..");
const entry = process.argv[2];
if (!entry) throw new Error("which file?");
const folder = join(root, "node_modules", ".cache", "keypeg");
mkdirSync(folder, { recursive: true });
const outfile = join(folder, `${basename(entry, ".ts")}-${process.pid}.mjs`);
await bundle(root, resolve(entry), outfile);
process.argv.splice(1, 2, outfile);
await import(pathToFileURL(outfile).href);
