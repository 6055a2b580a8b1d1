type Theme = "day" | "night";

const KEY = "keypeg.theme";

/** Sets the choice kept on this device before the first paint. Backticks, since React escapes quotes. */
export const THEME_SCRIPT =
  "try{const t=localStorage.getItem(`keypeg.theme`);if(t)document.documentElement.dataset.theme=t}catch{}";

function phoneTheme(): Theme {
  return matchMedia("(prefers-color-scheme: dark)").matches ? "night" : "day";
}

function shownTheme(): Theme {
  const chosen = document.documentElement.dataset.theme;
  return chosen === "day" || chosen === "night" ? chosen : phoneTheme();
}

/** The other set of colors. Choosing what the phone has anyway lets the phone decide again. */
export function switchTheme(): void {
  const next: Theme = shownTheme() === "day" ? "night" : "day";
  const root = document.documentElement;
  const chosen = next === phoneTheme() ? null : next;
  if (chosen) root.dataset.theme = chosen;
  else delete root.dataset.theme;
  try {
    if (chosen) localStorage.setItem(KEY, chosen);
    else localStorage.removeItem(KEY);
  } catch {
    // Storage is off on this device: the choice lasts until the page is left.
  }
}
