// npm start: everything Keypeg needs on this machine, then Keypeg with its demo.
import { existsSync, readFileSync } from "node:fs";
import { join, resolve } from "node:path";
import { ensureBuild } from "./lib/build.mjs";
import { Children } from "./lib/children.mjs";
import { waitForAnswer } from "./lib/http.mjs";
import { ensureNodeModules, ensurePrograms } from "./lib/packages.mjs";
import { freePort } from "./lib/ports.mjs";
import { migrationEnvironment, serverEnvironment, startServices } from "./lib/services.mjs";

const root = resolve(import.meta.dirname, "..");
const folder = join(root, ".data", "start");
const DATABASE = "keypeg";
const children = new Children(folder);

function signIns() {
  const file = join(root, "fixtures/demo/sign-ins.json");
  if (!existsSync(file)) return "";
  const people = JSON.parse(readFileSync(file, "utf8"));
  return people.map(({ role, email }) => `    ${role.padEnd(12)} ${email}`).join("\n");
}

try {
  await children.clearLeftovers();
  children.stopWith(process);
  ensurePrograms(["mariadbd", "mariadb-install-db", "mariadb"]);
  ensureNodeModules(root);
  console.log("Starting the database and the stand-ins for files and mail …");
  const services = await startServices(children, root, folder, { smtpPort: 4190, mailPort: 4191 });
  const port = await freePort(Number(process.env.PORT ?? 4180));
  const environment = { ...process.env, ...serverEnvironment(services, DATABASE, port) };
  const migrate = {
    cwd: root,
    env: { ...process.env, ...migrationEnvironment(services, DATABASE) },
  };
  if ((await children.run("migrate", process.execPath, ["scripts/migrate.mjs"], migrate)) !== 0) {
    throw new Error("The migration failed");
  }
  const demo = ["scripts/run.mjs", "fixtures/demo/load.ts"];
  if ((await children.run("demo", process.execPath, demo, { cwd: root, env: environment })) !== 0) {
    throw new Error("The demo could not be loaded");
  }
  await ensureBuild(children, root, "build");
  children.start("server", process.execPath, [join(root, "build/server.mjs")], {
    cwd: root,
    env: { ...environment, NODE_ENV: "production" },
  });
  await waitForAnswer(`http://127.0.0.1:${port}/healthz`);
  console.log(`
  Keypeg      http://127.0.0.1:${port}/
  Its mail    ${services.mailPage}   (sign-in codes arrive here)

  Sign in as
${signIns()}

  Ctrl-C ends it all.`);
} catch (error) {
  console.error(error.message);
  await children.stop();
  process.exit(1);
}
