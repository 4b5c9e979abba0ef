import { readFileSync } from "node:fs";
import { describe, expect, it } from "vitest";
import { readTheme } from "@/components/shell/theme";

const css = readFileSync(new URL("../../app/globals.css", import.meta.url), "utf8");

function tokensOf(selector: string): Record<string, string> {
  const from = css.indexOf(`${selector} {`);
  if (from < 0) throw new Error(`${selector} is not in globals.css`);
  const block = css.slice(from, css.indexOf("}", from));
  return Object.fromEntries(
    [...block.matchAll(/--([a-z0-9-]+): (#[0-9a-f]{6})/g)].map(([, name, value]) => [name, value]),
  );
}

/** Relative luminance and contrast ratio as WCAG 2.2 defines them. */
function luminance(hex: string): number {
  const [r, g, b] = [1, 3, 5].map((at) => {
    const channel = parseInt(hex.slice(at, at + 2), 16) / 255;
    return channel <= 0.04045 ? channel / 12.92 : ((channel + 0.055) / 1.055) ** 2.4;
  });
  return 0.2126 * r! + 0.7152 * g! + 0.0722 * b!;
}

function contrast(one: string, other: string): number {
  const [low, high] = [luminance(one), luminance(other)].sort((a, b) => a - b);
  return (high! + 0.05) / (low! + 0.05);
}

describe("the theme", () => {
  it("is what the cookie names, and follows the system for anything else", () => {
    expect(["light", "dark", "system"].map(readTheme)).toEqual(["light", "dark", "system"]);
    expect([undefined, "", "sepia"].map(readTheme)).toEqual(["system", "system", "system"]);
  });

  it("is the same night whether chosen or the system's, and names every token of the day", () => {
    const night = tokensOf(':root[data-theme="dark"]');
    expect(tokensOf(':root[data-theme="system"]')).toEqual(night);
    expect(Object.keys(night)).toEqual(Object.keys(tokensOf(":root")));
  });

  it("prints as the day chart", () => {
    expect(tokensOf(":root[data-theme]")).toEqual(tokensOf(":root"));
  });

  it.each([":root", ':root[data-theme="dark"]'])("keeps text at 4.5:1 or more in %s", (theme) => {
    const token = tokensOf(theme);
    for (const text of ["ink", "ink-soft", "deep", "aground"])
      for (const ground of ["paper", "sheet"])
        expect(contrast(token[text]!, token[ground]!), `${text} on ${ground}`).toBeGreaterThan(4.5);
    expect(contrast(token["ink"]!, token["water-1"]!)).toBeGreaterThan(4.5);
    expect(contrast(token["ink-soft"]!, token["water-1"]!)).toBeGreaterThan(4.5);
    expect(contrast(token["shoal"]!, token["shoal-bed"]!)).toBeGreaterThan(4.5);
  });
});
