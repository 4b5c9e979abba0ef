import type { Mask } from "@/lib/core/mask/mask";
import { LEVEL_UNIT_LABELS } from "@/lib/core/units/level-units";
import { writeHz } from "./mask-csv-numbers";

/** First cell of a mask's CSV; the second is the version of the layout. */
export const MASK_CSV_MARK = "Neap mask";

/** What a spreadsheet would run as a formula, or what stands behind the mark that keeps it from it. */
const RISKY = /^'*[=+\-@\t\r]/;

/** Text of one cell: marked when a spreadsheet would run it, quoted when it would break the row. */
function textCell(text: string): string {
  const safe = RISKY.test(text) ? `'${text}` : text;
  return /[",;\t\r\n]/.test(safe) || safe.trim() !== safe
    ? `"${safe.replaceAll('"', '""')}"`
    : safe;
}

/** Text of a cell as it was before `maskToCsv` marked it. */
export function unmarked(cell: string): string {
  return cell.startsWith("'") && RISKY.test(cell) ? cell.slice(1) : cell;
}

/** The unit that keeps the numbers of a column readable: the largest that the smallest reaches. */
function unitFor(frequenciesHz: number[]): { label: string; factor: number } {
  const smallest = Math.min(...frequenciesHz);
  if (smallest >= 1e5) return { label: "MHz", factor: 1e6 };
  return smallest >= 1e3 ? { label: "kHz", factor: 1e3 } : { label: "Hz", factor: 1 };
}

/**
 * A mask as CSV: its own fields as rows of name and value, then one row per segment. Numbers keep
 * every digit, so that reading the text gives the same mask. Lines end in CR LF (RFC 4180).
 */
export function maskToCsv(mask: Mask): string {
  const segments = mask.lines.flatMap((line) => line.segments);
  const bandwidths = mask.lines.flatMap(({ rbwHz }) => (rbwHz === null ? [] : [rbwHz]));
  const unit = unitFor(segments.flatMap(({ startHz, stopHz }) => [startHz, stopHz]));
  const rbwUnit = bandwidths.some((hz) => hz < 1e3)
    ? { label: "Hz", factor: 1 }
    : { label: "kHz", factor: 1e3 };
  const level = LEVEL_UNIT_LABELS[mask.unit];
  const fields: [string, string][] = [
    [MASK_CSV_MARK, "1"],
    ["key", mask.key],
    ["title", mask.title],
    ["port", mask.port],
    ["unit", level],
    ["distance (m)", mask.distanceM === null ? "" : String(mask.distanceM)],
    ["document", mask.document],
    ["clause", mask.clause],
    ["edition", mask.edition],
    ["provenance", mask.provenance],
    ["note", mask.note],
  ];
  const heads = [
    "line",
    "detector",
    `rbw (${rbwUnit.label})`,
    "rbw kind",
    `start (${unit.label})`,
    `stop (${unit.label})`,
    `level start (${level})`,
    `level stop (${level})`,
    "interpolation",
  ];
  const rows = mask.lines.flatMap((line) =>
    line.segments.map((s) => [
      textCell(line.name),
      line.detector,
      line.rbwHz === null ? "" : writeHz(line.rbwHz, rbwUnit.factor),
      line.rbwKind ?? "",
      writeHz(s.startHz, unit.factor),
      writeHz(s.stopHz, unit.factor),
      String(s.startDb),
      String(s.stopDb),
      s.interpolation,
    ]),
  );
  const head = fields.map(([name, value]) => [name, textCell(value)]);
  return [...head, [], heads, ...rows].map((cells) => `${cells.join(",")}\r\n`).join("");
}
