/** Every way a command can say no: one closed union, one HTTP status each. Words are in text/en/refusals. */
export const REFUSAL_STATUS = {
  "not-found": 404,
  "not-allowed": 403,
  invalid: 400,
  "same-id-other-body": 422,
  "in-progress": 409,
  "not-clear": 409,
  "already-ended": 409,
  "own-red-tag": 403,
  "second-certifier": 403,
  "two-people": 403,
  "not-from-photos": 403,
  "nothing-to-limit": 409,
  stale: 409,
  "last-manager": 409,
  "invitation-ended": 410,
} as const;
export type RefusalCode = keyof typeof REFUSAL_STATUS;

/** A field at fault: a JSON pointer into the input and a text key. */
export interface FieldFault {
  pointer: string;
  code: string;
  /** What the words name beside the field: a limit, a unit. */
  values?: FaultValues;
}

export type FaultValues = Readonly<Record<string, string | number>>;

export interface Refusal {
  code: RefusalCode;
  /** The fields at fault, for `invalid`. */
  fields?: FieldFault[];
  /** Machine-readable reasons, for `not-clear`. */
  reasons?: unknown[];
}

export type Result<T> = { ok: true; value: T } | { ok: false; refusal: Refusal };

export function ok<T>(value: T): Result<T> {
  return { ok: true, value };
}

export function refuse(
  code: RefusalCode,
  more: Omit<Refusal, "code"> = {},
): { ok: false; refusal: Refusal } {
  return { ok: false, refusal: { code, ...more } };
}
