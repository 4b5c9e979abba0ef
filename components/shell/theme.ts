export const THEME_COOKIE = "neap-theme";

export const THEMES = ["light", "dark", "system"] as const;
export type Theme = (typeof THEMES)[number];

/** The theme that a cookie names; anything unknown follows the system. */
export function readTheme(value: string | undefined): Theme {
  return THEMES.find((theme) => theme === value) ?? "system";
}
