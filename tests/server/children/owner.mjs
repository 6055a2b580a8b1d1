// Starts two children as the commands do, one of which does not listen to SIGTERM; says so on a line.
import { Children } from "../../../scripts/lib/children.mjs";

const [folder, ending = "stay"] = process.argv.slice(2);
const children = new Children(folder);
try {
  await children.clearLeftovers();
} catch (error) {
  console.log(error.message);
  process.exit(1);
}
children.stopWith(process);
const plain = "setInterval(() => {}, 1000)";
const deaf = `process.on("SIGTERM", () => {}); ${plain}`;
const short = "setTimeout(() => {}, 300)";
const first = children.start("plain", process.execPath, ["-e", plain], {});
const second = children.start("other", process.execPath, ["-e", ending === "deaf" ? deaf : plain]);
if (ending === "dies") children.start("short", process.execPath, ["-e", short]);
setTimeout(() => console.log(`started ${first.pid} ${second.pid}`), 300);
setInterval(() => {}, 1000);
