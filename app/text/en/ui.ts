import type { Colour } from "../../trade/limits";
import type { StandingWord } from "../../trade/standing/standing";

/** The product's name as the wordmark writes it. */
export const wordmark = "KEYPEG";

export const standingText: Record<StandingWord, string> = {
  held: "Held",
  "walk-due": "Walk due",
  limited: "Limited",
  cleared: "Cleared",
  out: "Out",
};

export const tagText: Record<Colour, string> = {
  red: "Red tag",
  yellow: "Yellow tag",
  white: "White tag",
};

/** Words that belong to the pieces themselves; whatever a screen says is given by the screen. */
export const uiText = {
  skip: "Skip to the page",
  places: "Places",
  answers: "Answers",
  account: "Your account",
  signOut: "Sign out",
  noKey: "No key on this peg",
  moreTags: (count: number) => `${count} more red ${count === 1 ? "tag" : "tags"}`,
  openRed: "Open red tags",
  photos: (count: number) =>
    count === 0 ? "No photo" : count === 1 ? "1 photo" : `${count} photos`,
  limit: "Limit",
  since: "Since",
  optional: "optional",
  unitOf: (label: string) => `Unit of ${label}`,
  faults: (count: number) =>
    count === 1 ? "One answer needs another look" : `${count} answers need another look`,
  close: "Close",
  working: "Working on it",
  loading: "Loading",
  more: (left: number | null) => (left === null ? "Show more" : `Show more, ${left} left`),
  shown: (shown: number, total: number) => `${shown} of ${total} shown`,
  toNight: "Night colors",
  toDay: "Day colors",
  caution: {
    warning: "Warning",
    must: "Must do",
    "must-not": "Must not",
  },
  strip: {
    label: (done: number, total: number) => `Stations, ${done} of ${total} done`,
    done: "done",
    now: "now",
    tagged: "done, tagged",
    "to-come": "to come",
    station: (number: number, name: string, state: string) => `${number}, ${name}: ${state}`,
  },
  dial: {
    unset: "Not read yet",
    less: (step: string) => `Less by ${step}`,
    more: (step: string) => `More by ${step}`,
    face: (label: string) => `${label}, on the gauge`,
    typed: (label: string, unit: string) => `${label} in ${unit}`,
    value: (value: string, unit: string) => `${value} ${unit}`,
    band: (from: string, to: string, unit: string) => `Band ${from} to ${to} ${unit}`,
    stop: (value: string, unit: string) => `Stop ${value} ${unit}`,
    greatest: (value: string, unit: string) => `Greatest here ${value} ${unit}`,
    usual: (words: string) => `Usual here: ${words}.`,
    gauge: (value: string, unit: string) => `This gauge may be off by ${value} ${unit}`,
    offScale: (max: string, unit: string) =>
      `That is off the gauge. It reads 0 to ${max} ${unit}: enter a number from there.`,
    howTo: "Turn the needle, use the buttons, or type.",
  },
  airPath: {
    label: { vacuum: "Air path, drawing vacuum", pressure: "Air path, making pressure" },
    state: {
      good: "Good",
      limit: "Yellow tag",
      held: "Red tag",
      "to-check": "To check",
      watch: "White tag",
    },
  },
  combobox: {
    none: "Nothing fits what you typed.",
    count: (count: number) => (count === 1 ? "1 choice" : `${count} choices`),
    open: (label: string) => `Show the choices of ${label}`,
  },
  chart: {
    table: "The same numbers as a table",
    fit: "Trend to today, dotted beyond",
    band: (from: string, to: string, unit: string) => `Band ${from} to ${to} ${unit}`,
    crossing: "When it is likely to cross",
  },
  signature: {
    label: "Type your full name to sign",
    as: (name: string) => `Signing as ${name}`,
  },
} as const;
