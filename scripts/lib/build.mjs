import { createHash } from "node:crypto";
import { existsSync, readdirSync, readFileSync, writeFileSync } from "node:fs";
import { join } from "node:path";

const SOURCES = [
  "app",
  "public",
  "scripts",
  "server.ts",
  "package-lock.json",
  "vite.config.ts",
  "react-router.config.ts",
];

function sourceHash(root) {
  const hash = createHash("sha256");
  const add = (path) => hash.update(path).update(readFileSync(join(root, path)));
  for (const source of SOURCES) {
    if (source.includes(".")) {
      add(source);
      continue;
    }
    const entries = readdirSync(join(root, source), { withFileTypes: true, recursive: true });
    const files = entries
      .filter((entry) => entry.isFile())
      .map((entry) => join(entry.parentPath ?? entry.path, entry.name));
    for (const file of files.sort())
      hash.update(file.slice(root.length)).update(readFileSync(file));
  }
  return hash.digest("hex");
}

/** Builds into `folder` unless what lies there was built from these sources. */
export async function ensureBuild(children, root, folder) {
  const stamp = join(root, folder, "source-hash");
  const wanted = sourceHash(root);
  if (existsSync(stamp) && readFileSync(stamp, "utf8") === wanted) return;
  console.log("Building …");
  const env = { ...process.env, KEYPEG_BUILD_DIR: folder };
  const router = join(root, "node_modules/@react-router/dev/bin.cjs");
  const how = { cwd: root, env, show: false };
  for (const [name, args] of [
    [
      "build-router",
      [existsSync(router) ? router : join(root, "node_modules/@react-router/dev/bin.js"), "build"],
    ],
    ["build-server", [join(root, "scripts/build.mjs")]],
  ]) {
    if ((await children.run(name, process.execPath, args, how)) !== 0) {
      throw new Error(`The build failed; its log is ${name}.log in the data folder`);
    }
  }
  writeFileSync(stamp, wanted);
}
