import { readNumber } from "@/components/ui/read-number";
import { INTERPOLATIONS } from "@/lib/core/mask/mask";
import type { SegmentDraft } from "./mask-draft";
import { settleFrequency, readCellFrequency } from "./mask-draft";

type Row = Omit<SegmentDraft, "id">;

function cellsOf(line: string): string[] {
  const delimiter = line.includes("\t") ? "\t" : line.includes(";") ? ";" : ",";
  return line.split(delimiter).map((cell) => cell.trim());
}

function readRow(cells: string[], unit: string): Row | string {
  const [start = "", stop = "", first = "", fourth, fifth] = cells;
  if (cells.length < 3 || cells.length > 5)
    return "three to five columns are needed: start, end, limit, limit at the end, interpolation.";
  for (const text of [start, stop])
    if (Number.isNaN(readCellFrequency(text, unit))) return `"${text}" is no frequency.`;
  // Without a fourth column the segment is flat.
  const last = fourth === undefined || fourth === "" ? first : fourth;
  for (const text of [first, last])
    if (!Number.isFinite(readNumber(text))) return `"${text}" is no level in dB.`;
  const interpolation = INTERPOLATIONS.find((known) => known === (fifth || "log").toLowerCase());
  if (!interpolation) return `"${fifth}" is neither log nor linear.`;
  return {
    start: settleFrequency(start, unit),
    stop: settleFrequency(stop, unit),
    startDb: String(readNumber(first)),
    stopDb: String(readNumber(last)),
    interpolation,
  };
}

/**
 * Segments pasted from a spreadsheet: start, end, limit, and where it slopes the limit at the end.
 * A header may stand above and name the unit of frequency; else `unit` counts. All rows are read
 * or none, and each that is not is named by its line.
 */
export function readPastedSegments(
  text: string,
  unit: string,
): { ok: true; rows: Row[] } | { ok: false; problems: string[] } {
  const lines = text
    .split(/\r\n|\r|\n/)
    .map((content, i) => ({ number: i + 1, content }))
    .filter(({ content }) => content.trim() !== "");
  const start = lines.findIndex(({ content }) => /^["\s]*[\d.+]/.test(content));
  if (start < 0) return { ok: false, problems: ["No line starts with a frequency."] };
  const header = lines.slice(0, start).map(({ content }) => content);
  const named = /\b(GHz|MHz|kHz|Hz)\b/i.exec(header.join(" "))?.[1];
  const rows: Row[] = [];
  const problems: string[] = [];
  for (const { number, content } of lines.slice(start)) {
    const row = readRow(cellsOf(content.replaceAll('"', "")), named ?? unit);
    if (typeof row === "string") problems.push(`Line ${number}: ${row}`);
    else rows.push(row);
  }
  return problems.length > 0 ? { ok: false, problems } : { ok: true, rows };
}
