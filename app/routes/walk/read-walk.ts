import { v7 as uuidv7 } from "uuid";
import type { OpenTagFact } from "~/domain/gate/read-facts";
import type { Colour } from "~/trade/limits";
import type { Answer, Answers, DrainAnswer } from "~/trade/sheet/answers";
import { type Check, COULD_NOT_CHECK, NOT_FITTED, type WalkKind } from "~/trade/sheet/check";
import { shrinkPhoto } from "./shrink-photo";

/** Values of a check's answer that are no problem. */
export const GOOD = "good";
export const RAN = "ran";
/** Prefix of what is said of the tag that hangs at a check: "seen:same". */
export const SEEN = "seen:";

type Part = "answer" | "value" | "heard" | "amount" | "what" | "shut" | "note" | "hold" | "photo";

/** Name of a check's control in the form. */
export function fieldOf(key: string, part: Part): string {
  return `${key}:${part}`;
}

interface SeenTag {
  id: string;
  tagId: string;
  seen: "same" | "worse" | "gone";
  colour: Colour | null;
  note: string | null;
}

interface NewTag {
  id: string;
  checkKey: string;
  problemKey: string;
  colour: Colour;
  note: string | null;
}

export interface WalkToSend {
  body: {
    id: string;
    truckId: string;
    kind: WalkKind;
    baseWalkId: string | null;
    sheetHash: string;
    signedAt: string;
    answers: Answers;
    tags: NewTag[];
    seenTags: SeenTag[];
    photos: { id: string; tagId: string; sha256: string; bytes: number }[];
    signature: { name: string; wording: string };
  };
  files: Map<string, Blob>;
}

type Said = (part: Part) => string;

function drainAnswer(said: Said): Answer {
  const ran = said("answer") === RAN;
  return {
    kind: "drain",
    cracked: true,
    saw: ran ? "ran" : "dry",
    amount: (ran ? said("amount") : "none") as DrainAnswer["amount"],
    what: (ran ? said("what") : "nothing") as DrainAnswer["what"],
    shutAgain: said("shut") !== "",
  };
}

function numberOf(typed: string): number | null {
  const value = Number(typed.trim().replace(",", "."));
  return typed.trim() === "" || !Number.isFinite(value) ? null : value;
}

function goodAnswer(check: Check, said: Said): Answer {
  if (check.kind === "drain") return drainAnswer(said);
  if (check.kind !== "level") return { kind: "look", ok: true };
  const amount = numberOf(said("value"));
  const toppedUp = amount !== null && amount > 0 ? { toppedUp: { amount, unit: "qt" } } : {};
  return { kind: "level", level: "ok", ...toppedUp };
}

/** The number of a numeric check, as typed; null where there is none. */
function numberAnswer(check: Check, said: Said) {
  const value = numberOf(said("value"));
  if (value === null || (check.kind !== "count" && check.reading === null)) return null;
  if (check.kind === "count") {
    return { kind: "count" as const, counted: Math.max(0, Math.round(value)) };
  }
  const unit = check.reading?.unit ?? "";
  if (check.kind === "timed") {
    return { kind: "timed" as const, value, unit, seconds: check.reading?.seconds ?? 0 };
  }
  const heard = said("heard");
  const asks = check.reading?.asksHeardOpen && heard !== "" ? { heardItOpen: heard === "yes" } : {};
  return { kind: "reading" as const, value, unit, ...asks };
}

function answerOf(check: Check, said: Said): Answer | null {
  const chosen = said("answer");
  if (chosen === GOOD || chosen === RAN) return goodAnswer(check, said);
  if (chosen.startsWith(SEEN)) {
    const seen = chosen.slice(SEEN.length);
    return { kind: "tag-seen", seen: seen === "same" || seen === "gone" ? seen : "worse" };
  }
  if (chosen === "") return numberAnswer(check, said);
  const note = said("note").trim();
  if (chosen === NOT_FITTED) return { kind: "not-fitted" };
  // Without a reason it is no answer, and the check stays among those still missing.
  if (chosen === COULD_NOT_CHECK) return note === "" ? null : { kind: chosen, reason: note };
  const raised = said("hold") === "" ? {} : { raisedColour: "red" as const };
  const problems = [{ key: chosen, ...raised, ...(note && { note }) }];
  const number = numberAnswer(check, said);
  return number ? { ...number, problems } : { kind: "problem", problems };
}

async function sha256Hex(blob: Blob): Promise<string> {
  const digest = await crypto.subtle.digest("SHA-256", await blob.arrayBuffer());
  return [...new Uint8Array(digest)].map((byte) => byte.toString(16).padStart(2, "0")).join("");
}

/** The tag an answer hangs, with an id its photo can name. */
function tagOf(check: Check, said: Said): NewTag | null {
  const chosen = said("answer");
  const problem = check.problems.find((known) => known.key === chosen);
  if (!problem) return null;
  const colour = said("hold") === "" ? problem.colour : "red";
  const note = said("note").trim() || null;
  return { id: uuidv7(), checkKey: check.key, problemKey: problem.key, colour, note };
}

function seenTagsOf(check: Check, said: Said, openTags: readonly OpenTagFact[]): SeenTag[] {
  const chosen = said("answer");
  if (!chosen.startsWith(SEEN)) return [];
  const word = chosen.slice(SEEN.length);
  const seen = word === "same" || word === "gone" ? word : "worse";
  const colour = word === "hold" ? "red" : null;
  return openTags
    .filter((tag) => tag.checkKey === check.key)
    .map((tag) => ({ id: uuidv7(), tagId: tag.id, seen, colour, note: null }));
}

/** The form as the signed record that goes to the server, and the photos that follow it. */
export async function readWalk(
  form: FormData,
  checks: readonly Check[],
  about: {
    walkId: string;
    truckId: string;
    kind: WalkKind;
    baseWalkId: string | null;
    sheetHash: string;
    openTags: readonly OpenTagFact[];
    signedAt: number;
  },
): Promise<WalkToSend> {
  const answers: Answers = {};
  const tags: NewTag[] = [];
  const seenTags: SeenTag[] = [];
  const photos: WalkToSend["body"]["photos"] = [];
  const files = new Map<string, Blob>();
  for (const check of checks) {
    const said: Said = (part) => String(form.get(fieldOf(check.key, part)) ?? "");
    const answer = answerOf(check, said);
    if (!answer) continue;
    answers[check.key] = answer;
    seenTags.push(...seenTagsOf(check, said, about.openTags));
    const tag = tagOf(check, said);
    if (!tag) continue;
    tags.push(tag);
    const file = form.get(fieldOf(check.key, "photo"));
    if (!(file instanceof Blob) || file.size === 0) continue;
    const photo = await shrinkPhoto(file);
    const id = uuidv7();
    files.set(id, photo);
    photos.push({ id, tagId: tag.id, sha256: await sha256Hex(photo), bytes: photo.size });
  }
  const { walkId: id, truckId, kind, baseWalkId, sheetHash } = about;
  const signature = { name: String(form.get("signature") ?? ""), wording: kind };
  const signedAt = new Date(about.signedAt).toISOString();
  const body = { id, truckId, kind, baseWalkId, sheetHash, signedAt, answers };
  return { body: { ...body, tags, seenTags, photos, signature }, files };
}
