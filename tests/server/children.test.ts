import { type ChildProcess, spawn } from "node:child_process";
import { mkdtempSync, readFileSync, rmSync, writeFileSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { afterEach, beforeEach, expect, test } from "vitest";

const OWNER = "tests/server/children/owner.mjs";
let folder: string;
let alive: number[] = [];

beforeEach(() => {
  folder = mkdtempSync(join(tmpdir(), "kp-"));
});
afterEach(() => {
  for (const pid of alive.filter(runs)) process.kill(pid, "SIGKILL");
  alive = [];
  rmSync(folder, { recursive: true, force: true });
});

function runs(pid: number): boolean {
  try {
    // A zombie is dead; only nobody has asked yet.
    return !/^\d+ \(.*\) Z/.test(readFileSync(`/proc/${pid}/stat`, "utf8"));
  } catch {
    return false;
  }
}

function lineOf(child: ChildProcess): Promise<string> {
  return new Promise((resolve) => {
    child.stdout?.once("data", (data: Buffer) => resolve(String(data).trim()));
  });
}

function exitOf(child: ChildProcess): Promise<number | NodeJS.Signals | null> {
  return new Promise((resolve) => child.once("exit", (code, signal) => resolve(code ?? signal)));
}

/** A command with two children running; `under` is a process between us and it. */
async function started(ending = "stay", under = false) {
  const command = under
    ? spawn("sh", ["-c", `"${process.execPath}" ${OWNER} ${folder} ${ending}; true`])
    : spawn(process.execPath, [OWNER, folder, ending]);
  const exited = exitOf(command);
  const line = await lineOf(command);
  const pids = line.match(/\d+/g)?.map(Number) ?? [];
  expect(line).toMatch(/^started \d+ \d+$/);
  const owner = JSON.parse(readFileSync(join(folder, "processes.json"), "utf8")).owner.pid;
  alive.push(...pids, owner, command.pid!);
  return { command, exited, pids, owner: owner as number };
}

const noneRuns = (pids: number[]) => expect.poll(() => pids.filter(runs), { timeout: 25_000 });

test.each([
  ["SIGTERM", 143],
  ["SIGINT", 130],
  ["SIGHUP", 129],
] as const)("%s ends the children and then the command", async (signal, code) => {
  const { command, exited, pids } = await started();
  command.kill(signal);
  expect(await exited).toBe(code);
  expect(pids.filter(runs)).toEqual([]);
});

test("a child that does not listen to SIGTERM is killed in the end", async () => {
  const { command, exited, pids } = await started("deaf");
  command.kill("SIGTERM");
  expect(await exited).toBe(143);
  expect(pids.filter(runs)).toEqual([]);
}, 30_000);

test("a lost parent ends the command and its children", async () => {
  const { command, pids, owner } = await started("stay", true);
  command.kill("SIGKILL");
  await noneRuns([...pids, owner]).toEqual([]);
}, 30_000);

test("a child that ends by itself ends the rest", async () => {
  const { exited, pids } = await started("dies");
  expect(await exited).toBe(1);
  expect(pids.filter(runs)).toEqual([]);
});

test("what a SIGKILL left running is cleared by the next run, by pid and start time", async () => {
  const first = await started();
  first.command.kill("SIGKILL");
  await first.exited;
  expect(first.pids.filter(runs)).toEqual(first.pids);
  const second = await started();
  expect(first.pids.filter(runs)).toEqual([]);
  expect(second.pids.filter(runs)).toEqual(second.pids);
  second.command.kill("SIGTERM");
  await second.exited;
});

test("a process that has the pid of one left behind, and another start time, is not touched", async () => {
  const stranger = spawn(process.execPath, ["-e", "setInterval(() => {}, 1000)"]);
  alive.push(stranger.pid!);
  const children = [{ pid: stranger.pid, start: "1" }];
  const owner = { pid: 999_999, start: "1" };
  writeFileSync(join(folder, "processes.json"), JSON.stringify({ owner, children }));
  const { command, exited } = await started();
  expect(runs(stranger.pid!)).toBe(true);
  command.kill("SIGTERM");
  await exited;
});

test("a second run beside a living one says so and leaves it alone", async () => {
  const first = await started();
  const second = spawn(process.execPath, [OWNER, folder]);
  const exited = exitOf(second);
  expect(await lineOf(second)).toBe(`already running, as process ${first.owner}`);
  expect(await exited).toBe(1);
  expect(first.pids.filter(runs)).toEqual(first.pids);
  first.command.kill("SIGTERM");
  await first.exited;
});
