import { v7 as uuidv7 } from "uuid";
import type { Answer, Answers } from "~/trade/sheet/answers";
import type { Check, Station } from "~/trade/sheet/check";

/** Value of the answer that finds nothing wrong. */
export const GOOD = "good";

type Part = "answer" | "value" | "heard" | "note" | "photo";

/** Name of a check's control in the form. */
export function fieldOf(key: string, part: Part): string {
  return `${key}:${part}`;
}

export interface WalkToSend {
  body: {
    id: string;
    truckId: string;
    kind: "before";
    sheetHash: string;
    signedAt: string;
    answers: Answers;
    tags: {
      id: string;
      checkKey: string;
      problemKey: string;
      colour: string;
      note: string | null;
    }[];
    photos: { id: string; tagId: string; sha256: string; bytes: number }[];
    signature: { name: string; wording: string };
  };
  files: Map<string, Blob>;
}

function goodAnswer(check: Check, chosen: string): Answer {
  if (check.kind === "level") return { kind: "level", level: "ok" };
  if (check.kind === "drain") {
    const ran = chosen === "ran";
    return {
      kind: "drain",
      cracked: true,
      saw: ran ? "ran" : "dry",
      amount: ran ? "cup" : "none",
      what: ran ? "clean-oil" : "nothing",
      shutAgain: true,
    };
  }
  return { kind: "look", ok: true };
}

function numberAnswer(check: Check, typed: string, heard: boolean): Answer | null {
  const value = Number(typed.replace(",", "."));
  if (typed.trim() === "" || !Number.isFinite(value)) return null;
  if (check.kind === "count") return { kind: "count", counted: Math.round(value) };
  const unit = check.reading?.unit ?? "";
  if (check.kind === "timed") {
    return { kind: "timed", value, unit, seconds: check.reading?.seconds ?? 0 };
  }
  const asks = check.reading?.asksHeardOpen ? { heardItOpen: heard } : {};
  return { kind: "reading", value, unit, ...asks };
}

function answerOf(check: Check, form: FormData): Answer | null {
  const text = (part: Part) => String(form.get(fieldOf(check.key, part)) ?? "");
  const chosen = text("answer");
  if (chosen === GOOD || chosen === "ran") return goodAnswer(check, chosen);
  if (chosen !== "") {
    const note = text("note").trim();
    return { kind: "problem", problems: [{ key: chosen, ...(note && { note }) }] };
  }
  return numberAnswer(check, text("value"), form.has(fieldOf(check.key, "heard")));
}

async function sha256Hex(blob: Blob): Promise<string> {
  const digest = await crypto.subtle.digest("SHA-256", await blob.arrayBuffer());
  return [...new Uint8Array(digest)].map((byte) => byte.toString(16).padStart(2, "0")).join("");
}

/** The form as the signed record that goes to the server, and the photos that follow it. */
export async function readWalk(
  form: FormData,
  stations: readonly Station[],
  about: { walkId: string; truckId: string; sheetHash: string; signedAt: number },
): Promise<WalkToSend> {
  const answers: Answers = {};
  const tags: WalkToSend["body"]["tags"] = [];
  const photos: WalkToSend["body"]["photos"] = [];
  const files = new Map<string, Blob>();
  for (const check of stations.flatMap((station) => station.checks)) {
    const answer = answerOf(check, form);
    if (!answer) continue;
    answers[check.key] = answer;
    if (answer.kind !== "problem") continue;
    const [found] = answer.problems;
    const problem = check.problems.find((known) => known.key === found?.key);
    if (!found || !problem) continue;
    const tagId = uuidv7();
    const { key: checkKey } = check;
    const { key: problemKey, colour } = problem;
    tags.push({ id: tagId, checkKey, problemKey, colour, note: found.note ?? null });
    const file = form.get(fieldOf(check.key, "photo"));
    if (!(file instanceof Blob) || file.size === 0) continue;
    const id = uuidv7();
    files.set(id, file);
    photos.push({ id, tagId, sha256: await sha256Hex(file), bytes: file.size });
  }
  const { walkId: id, truckId, sheetHash } = about;
  const signature = { name: String(form.get("signature") ?? ""), wording: "walk" };
  const signedAt = new Date(about.signedAt).toISOString();
  const body = { id, truckId, kind: "before" as const, sheetHash, signedAt, answers };
  return { body: { ...body, tags, photos, signature }, files };
}
