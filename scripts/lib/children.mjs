import { spawn } from "node:child_process";
import {
  closeSync,
  existsSync,
  mkdirSync,
  openSync,
  readFileSync,
  rmSync,
  writeFileSync,
} from "node:fs";
import { join } from "node:path";
import { setTimeout as wait } from "node:timers/promises";

/** When a process started, in clock ticks since boot: with its pid it names one process for good. */
function startTime(pid) {
  try {
    const stat = readFileSync(`/proc/${pid}/stat`, "utf8");
    return stat.slice(stat.lastIndexOf(")") + 2).split(" ")[19];
  } catch {
    return null;
  }
}

function isAlive({ pid, start }) {
  return startTime(pid) === start && start !== null;
}

async function end(process_, graceMs) {
  if (!isAlive(process_)) return;
  process.kill(process_.pid, "SIGTERM");
  for (let waited = 0; waited < graceMs && isAlive(process_); waited += 50) await wait(50);
  if (isAlive(process_)) process.kill(process_.pid, "SIGKILL");
}

/**
 * The processes one command starts, written to a file as they start, so that the next run can
 * clear what a SIGKILL left behind.
 */
export class Children {
  #file;
  #folder;
  #running = [];
  #ending = null;

  constructor(folder) {
    this.#folder = folder;
    this.#file = join(folder, "processes.json");
    mkdirSync(folder, { recursive: true });
  }

  /** Ends what an earlier run left. Throws when that run is still alive. */
  async clearLeftovers() {
    if (!existsSync(this.#file)) return;
    const { owner, children } = JSON.parse(readFileSync(this.#file, "utf8"));
    if (isAlive(owner)) throw new Error(`already running, as process ${owner.pid}`);
    for (const child of children) await end(child, 10_000);
    rmSync(this.#file);
  }

  #write() {
    const owner = { pid: process.pid, start: startTime(process.pid) };
    const children = this.#running.map(({ pid, start }) => ({ pid, start }));
    writeFileSync(this.#file, JSON.stringify({ owner, children }));
  }

  /** Starts a process whose output goes to a log of its own; ends the run if it ends by itself. */
  start(name, command, args, options = {}) {
    const log = openSync(join(this.#folder, `${name}.log`), "w");
    const stdio = options.show ? ["ignore", "inherit", "inherit"] : ["ignore", log, log];
    const child = spawn(command, args, { ...options, stdio, detached: true });
    closeSync(log);
    const entry = { name, pid: child.pid, start: startTime(child.pid) };
    this.#running.push(entry);
    this.#write();
    entry.exited = new Promise((resolve) => {
      child.on("error", (error) => resolve(error.message));
      child.on("exit", (code, signal) => resolve(signal ?? code));
    });
    entry.exited.then((how) => {
      if (this.#ending || options.mayEnd) return;
      console.error(
        `${name} ended by itself (${how}); its log is ${join(this.#folder, `${name}.log`)}`,
      );
      this.stop().then(() => process.exit(1));
    });
    return entry;
  }

  /** Runs a process to its end; resolves with its exit code. */
  async run(name, command, args, options = {}) {
    const entry = this.start(name, command, args, { show: true, mayEnd: true, ...options });
    const how = await entry.exited;
    this.#running = this.#running.filter((other) => other !== entry);
    this.#write();
    return typeof how === "number" ? how : 1;
  }

  /** Ends all, newest first: the server before its database. */
  stop() {
    this.#ending ??= (async () => {
      for (const entry of [...this.#running].reverse()) await end(entry, 15_000);
      rmSync(this.#file, { force: true });
    })();
    return this.#ending;
  }

  /** Ends all on Ctrl-C, SIGTERM, SIGHUP, or when whoever started this is gone. */
  stopWith(process_) {
    const parent = process_.ppid;
    const leave = async (code) => {
      await this.stop();
      process_.exit(code);
    };
    process_.on("SIGINT", () => leave(130));
    process_.on("SIGTERM", () => leave(143));
    process_.on("SIGHUP", () => leave(129));
    setInterval(() => {
      if (process_.ppid !== parent) leave(1);
    }, 1000).unref();
  }
}
