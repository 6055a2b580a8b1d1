import { v7 as uuidv7 } from "uuid";
import type { Call } from "./actions";
import type { Rows } from "./rows";

/** A signed walk of few answers: it is taken, and clears nothing. */
function walk(own: Rows, more: object) {
  return {
    json: {
      id: uuidv7(),
      truckId: own.truckId,
      kind: "before",
      sheetHash: own.sheetHash,
      signedAt: new Date().toISOString(),
      answers: {},
      signature: { name: "A Signer", wording: "walk" },
      ...more,
    },
  };
}

const tag = () => ({
  id: uuidv7(),
  checkKey: "rear.lamps",
  problemKey: "dark",
  colour: "white",
  note: null,
});

const photo = (tagId: string | null) => ({
  id: uuidv7(),
  tagId,
  sha256: "0".repeat(64),
  bytes: 9,
});

function call(more: (own: Rows) => object, ids: Call["ids"]): Call {
  return { may: ["driver"], body: (own) => walk(own, more(own)), ids };
}

/** The ways a walk can name another record. */
export const walkCalls: [Call, ...Call[]] = [
  call(
    (own) => ({
      correctsWalkId: own.walkId,
      seenTags: [{ id: uuidv7(), tagId: own.tagId, seen: "worse", colour: "red", note: null }],
      acknowledgement: { id: uuidv7(), items: [own.signOffId], satisfied: true, note: null },
    }),
    {
      id: [(rows) => rows.walkId, "fresh"],
      truckId: [(rows) => rows.truckId, "refused"],
      sheetHash: [(rows) => rows.sheetHash, "unheeded"],
      correctsWalkId: [(rows) => rows.walkId, "refused"],
      "seenTags.0.id": [(rows) => rows.tagId, "fresh"],
      "seenTags.0.tagId": [(rows) => rows.tagId, "unheeded"],
      "acknowledgement.id": [(rows) => rows.acknowledgementId, "fresh"],
      "acknowledgement.items.0": [(rows) => rows.signOffId, "unheeded"],
    },
  ),
  call((own) => ({ kind: "takeover", baseWalkId: own.walkId }), {
    baseWalkId: [(rows) => rows.walkId, "refused"],
  }),
  call(
    (own) => ({
      acknowledgement: {
        id: uuidv7(),
        items: [],
        satisfied: false,
        disputesSignOffId: own.signOffId,
        note: null,
      },
    }),
    { "acknowledgement.disputesSignOffId": [(rows) => rows.signOffId, "refused"] },
  ),
  call(
    () => {
      const hung = tag();
      return { tags: [hung], photos: [photo(hung.id)] };
    },
    {
      "photos.0.id": [(rows) => rows.photoId, "fresh"],
      "photos.0.tagId": [(rows) => rows.tagId, "refused"],
    },
  ),
  call(() => ({ tags: [tag()] }), { "tags.0.id": [(rows) => rows.tagId, "fresh"] }),
];
