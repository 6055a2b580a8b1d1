// npm test: everything the tests need, with data, ports and build of their own, then all of them.
// npm test -- tests/server/gate-update.test.ts   runs only what is named.
import { existsSync, readFileSync, rmSync } from "node:fs";
import { join, resolve } from "node:path";
import { ensureBuild } from "./lib/build.mjs";
import { Children } from "./lib/children.mjs";
import { waitForAnswer } from "./lib/http.mjs";
import { ensureNodeModules, ensurePrograms, programPath } from "./lib/packages.mjs";
import { freePort } from "./lib/ports.mjs";
import { migrationEnvironment, serverEnvironment, startServices } from "./lib/services.mjs";

const root = resolve(import.meta.dirname, "..");
const folder = join(root, ".data", "test");
const DATABASE = "keypeg_journeys";
const children = new Children(folder);
const named = process.argv.slice(2);
const forVitest = named.filter((name) => !name.includes("journeys"));
const forJourneys = named.filter((name) => name.includes("journeys"));
const runVitest = named.length === 0 || forVitest.length > 0;
const runJourneys = named.length === 0 || forJourneys.length > 0;
const sum = { passed: 0, failed: 0 };

/** A runner that ended badly without saying how many failed counts as one failure. */
function add(passed, failed, code) {
  sum.passed += passed;
  sum.failed += failed > 0 || code === 0 ? failed : 1;
}

function report(file) {
  return existsSync(file) ? JSON.parse(readFileSync(file, "utf8")) : null;
}

async function vitest(services) {
  const file = join(folder, "vitest.json");
  rmSync(file, { force: true });
  const env = {
    ...process.env,
    ...serverEnvironment(services, "none", 0),
    KEYPEG_TEST_ADMIN_URL: services.mariadb.adminUrl,
    KEYPEG_TEST_MAIL_PAGE: services.mailPage,
    KEYPEG_LOG_LEVEL: "silent",
  };
  const reporters = ["--reporter=default", "--reporter=json", `--outputFile.json=${file}`];
  const args = ["node_modules/vitest/vitest.mjs", "run", ...reporters, ...forVitest];
  const code = await children.run("vitest", process.execPath, args, { cwd: root, env });
  const result = report(file);
  add(result?.numPassedTests ?? 0, result?.numFailedTests ?? 0, code);
}

async function journeys(services) {
  const port = await freePort();
  const environment = { ...process.env, ...serverEnvironment(services, DATABASE, port) };
  const migration = { ...process.env, ...migrationEnvironment(services, DATABASE) };
  const step = async (name, args, env) => {
    if ((await children.run(name, process.execPath, args, { cwd: root, env })) !== 0) {
      throw new Error(`${name} failed`);
    }
  };
  await step("migrate", ["scripts/migrate.mjs"], migration);
  await step("demo", ["scripts/run.mjs", "fixtures/demo/load.ts"], environment);
  await ensureBuild(children, root, "build-test");
  children.start("server", process.execPath, [join(root, "build-test/server.mjs")], {
    cwd: root,
    env: { ...environment, NODE_ENV: "production" },
  });
  await waitForAnswer(`http://127.0.0.1:${port}/healthz`);
  const file = join(folder, "playwright.json");
  rmSync(file, { force: true });
  const env = {
    ...environment,
    KEYPEG_ORIGIN: `http://127.0.0.1:${port}`,
    KEYPEG_TEST_MAIL_PAGE: services.mailPage,
    KEYPEG_CHROMIUM: programPath("chromium"),
    PLAYWRIGHT_JSON_OUTPUT_NAME: file,
  };
  const args = [
    "node_modules/@playwright/test/cli.js",
    "test",
    "--reporter=list,json",
    ...forJourneys,
  ];
  const code = await children.run("journeys", process.execPath, args, { cwd: root, env });
  const stats = report(file)?.stats;
  add((stats?.expected ?? 0) + (stats?.flaky ?? 0), stats?.unexpected ?? 0, code);
}

let code = 1;
try {
  await children.clearLeftovers();
  children.stopWith(process);
  ensurePrograms(["mariadbd", "mariadb-install-db", "mariadb", "chromium", "units"]);
  ensureNodeModules(root);
  // Tests begin with an empty database, whatever an earlier run left.
  rmSync(join(folder, "mariadb"), { recursive: true, force: true });
  rmSync(join(folder, "objects"), { recursive: true, force: true });
  const services = await startServices(children, root, folder, { fast: true });
  if (runVitest) await vitest(services);
  if (runJourneys) await journeys(services);
  code = sum.failed === 0 && sum.passed > 0 ? 0 : 1;
} catch (error) {
  console.error(error.message);
  sum.failed += 1;
}
await children.stop();
console.log(`${sum.passed} passed, ${sum.failed} failed`);
process.exit(code);
