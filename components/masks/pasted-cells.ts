import { readNumber } from "@/components/ui/read-number";
import type { LevelUnit } from "@/lib/core/units/level-units";
import { LEVEL_UNITS } from "@/lib/core/units/level-units";
import { parseUnit } from "@/lib/core/units/parse-unit";
import { readCellFrequency, settleFrequency } from "./mask-draft";

const BETWEEN = /^(.*?\d[^\d]*?)\s*(?:\.\.\.|…|–|—|(?<=[\d\sa-z])-|\bto\b)\s*(\+?[\d.,].*)$/i;
const NO_LIMIT = /^(?:|-+|–|—|n\/?a|none|no limit)$/i;

/** "0,15 – 0,30 MHz" as its two ends, a unit behind the second holding for both; null otherwise. */
export function splitRange(cell: string): { start: string; stop: string } | null {
  const [, first, stop] = BETWEEN.exec(cell.trim()) ?? [];
  if (first === undefined || stop === undefined) return null;
  const unit = /[a-z]+\s*$/i.exec(stop)?.[0].trim() ?? "";
  const start = /[a-z]/i.test(first) || unit === "" ? first.trim() : `${first.trim()} ${unit}`;
  return { start, stop: stop.trim() };
}

export const isRange = (cell: string) => splitRange(cell) !== null;

/** A frequency cell with its unit, as it is shown to be checked; null when it is none. */
export function pastedFrequency(cell: string, unit: string): string | null {
  return Number.isNaN(readCellFrequency(cell, unit)) ? null : settleFrequency(cell, unit);
}

/** A unit of a limit in any spelling; null when it is none. */
export function limitUnitOf(text: string): LevelUnit | null {
  const unit = parseUnit(text);
  return LEVEL_UNITS.find((known) => known === unit && known !== "dB") ?? null;
}

export type PastedLevel =
  | { kind: "none" }
  | { kind: "levels"; startDb: string; stopDb: string; unit: LevelUnit | null }
  | { kind: "problem"; why: string };

/** "66", "66 to 56" or "40 dBµV/m"; a dash or an empty cell is no limit. */
export function pastedLevel(cell: string): PastedLevel {
  const typed = cell.trim();
  if (NO_LIMIT.test(typed)) return { kind: "none" };
  const [, body = typed, unitText = ""] =
    /^(.*?[\d.])\s*(dB\S*|[munµμ]?[VAW](?:\/m)?)$/i.exec(typed) ?? [];
  const unit = unitText === "" ? null : limitUnitOf(unitText);
  if (unitText !== "" && unit === null)
    return {
      kind: "problem",
      why: `"${unitText}" is no unit of a limit: limits are stated in dB.`,
    };
  const ends = splitRange(body) ?? { start: body, stop: body };
  const [startDb, stopDb] = [readNumber(ends.start), readNumber(ends.stop)];
  if (!Number.isFinite(startDb) || !Number.isFinite(stopDb))
    return { kind: "problem", why: `"${typed}" is no level in dB.` };
  return { kind: "levels", startDb: String(startDb), stopDb: String(stopDb), unit };
}
