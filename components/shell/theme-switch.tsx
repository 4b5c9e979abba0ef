"use client";

import { useSyncExternalStore } from "react";
import { readTheme, THEME_COOKIE, THEMES, type Theme } from "./theme";

const LABELS: Record<Theme, string> = { light: "Day", dark: "Night", system: "System" };
const A_YEAR_S = 31_536_000;

/** The attribute on <html> is the one place where the theme stands; the switch follows it. */
function follow(onChange: () => void) {
  const observer = new MutationObserver(onChange);
  observer.observe(document.documentElement, { attributeFilter: ["data-theme"] });
  return () => observer.disconnect();
}

const currentTheme = () => readTheme(document.documentElement.dataset.theme);

function choose(theme: Theme) {
  document.documentElement.dataset.theme = theme;
  document.cookie = `${THEME_COOKIE}=${theme}; path=/; max-age=${A_YEAR_S}; samesite=lax`;
}

export function ThemeSwitch() {
  const current = useSyncExternalStore(follow, currentTheme, () => null);
  return (
    <fieldset className="flex shrink-0 border border-rule bg-sheet">
      <legend className="sr-only">Theme</legend>
      {THEMES.map((theme) => (
        <button
          key={theme}
          type="button"
          aria-pressed={current === theme}
          onClick={() => choose(theme)}
          className="min-h-8 cursor-pointer px-3 text-ink-soft hover:text-ink aria-pressed:bg-water-1 aria-pressed:text-ink"
        >
          {LABELS[theme]}
        </button>
      ))}
    </fieldset>
  );
}
