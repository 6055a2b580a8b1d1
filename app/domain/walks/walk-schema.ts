import { z } from "zod";
import { COLOURS } from "../../trade/limits";
import { answersSchema, checkKeySchema } from "../../trade/sheet/answers";
import { signatureSchema } from "../signature";

const sha256 = z.string().regex(/^[0-9a-f]{64}$/, "not-a-sha256");
const note = z.string().trim().max(1000).nullable();
/** Any time a phone's clock may show, right or wrong, that a DATETIME holds. */
const phoneTime = z.iso.datetime({ offset: true }).refine((text) => {
  const year = new Date(text).getUTCFullYear();
  return year >= 1000 && year <= 9999;
}, "time-out-of-range");

/** The largest photo a phone may promise, bytes. */
export const PHOTO_BYTES = 12 * 1024 * 1024;
export const PHOTOS_PER_TAG = 6;

const tag = z.object({
  id: z.uuid(),
  checkKey: checkKeySchema,
  problemKey: z.string().min(1).max(60),
  colour: z.enum(COLOURS),
  note,
});

/** What this walk says of a tag that was open before it. */
const seenTag = z.object({
  id: z.uuid(),
  tagId: z.uuid(),
  seen: z.enum(["same", "worse", "gone"]),
  colour: z.enum(COLOURS).nullable(),
  note,
});

const photo = z.object({
  id: z.uuid(),
  tagId: z.uuid().nullable(),
  sha256,
  bytes: z.number().int().min(1).max(PHOTO_BYTES),
});

/** A sheet nests nine deep; the database's JSON ends at 32, and a second body is kept as JSON (K4). */
const SHEET_DEPTH = 20;

function isNestedPast(value: unknown, depth: number): boolean {
  if (value === null || typeof value !== "object") return false;
  return depth === 0 || Object.values(value).some((inner) => isNestedPast(inner, depth - 1));
}

/** The body of POST /api/v1/walks: one signed pass over the sheet, as the phone keeps it. */
export const walkSchema = z
  .object({
    id: z.uuid(),
    truckId: z.uuid(),
    kind: z.enum(["before", "after", "takeover"]),
    baseWalkId: z.uuid().nullable().default(null),
    correctsWalkId: z.uuid().nullable().default(null),
    sheetHash: sha256,
    /** Sent along when the phone's sheet may be unknown here. */
    sheet: z
      .unknown()
      .transform((sheet) => (isNestedPast(sheet, SHEET_DEPTH) ? undefined : sheet))
      .optional(),
    signedAt: phoneTime,
    answers: answersSchema,
    tags: z.array(tag).max(200).default([]),
    seenTags: z.array(seenTag).max(200).default([]),
    photos: z.array(photo).max(300).default([]),
    acknowledgement: z
      .object({
        id: z.uuid(),
        items: z.array(z.uuid()).max(500),
        satisfied: z.boolean(),
        disputesSignOffId: z.uuid().nullable().default(null),
        note,
      })
      .nullable()
      .default(null),
    signature: signatureSchema,
  })
  .superRefine((walk, context) => {
    if ((walk.kind === "takeover") !== (walk.baseWalkId !== null)) {
      context.addIssue({ code: "custom", path: ["baseWalkId"], message: "takeover-needs-base" });
    }
    for (const list of ["tags", "seenTags", "photos"] as const) {
      const ids = new Set<string>();
      for (const [index, { id }] of walk[list].entries()) {
        if (ids.has(id.toLowerCase())) {
          context.addIssue({ code: "custom", path: [list, index, "id"], message: "id-twice" });
        }
        ids.add(id.toLowerCase());
      }
    }
    const perTag = new Map<string | null, number>();
    for (const [index, { tagId }] of walk.photos.entries()) {
      const count = (perTag.get(tagId) ?? 0) + 1;
      perTag.set(tagId, count);
      if (count > PHOTOS_PER_TAG) {
        context.addIssue({ code: "custom", path: ["photos", index], message: "too-many-photos" });
      }
      if (tagId !== null && !walk.tags.some((known) => known.id === tagId)) {
        context.addIssue({
          code: "custom",
          path: ["photos", index, "tagId"],
          message: "unknown-tag",
        });
      }
    }
  });

export type WalkBody = z.infer<typeof walkSchema>;
