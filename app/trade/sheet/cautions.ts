/** Cautions shown before a check or a station. Words are in text/en/cautions. */
export const CAUTIONS = [
  "chocks",
  "stored-vacuum",
  "stored-pressure",
  "shafts",
  "hot-surfaces",
  "hoses-under-pressure",
  "clamp-under-pressure",
  "solvent",
  "ears",
  "upwind",
  "at-the-controls",
  "fall",
  "iced-ladder",
  "tank-air",
  "waste-oil",
  "snug-under-vacuum",
] as const;
export type CautionKey = (typeof CAUTIONS)[number];
