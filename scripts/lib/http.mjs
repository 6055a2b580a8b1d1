import { setTimeout as wait } from "node:timers/promises";

/** Waits until an address answers 200; throws when it has not within the time. */
export async function waitForAnswer(url, withinMs = 60_000) {
  const end = Date.now() + withinMs;
  for (;;) {
    try {
      const answer = await fetch(url, { signal: AbortSignal.timeout(2000) });
      if (answer.ok) return answer;
    } catch {
      // Not up yet.
    }
    if (Date.now() > end) throw new Error(`${url} did not answer within ${withinMs / 1000} s`);
    await wait(150);
  }
}
