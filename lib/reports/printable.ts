/** Every text inside a value passed through `change`; the shape stays as it is. */
function mapTexts<T>(value: T, change: (text: string) => string): T {
  if (typeof value === "string") return change(value) as T;
  if (Array.isArray(value)) return value.map((inner: unknown) => mapTexts(inner, change)) as T;
  if (typeof value !== "object" || value === null) return value;
  const entries = Object.entries(value).map(([key, inner]) => [key, mapTexts(inner, change)]);
  return Object.fromEntries(entries) as T;
}

/** Signs of formulas that are read aloud by name; used where no font has the sign itself. */
const SPELLED: Record<string, string> = {
  λ: "lambda",
  ν: "nu",
  σ: "sigma",
  Σ: "sum",
  φ: "phi",
  "▼": "down",
  "▲": "up",
};

/** "3λ" would run into "3lambda". */
function spell(sign: string, before: string): string | null {
  const name = SPELLED[sign];
  return name === undefined ? null : `${/[\p{L}\p{N}]/u.test(before) ? " " : ""}${name}`;
}

/**
 * The value with every sign that no font of the report has spelled out, "lambda", or, without a
 * name, as its code point, "[U+8A66]": a sign that silently fell out could turn one name into another.
 */
export function makePrintable<T>(value: T, hasGlyph: (codePoint: number) => boolean): T {
  return mapTexts(value, (text) =>
    Array.from(text.normalize("NFC").replaceAll(/\r\n?/g, "\n").replaceAll("\t", " "))
      .map((sign, i, all) => {
        const codePoint = sign.codePointAt(0) ?? 0;
        if (sign === "\n" || hasGlyph(codePoint)) return sign;
        const spelled = spell(sign, all[i - 1] ?? "");
        if (spelled !== null) return spelled;
        return `[U+${codePoint.toString(16).toUpperCase().padStart(4, "0")}]`;
      })
      .join(""),
  );
}

/**
 * The lines of a text, with words longer than `longest` signs parted without a hyphen, so that no
 * column is overrun. Lines become texts of their own, since no font has a sign for a line break.
 */
export function linesOf(text: string, longest: number): string[] {
  return text.replaceAll(new RegExp(`(\\S{${longest}})(?=\\S)`, "gu"), "$1\n").split("\n");
}

/** Shortened to whole words and "…", or as it is when it fits. */
export function shorten(text: string, longest: number): string {
  if (text.length <= longest) return text;
  const cut = text.slice(0, longest);
  const space = cut.lastIndexOf(" ");
  return `${(space > longest / 2 ? cut.slice(0, space) : cut).trimEnd()}…`;
}

/** Shortened in the middle: names of sweeps often differ in their last words only. */
export function shortenMiddle(text: string, longest: number): string {
  if (text.length <= longest) return text;
  const head = Math.ceil((longest - 1) / 2);
  return `${text.slice(0, head).trimEnd()}…${text.slice(head + 1 - longest).trimStart()}`;
}
