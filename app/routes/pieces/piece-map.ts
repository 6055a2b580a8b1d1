import type { ComponentType } from "react";
import { ShowBoard } from "./show-board";
import { ShowFields } from "./show-fields";
import { ShowStates } from "./show-states";
import { ShowTags } from "./show-tags";

/** What there is, in the page's order, and the files of app/ui it comes from. */
export const pieceMap: readonly {
  id: string;
  title: string;
  files: string;
  Show: ComponentType;
}[] = [
  {
    id: "board",
    title: "Pegs and key tags",
    files: "pegboard, key-tag, peg, hung-tags, standing-glyph",
    Show: ShowBoard,
  },
  { id: "tags", title: "Tags on a truck", files: "tag-card, tag-glyph", Show: ShowTags },
  {
    id: "fields",
    title: "Fields and buttons",
    files: "fields/*, error-summary, button",
    Show: ShowFields,
  },
  {
    id: "states",
    title: "Notices, empty, wrong, waiting",
    files: "notice, empty-state, error-state, loading",
    Show: ShowStates,
  },
];
