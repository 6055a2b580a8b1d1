// After `react-router build`: the server bundle, precompressed files, and the hashes of inline scripts.
import { createHash } from "node:crypto";
import { readdirSync, readFileSync, rmSync, writeFileSync } from "node:fs";
import { join, relative, resolve } from "node:path";
import { brotliCompressSync, constants, gzipSync } from "node:zlib";
import { bundle } from "./lib/bundle.mjs";

const root = resolve(import.meta.dirname, "..");
const out = resolve(root, process.env.KEYPEG_BUILD_DIR ?? "build");
const client = join(out, "client");

function files(folder) {
  return readdirSync(folder, { withFileTypes: true, recursive: true })
    .filter((entry) => entry.isFile())
    .map((entry) => join(entry.parentPath ?? entry.path, entry.name));
}

function inlineScriptHashes(html) {
  return [...html.matchAll(/<script(?![^>]*\ssrc=)[^>]*>([\s\S]*?)<\/script>/g)].map(
    ([, code]) => `'sha256-${createHash("sha256").update(code).digest("base64")}'`,
  );
}

await bundle(root, join(root, "server.ts"), join(out, "server.mjs"));
rmSync(join(client, ".vite"), { recursive: true, force: true });

const hashes = {};
for (const file of files(client)) {
  if (/\.(br|gz)$/.test(file)) continue;
  const bytes = readFileSync(file);
  if (file.endsWith(".html")) {
    const address = `/${relative(client, file).replace(/\/?index\.html$/, "")}`;
    hashes[address] = [...new Set(inlineScriptHashes(bytes.toString("utf8")))];
  }
  if (!/\.(js|css|html|svg|json|webmanifest|data)$/.test(file) || bytes.length < 512) continue;
  const params = { [constants.BROTLI_PARAM_QUALITY]: 11 };
  writeFileSync(`${file}.br`, brotliCompressSync(bytes, { params }));
  writeFileSync(`${file}.gz`, gzipSync(bytes, { level: 9 }));
}
writeFileSync(join(out, "script-hashes.json"), JSON.stringify(hashes));
