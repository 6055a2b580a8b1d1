import { readFileSync } from "node:fs";
import { expect, test } from "vitest";

const css = readFileSync(new URL("../../app/app.css", import.meta.url), "utf8");
type Theme = "day" | "night";

/** Each color token as app.css writes it: light-dark(day, night). */
const tokens = new Map(
  [...css.matchAll(/--color-([a-z-]+): light-dark\((#[0-9a-f]{6}), (#[0-9a-f]{6})\)/g)].map(
    ([, name, day, night]) => [name!, { day: day!, night: night! }],
  ),
);

function token(name: string, theme: Theme): string {
  const found = tokens.get(name);
  if (!found) throw new Error(`no color token ${name}`);
  return found[theme];
}

/** Relative luminance, WCAG 2.2. */
function luminance(hex: string): number {
  const [r = 0, g = 0, b = 0] = [1, 3, 5].map((at) => {
    const part = Number.parseInt(hex.slice(at, at + 2), 16) / 255;
    return part <= 0.04045 ? part / 12.92 : ((part + 0.055) / 1.055) ** 2.4;
  });
  return 0.2126 * r + 0.7152 * g + 0.0722 * b;
}

function contrast(one: string, other: string, theme: Theme): number {
  const [light = 0, dark = 0] = [luminance(token(one, theme)), luminance(token(other, theme))].sort(
    (a, b) => b - a,
  );
  return (light + 0.05) / (dark + 0.05);
}

const THEMES: Theme[] = ["day", "night"];
const SURFACES = ["paper", "card"];

/** Foreground, background and the least ratio between them. */
const PAIRS: readonly (readonly [string, string, number])[] = [
  ...SURFACES.flatMap((surface) => [
    ["ink", surface, 7] as const,
    ["mute", surface, 7] as const,
    ...["enamel", "red", "green", "blue"].map((text) => [text, surface, 4.5] as const),
    ...["brass", "edge"].map((control) => [control, surface, 3] as const),
  ]),
  ["card", "enamel", 7],
  ["card", "red", 4.5],
  ["ink", "line", 7],
  ["ink", "band", 7],
  ["enamel", "band", 3],
  ["edge", "line", 2],
  ["tag-white", "tag-red", 4.5],
  ["tag-ink", "yellow", 7],
  ["tag-ink", "tag-white", 7],
  ["tag-white", "safety-blue", 7],
  ["safety-red", "tag-white", 4.5],
  ["tag-ink", "safety-yellow", 7],
  ["brass-dark", "brass", 2],
];

test.each(THEMES)("words read at 4.5:1 or better by %s, controls and marks at 3:1", (theme) => {
  const short = PAIRS.map(([one, other, least]) => ({
    pair: `${one} on ${other}`,
    least,
    ratio: contrast(one, other, theme),
  })).filter(({ ratio, least }) => ratio < least);
  expect(short).toEqual([]);
});

test("what is too pale alone has an outline that is not", () => {
  for (const theme of THEMES) {
    for (const surface of SURFACES) {
      // Yellow fields and tags are outlined in ink, red tags in their edge.
      expect(contrast("ink", surface, theme)).toBeGreaterThan(3);
      expect(contrast("tag-edge", surface, theme)).toBeGreaterThan(3);
    }
  }
});

test("yellow never stands as text", () => {
  const sources = import.meta.glob("../../app/**/*.tsx", {
    query: "?raw",
    import: "default",
    eager: true,
  });
  const offenders = Object.entries(sources)
    .filter(([, source]) => /\btext-(yellow|safety-yellow|line|edge)\b/.test(String(source)))
    .map(([path]) => path);
  expect(offenders).toEqual([]);
});
