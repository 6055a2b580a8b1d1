// npm run preview: a read-only look at the built app on the stock server, page by public page.
import { join, resolve } from "node:path";
import { Children } from "./lib/children.mjs";
import { waitForAnswer } from "./lib/http.mjs";
import { freePort } from "./lib/ports.mjs";

const root = resolve(import.meta.dirname, "..");
const children = new Children(join(root, ".data", "preview"));
await children.clearLeftovers();
children.stopWith(process);
const port = await freePort();
children.start(
  "preview",
  process.execPath,
  [join(root, "node_modules/@react-router/serve/bin.js"), join(root, "build/server/index.js")],
  { cwd: root, env: { ...process.env, PORT: String(port), NODE_ENV: "production" } },
);
let code = 0;
try {
  const page = await waitForAnswer(`http://127.0.0.1:${port}/safety`, 20_000);
  const text = await page.text();
  if (!text.includes("<h1")) throw new Error("/safety has no heading");
  console.log("/safety answers on the stock server");
} catch (error) {
  console.error(error.message);
  code = 1;
}
await children.stop();
process.exit(code);
