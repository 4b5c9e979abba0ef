/** Every text inside a value passed through `change`; the shape stays as it is. */
function mapTexts<T>(value: T, change: (text: string) => string): T {
  if (typeof value === "string") return change(value) as T;
  if (Array.isArray(value)) return value.map((inner: unknown) => mapTexts(inner, change)) as T;
  if (typeof value !== "object" || value === null) return value;
  const entries = Object.entries(value).map(([key, inner]) => [key, mapTexts(inner, change)]);
  return Object.fromEntries(entries) as T;
}

/**
 * The value with every sign that no font of the report has written out as its code point,
 * "[U+03BB]": a sign that silently fell out could turn one name into another.
 */
export function makePrintable<T>(value: T, hasGlyph: (codePoint: number) => boolean): T {
  return mapTexts(value, (text) =>
    Array.from(text.normalize("NFC").replaceAll(/\r\n?/g, "\n").replaceAll("\t", " "), (sign) => {
      const codePoint = sign.codePointAt(0) ?? 0;
      if (sign === "\n" || hasGlyph(codePoint)) return sign;
      return `[U+${codePoint.toString(16).toUpperCase().padStart(4, "0")}]`;
    }).join(""),
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
