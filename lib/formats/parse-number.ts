export type DecimalMark = "." | ",";

const PLAIN_DOT = /^[+-]?(?:\d+\.?\d*|\.\d+)(?:[eE][+-]?\d+)?$/;
const PLAIN_COMMA = /^[+-]?(?:\d+,?\d*|,\d+)(?:[eE][+-]?\d+)?$/;
/** Thousands in equal groups of three, by one kind of separator throughout. */
const GROUPED_DOT =
  /^[+-]?[1-9]\d{0,2}(?:([,'\u2019 \u00a0\u2009\u202f])\d{3})(?:\1\d{3})*(?:\.\d*)?$/;
const GROUPED_COMMA =
  /^[+-]?[1-9]\d{0,2}(?:([.'\u2019 \u00a0\u2009\u202f])\d{3})(?:\1\d{3})*(?:,\d*)?$/;
const GAP = /^(?:|[-+]?nan(?:\(.*\))?|-+|\*+|n\/?a|null|none|invalid|[-+]?1\.#(?:qnan|ind)\d*)$/i;

/** Number written with the given decimal mark; null when the text is none. */
export function parseNumber(text: string, decimal: DecimalMark): number | null {
  const plain = text.trim().replace("\u2212", "-").replace("e\u2212", "e-");
  if (decimal === ".") {
    if (PLAIN_DOT.test(plain)) return Number(plain);
    return GROUPED_DOT.test(plain) ? Number(plain.replace(/[^\d.+-]/g, "")) : null;
  }
  if (PLAIN_COMMA.test(plain)) return Number(plain.replace(",", "."));
  if (!GROUPED_COMMA.test(plain)) return null;
  return Number(plain.replace(/[^\d,+-]/g, "").replace(",", "."));
}

/** Text that stands where a level is missing. */
export function isGap(text: string): boolean {
  return GAP.test(text.trim().replaceAll("\u2212", "-"));
}

/** A number under either decimal mark. */
export function isNumeric(text: string): boolean {
  return parseNumber(text, ".") !== null || parseNumber(text, ",") !== null;
}

/** Distance between neighbouring numbers of this print, as a power of ten: "88.32" is 0.01. */
export function printedResolution(text: string, decimal: DecimalMark): number {
  const [mantissa = "", exponent = "0"] = text.trim().toLowerCase().split("e");
  const mark = mantissa.lastIndexOf(decimal);
  const decimals = mark < 0 ? 0 : mantissa.length - mark - 1;
  const power = Number(exponent.replace("\u2212", "-")) - decimals;
  return Number.isFinite(power) ? 10 ** power : 1;
}
