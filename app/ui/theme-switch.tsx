import { uiText } from "~/text/en/ui";
import { useNonce } from "./nonce";
import { switchTheme, THEME_SCRIPT } from "./theme";

/** In the head: the theme chosen on this device, before anything is painted. */
export function ThemeScript() {
  return (
    <script nonce={useNonce()} suppressHydrationWarning>
      {THEME_SCRIPT}
    </script>
  );
}

/** Day or night colors. Follows the phone until pressed; the word says what a press brings. */
export function ThemeSwitch({ size = "desk" }: { size?: "desk" | "walk" }) {
  return (
    <button
      type="button"
      onClick={switchTheme}
      className={`${size === "walk" ? "min-h-14" : "min-h-11"} inline-flex items-center gap-2 whitespace-nowrap px-1 underline [@media(scripting:none)]:hidden print:hidden`}
    >
      <span className="night:hidden">{uiText.toNight}</span>
      <span className="hidden night:inline">{uiText.toDay}</span>
    </button>
  );
}
