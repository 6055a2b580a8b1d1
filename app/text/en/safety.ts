export const safety = {
  title: "What comes first",
  lead: "Keypeg records checks. It replaces none of these.",
  first: [
    "The pump maker's and the truck maker's manuals.",
    "Your carrier's own procedures, and the people it licenses or trains for a task.",
    "Local codes, permits and the law where you drive.",
    "Your own judgment: if it is not safe, stop and say so.",
  ],
  cautions: "Cautions shown at the checks",
  home: "To the start page",
} as const;
