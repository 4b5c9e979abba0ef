import type { Standing } from "@/lib/core/reading/reading";
import type { Paper } from "./paper";
import { FONTS } from "./fonts";

/** The day chart. */
export const COLOURS = {
  sheet: "#FFFFFF",
  paper: "#FBFAF5",
  ink: "#16242D",
  inkSoft: "#51626C",
  rule: "#D9DDD6",
  water1: "#E4F0F2",
  water2: "#BFDDE3",
  water3: "#7FB8C4",
  deep: "#0E5A6B",
  land: "#EFE4C8",
  landEdge: "#A98A48",
  aground: "#B3146C",
  shoal: "#8A5D00",
  shoalTint: "#FBEFD0",
};

export const STANDING_COLOURS: Record<Standing, string> = {
  clear: COLOURS.deep,
  "inside-guard": COLOURS.shoal,
  over: COLOURS.aground,
  undecided: COLOURS.inkSoft,
};

export const PAGE_MARGIN_PT = 42;

/** React-pdf's name of a paper the width between the margins and the height, in points. */
export const PAPER_SIZES: Record<
  Paper,
  { size: "A4" | "LETTER"; widthPt: number; heightPt: number }
> = {
  a4: { size: "A4", widthPt: 595.28 - 2 * PAGE_MARGIN_PT, heightPt: 841.89 },
  letter: { size: "LETTER", widthPt: 612 - 2 * PAGE_MARGIN_PT, heightPt: 792 },
};

export const TYPE = {
  body: { fontFamily: FONTS.text, fontWeight: 400, fontSize: 8.6, lineHeight: 1.36 },
  small: { fontFamily: FONTS.text, fontWeight: 400, fontSize: 7.6, lineHeight: 1.32 },
  strong: { fontFamily: FONTS.text, fontWeight: 600, fontSize: 8.6, lineHeight: 1.36 },
  label: {
    fontFamily: FONTS.text,
    fontWeight: 500,
    fontSize: 6.6,
    lineHeight: 1.3,
    letterSpacing: 0.45,
    textTransform: "uppercase" as const,
    color: COLOURS.inkSoft,
  },
  /** Spline Sans Mono stands higher in its line than Hanken Grotesk: set down to one baseline. */
  number: {
    fontFamily: FONTS.numbers,
    fontWeight: 400,
    fontSize: 7.8,
    lineHeight: 1.36,
    marginTop: 1.2,
  },
  strongNumber: { fontFamily: FONTS.numbers, fontWeight: 500, fontSize: 8.6, lineHeight: 1.3 },
  h1: { fontFamily: FONTS.title, fontWeight: 500, fontSize: 21, lineHeight: 1.12 },
  h2: { fontFamily: FONTS.title, fontWeight: 500, fontSize: 15, lineHeight: 1.2 },
  h3: { fontFamily: FONTS.title, fontWeight: 500, fontSize: 11.5, lineHeight: 1.25 },
};
