import { parseFrequencyUnit, parseUnit } from "@/lib/core/units/parse-unit";
import type { FileUnit } from "@/lib/core/units/level-units";

/** Pieces of a column's name that may be its unit, the surest first. */
function unitPieces(name: string): string[] {
  if (name.length > 200) return [];
  const bracketed = [...name.matchAll(/[[(]\s*([^\])]+?)\s*[\])]/g)].map((match) => match[1] ?? "");
  const pieces = [...bracketed.reverse(), name];
  const slash = name.indexOf("/");
  // "Level/dBm" names a unit behind the slash, "dBm/Hz" is one unit, and not Hz.
  if (slash > 0 && !/dB\S*$|[WVA]$|[[(]/i.test(name.slice(0, slash)))
    pieces.push(name.slice(slash + 1));
  for (const match of name.matchAll(/[\s_,:]+/g)) pieces.push(name.slice(match.index + 1));
  const [firstWord = ""] = name.split(/\s+/);
  if (/^dB/i.test(firstWord)) pieces.push(firstWord);
  return pieces;
}

/** A lone "V" or "W" at the end of a name is a letter; in brackets or alone it is a unit. */
function isSure(piece: string, name: string): boolean {
  return piece === name || piece.length > 1 || name.includes(`(${piece})`) || /[[/]/.test(name);
}

export function levelUnitIn(name: string): FileUnit | null {
  for (const piece of unitPieces(name)) {
    const unit = parseUnit(piece);
    if (unit !== null && isSure(piece, name)) return unit;
  }
  return null;
}

export function frequencyUnitIn(name: string): number | null {
  for (const piece of unitPieces(name)) {
    const unitHz = parseFrequencyUnit(piece);
    if (unitHz !== null) return unitHz;
  }
  return null;
}

const OTHER_AXES: [RegExp, string][] = [
  [/wave\s*(?:length|number)|^wave$|longueur d'onde|wellenl/i, "a wavelength"],
  [/^(?:nm|[u\u00b5\u03bc]m|pm|1\/cm|cm-1|\u212b)$/i, "a wavelength"],
  [/^(?:s|sec|seconds?|ms|[u\u00b5\u03bc]s|ns|min)$|\btime\b|^zeit$/i, "a time"],
  [/^(?:m|mm|cm|inch)$|\bdistance\b/i, "a distance"],
];

/** What a column that stands where the frequency should holds instead; null when nothing says so. */
export function otherAxisIn(name: string): string | null {
  for (const piece of unitPieces(name))
    for (const [pattern, what] of OTHER_AXES) if (pattern.test(piece.trim())) return what;
  return null;
}

/** Name of a column without the unit in brackets at its end. */
export function withoutUnit(name: string): string {
  const plain = name.replace(/\s*(?:\[[^\]]*\]|\((?:[^)]*)\))\s*$/, "").trim();
  const tail = /[[(]\s*([^\])]+?)\s*[\])]\s*$/.exec(name)?.[1] ?? "";
  return plain !== "" && (parseUnit(tail) !== null || parseFrequencyUnit(tail) !== null)
    ? plain
    : name.trim();
}
