import type { ClearsNot } from "~/domain/walks/counts-from";
import type { StandingWord } from "~/trade/standing/standing";
import type { WalkToSend } from "./read-walk";

export type SentWalk =
  | {
      state: "sent";
      standing: StandingWord;
      missing: string[];
      clearsNot: ClearsNot | null;
      photosLost: number;
    }
  | { state: "refused"; faults: string[] }
  | { state: "no-signal" };

/** Only an answer with our own receipt counts: a portal's page answers 200 too. */
async function send(address: string, id: string, init: RequestInit): Promise<Response | null> {
  try {
    const answer = await fetch(address, init);
    const ours = answer.headers.get("Keypeg-Receipt") === id;
    const problem = answer.headers.get("Content-Type")?.includes("problem+json");
    return ours || problem ? answer : null;
  } catch {
    return null;
  }
}

/** Sends the record first, then its photos. */
export async function sendWalk(walk: WalkToSend, signedAt: number): Promise<SentWalk> {
  const answer = await send("/api/v1/walks", walk.body.id, {
    method: "POST",
    headers: {
      "Content-Type": "application/json",
      "Keypeg-Age": String(Math.max(0, Date.now() - signedAt)),
    },
    body: JSON.stringify(walk.body),
  });
  if (!answer) return { state: "no-signal" };
  const said = await answer.json();
  if (!answer.ok) {
    const errors: { detail: string }[] = said.errors ?? [];
    return {
      state: "refused",
      faults: errors.length > 0 ? errors.map((e) => e.detail) : [said.title],
    };
  }
  let photosLost = 0;
  for (const [id, file] of walk.files) {
    const stored = await send(`/api/v1/photos/${id}`, id, { method: "PUT", body: file });
    if (!stored?.ok) photosLost += 1;
  }
  const { standing, missing, clearsNot } = said;
  return { state: "sent", standing, missing, clearsNot, photosLost };
}
