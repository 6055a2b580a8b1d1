import { spawnSync } from "node:child_process";
import { createHash } from "node:crypto";
import { existsSync, mkdirSync, readFileSync, writeFileSync } from "node:fs";
import { delimiter, join } from "node:path";

/** Debian packages that hold each program we start. */
const PACKAGE_OF = {
  mariadbd: "mariadb-server-core",
  "mariadb-install-db": "mariadb-server-core",
  mariadb: "mariadb-client-core",
  chromium: "chromium",
  units: "units",
};

/** Full path of a program, looked for where Debian puts it too. */
export function programPath(name) {
  const folders = [...(process.env.PATH ?? "").split(delimiter), "/usr/sbin", "/usr/bin", "/sbin"];
  return folders.map((folder) => join(folder, name)).find((path) => existsSync(path)) ?? null;
}

function run(command, args, env = {}) {
  const done = spawnSync(command, args, {
    stdio: ["ignore", "inherit", "inherit"],
    env: { ...process.env, ...env },
  });
  return done.status === 0;
}

/** Installs the Debian packages of programs that are missing; as root, or with sudo. */
export function ensurePrograms(names) {
  const missing = names.filter((name) => programPath(name) === null);
  if (missing.length === 0) return;
  const packages = [...new Set(missing.map((name) => PACKAGE_OF[name]))];
  const options = ["-o", "DPkg::Lock::Timeout=300", "-y", "--no-install-recommends"];
  const install = ["apt-get", ...options, "install", ...packages];
  const root = process.getuid() === 0;
  const line = `${root ? "" : "sudo "}apt-get update && ${root ? "" : "sudo "}${install.join(" ")}`;
  if (!root && programPath("sudo") === null) {
    throw new Error(
      `Missing: ${packages.join(", ")}. There is no sudo here; as root, run:\n  ${line}`,
    );
  }
  console.log(`Installing ${packages.join(", ")} …`);
  const as = (args) => (root ? args : ["sudo", "DEBIAN_FRONTEND=noninteractive", ...args]);
  const noAsk = { DEBIAN_FRONTEND: "noninteractive" };
  const [update, ...updateArgs] = as(["apt-get", "-o", "DPkg::Lock::Timeout=300", "-qq", "update"]);
  const [apt, ...aptArgs] = as([...install, "-qq"]);
  if (!run(update, updateArgs, noAsk) || !run(apt, aptArgs, noAsk)) {
    throw new Error(`Could not install ${packages.join(", ")}. Run:\n  ${line}`);
  }
  const still = names.filter((name) => programPath(name) === null);
  if (still.length > 0) throw new Error(`Still missing after the install: ${still.join(", ")}`);
}

/** Installs node_modules when the lock file is not the one they were installed from. */
export function ensureNodeModules(root) {
  const lock = createHash("sha256")
    .update(readFileSync(join(root, "package-lock.json")))
    .digest("hex");
  const stamp = join(root, "node_modules", ".keypeg-lock");
  if (existsSync(stamp) && readFileSync(stamp, "utf8") === lock) return;
  console.log("Installing packages …");
  if (!run("npm", ["ci", "--include=dev", "--no-audit", "--no-fund", "--loglevel=error"])) {
    throw new Error("npm ci failed");
  }
  mkdirSync(join(root, "node_modules"), { recursive: true });
  writeFileSync(stamp, lock);
}
