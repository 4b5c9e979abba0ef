import { join } from "node:path";
import { Font } from "@react-pdf/renderer";

const TITLE = "Newsreader";
const TEXT = "Hanken Grotesk";
const NUMBERS = "Spline Sans Mono";

/** Only Hanken Grotesk has Δ Ω ≥ ≤ √, so it stands behind the other two. */
export const FONTS = { title: [TITLE, TEXT], text: [TEXT], numbers: [NUMBERS, TEXT] };

const FILES = [
  { family: TITLE, fontWeight: 500, path: "newsreader/500Medium/Newsreader_500Medium.ttf" },
  { family: TEXT, fontWeight: 400, path: "hanken-grotesk/400Regular/HankenGrotesk_400Regular.ttf" },
  { family: TEXT, fontWeight: 500, path: "hanken-grotesk/500Medium/HankenGrotesk_500Medium.ttf" },
  {
    family: TEXT,
    fontWeight: 600,
    path: "hanken-grotesk/600SemiBold/HankenGrotesk_600SemiBold.ttf",
  },
  {
    family: NUMBERS,
    fontWeight: 400,
    path: "spline-sans-mono/400Regular/SplineSansMono_400Regular.ttf",
  },
  {
    family: NUMBERS,
    fontWeight: 500,
    path: "spline-sans-mono/500Medium/SplineSansMono_500Medium.ttf",
  },
];

let registered = false;

/**
 * Makes the fonts known once. They are found from the working directory: a bundled server knows no
 * path of its own source, and the application is always started in the project's root.
 */
export function registerFonts(): void {
  if (registered) return;
  const root = join(process.cwd(), "node_modules", "@expo-google-fonts");
  for (const { family, fontWeight, path } of FILES)
    Font.register({ family, fontWeight, src: join(root, path) });
  // A hyphen that a line break puts into a file name or a hash would be read as part of it.
  Font.registerHyphenationCallback((word) => [word]);
  registered = true;
}

/** Whether a report can print a code point; every stack ends in Hanken Grotesk. */
export async function loadGlyphTest(): Promise<(codePoint: number) => boolean> {
  const descriptor = { fontFamily: TEXT, fontWeight: 400 };
  await Font.load(descriptor);
  const font = Font.getFont(descriptor)?.data;
  if (!font) throw new Error(`The font ${TEXT} cannot be loaded.`);
  return (codePoint) => font.hasGlyphForCodePoint(codePoint);
}
