import type { ComponentType } from "react";
import { ShowBoard } from "./show-board";
import { ShowDial } from "./show-dial";
import { ShowFields } from "./show-fields";
import { ShowNumbers } from "./show-numbers";
import { ShowOverlays } from "./show-overlays";
import { ShowStates } from "./show-states";
import { ShowTags } from "./show-tags";
import { ShowWalk } from "./show-walk";

interface Piece {
  id: string;
  title: string;
  /** Files of app/ui. */
  files: string;
  Show: ComponentType;
}

/** What there is, in the page's order. */
export const pieceMap: readonly Piece[] = [
  {
    id: "board",
    title: "Pegs and key tags",
    files: "pegboard, key-tag, peg, key-blade, hung-tags, standing-glyph",
    Show: ShowBoard,
  },
  { id: "dial", title: "Dial", files: "dial/dial", Show: ShowDial },
  { id: "walk", title: "Walk", files: "station-strip, caution, air-path/air-path", Show: ShowWalk },
  { id: "tags", title: "Tags on a truck", files: "tag-card, tag-glyph", Show: ShowTags },
  {
    id: "numbers",
    title: "Numbers",
    files: "chart/chart, table, show-more, measure, time",
    Show: ShowNumbers,
  },
  {
    id: "fields",
    title: "Fields and buttons",
    files: "fields/*, error-summary, button",
    Show: ShowFields,
  },
  {
    id: "overlays",
    title: "Dialogs, menu, combobox",
    files: "dialog, menu, fields/combobox-field",
    Show: ShowOverlays,
  },
  {
    id: "states",
    title: "Notices, empty, wrong, waiting",
    files: "notice, empty-state, error-state, loading",
    Show: ShowStates,
  },
];
