import type { APIResponse, Page } from "@playwright/test";
import type { Body, Call } from "./actions";
import type { Rows } from "./rows";

/** A parameter of an address that names a row: whose it is decides the answer. */
const ROW_PARAMS: Record<string, (rows: Rows) => string> = {
  unit: (rows) => rows.unitNumber,
  yardId: (rows) => rows.yardId,
  personId: (rows) => rows.personId,
  fittingId: (rows) => rows.fittingId,
  id: (rows) => rows.photoId,
  // Whoever holds an invitation's link may open it; its id alone opens nothing.
  token: (rows) => rows.invitationId,
};

/** A parameter that is one of the app's own words. */
const WORD_PARAMS: Record<string, string> = {
  size: "thumb",
  round: "weekly",
  reading: "vacuum-relief",
  test: "annual-inspection",
};

const paramsOf = (address: string) => [...address.matchAll(/:(\w+)/g)].map((match) => match[1]!);

function fill(address: string, read: (param: string) => string): string {
  return address.replace(/:(\w+)/g, (_, param: string) => WORD_PARAMS[param] ?? read(param));
}

function valueIn(param: string, rows: Rows): string {
  const read = ROW_PARAMS[param];
  if (!read) throw new Error(`:${param} is neither a row's nor a word: say which in calls.ts`);
  return read(rows);
}

/** The address with one's own rows in it. */
export function ownAddress(address: string, own: Rows): string {
  return fill(address, (param) => (param === "token" ? own.invitationToken : valueIn(param, own)));
}

/** The address with another's rows in it: each parameter alone, then all of them. */
export function addressesOf(address: string, own: Rows, other: Rows): string[] {
  const params = paramsOf(address).filter((param) => !(param in WORD_PARAMS));
  const alone = params.map((theirs) =>
    fill(address, (param) => valueIn(param, param === theirs ? other : own)),
  );
  return params.length < 2 ? alone : [...alone, fill(address, (param) => valueIn(param, other))];
}

/** The body with another value in one field; dots lead into JSON. */
export function withField(body: Body, field: string, value: string): Body {
  if ("form" in body) {
    if (!(field in body.form)) throw new Error(`the form has no ${field}`);
    return { form: { ...body.form, [field]: value } };
  }
  if (!("json" in body)) throw new Error("bytes have no fields");
  const json = structuredClone(body.json);
  const steps = field.split(".");
  const last = steps.pop()!;
  let at = json as Record<string, unknown>;
  for (const step of steps) at = at[step] as Record<string, unknown>;
  if (!(last in at)) throw new Error(`the body has no ${field}`);
  at[last] = value;
  return { json };
}

/** Calls an action as this site's own page would. */
export async function callAction(
  page: Page,
  path: string,
  { method }: Pick<Call, "method">,
  body: Body,
): Promise<APIResponse> {
  const headers: Record<string, string> = { Origin: new URL(page.url()).origin };
  if ("json" in body) headers["Content-Type"] = "application/json";
  if ("bytes" in body) headers["Content-Type"] = "image/jpeg";
  const sent =
    "form" in body
      ? { form: body.form }
      : { data: "json" in body ? JSON.stringify(body.json) : body.bytes };
  return page.request.fetch(path, {
    method: method ?? "POST",
    maxRedirects: 0,
    maxRetries: 2,
    headers,
    ...sent,
  });
}
