import type { FaultValues } from "../../domain/refusals";

const EXPECTED: Record<string, string> = {
  string: "text",
  number: "a number",
  int: "a whole number",
  boolean: "true or false",
  array: "a list",
  object: "an object",
  record: "an object",
};

/** What is wrong with a field that a program sent, and what to send instead. */
export const API_FAULTS: Record<string, string | ((values: FaultValues) => string)> = {
  missing: "This is missing. Send it.",
  "wrong-type": ({ expected }) => `Send ${EXPECTED[String(expected)] ?? expected} here.`,
  "wrong-form": "This is not in the form asked for.",
  "text-too-long": ({ limit }) => `Shorten this to ${limit} characters.`,
  "text-too-short": ({ limit }) => `Write at least ${limit === 1 ? "a character" : limit} here.`,
  "list-too-long": ({ limit }) => `Send ${limit} of these at most.`,
  "list-too-short": ({ limit }) => `Send at least ${limit} of these.`,
  "number-too-large": ({ limit }) => `Send ${limit} at most.`,
  "number-too-small": ({ limit }) => `Send ${limit} at least.`,
  "not-an-id": "Send a UUID.",
  "not-a-time": "Send a time such as 2026-06-02T05:40:00-06:00.",
  "time-out-of-range": "Send a time of the years 1000 to 9999.",
  "not-one-of": ({ choices }) => `Send one of: ${choices}.`,
  "kind-unknown": "This kind of answer is not known. Look at the sheet.",
  "not-a-check-key": "Send the key of a check as its sheet writes it.",
  "id-twice": "This id is in the list twice. Give each its own.",
  "too-many-answers": "Send 300 answers at most.",
  "say-what-came-out": "Say what came out of the drain.",
  "nothing-ran": "Nothing ran out: send nothing and none here.",
};
