import type { Config } from "tailwindcss";

const token = (name: string) => `var(--${name})`;

/** The sea chart's colours; their values for day and night stand in app/globals.css. */
const config: Config = {
  content: ["./app/**/*.{ts,tsx}", "./components/**/*.{ts,tsx}"],
  theme: {
    extend: {
      colors: {
        paper: token("paper"),
        sheet: token("sheet"),
        ink: token("ink"),
        "ink-soft": token("ink-soft"),
        rule: token("rule"),
        "water-1": token("water-1"),
        "water-2": token("water-2"),
        "water-3": token("water-3"),
        deep: token("deep"),
        land: token("land"),
        "land-edge": token("land-edge"),
        aground: token("aground"),
        shoal: token("shoal"),
        "shoal-bed": token("shoal-bed"),
      },
      fontFamily: {
        title: ["var(--font-title)", "serif"],
        sans: ["var(--font-interface)", "sans-serif"],
        mono: ["var(--font-number)", "monospace"],
      },
    },
  },
};

export default config;
