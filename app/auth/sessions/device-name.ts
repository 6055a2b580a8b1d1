const SYSTEMS: [RegExp, string][] = [
  [/iPhone/, "iPhone"],
  [/iPad/, "iPad"],
  [/Android/, "Android"],
  [/Windows/, "Windows"],
  [/Mac OS X|Macintosh/, "Mac"],
  [/CrOS/, "Chromebook"],
  [/Linux/, "Linux"],
];
const BROWSERS: [RegExp, string][] = [
  [/Edg(e|A|iOS)?\//, "Edge"],
  [/SamsungBrowser\//, "Samsung Internet"],
  [/Firefox\/|FxiOS\//, "Firefox"],
  [/Chrom(e|ium)\/|CriOS\//, "Chrome"],
  [/Safari\//, "Safari"],
];

function nameOf(list: [RegExp, string][], userAgent: string): string | undefined {
  return list.find(([pattern]) => pattern.test(userAgent))?.[1];
}

/** What a browser calls itself, short enough for its owner to know it by: "Chrome, Android". Empty when unknown. */
export function deviceName(userAgent: string | null): string {
  const agent = userAgent ?? "";
  return [nameOf(BROWSERS, agent), nameOf(SYSTEMS, agent)].filter(Boolean).join(", ");
}
