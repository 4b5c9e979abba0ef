import type { Detector, Hold } from "@/lib/core/sweep/settings";
import { LEVEL_UNITS, type FileUnit } from "@/lib/core/units/level-units";
import { parseUnit } from "@/lib/core/units/parse-unit";
import type { ColumnInfo } from "./describe-columns";
import type { HeaderLine } from "./find-tables";
import { headerKeyOf, type HeaderKey } from "./header-keys";
import { unitOf } from "./header-values";
import type { HeaderEntry, HeaderFacts } from "./read-header";
import { quote } from "./refusal";
import { splitRow } from "./split-row";
import { detectorInName, detectorOf, holdOf } from "./trace-words";

export interface Found<T> {
  value: T | null;
  guess: T | null;
  why: string;
}

/** Values of a setting for trace `i` of `count`: one line per trace, one cell per trace, or one for all. */
function valueFor(entries: HeaderEntry[], i: number, count: number): string | null {
  if (entries.length === count && count > 1) return entries[i]?.values[0] ?? null;
  const [entry] = entries;
  if (!entry) return null;
  const cells = entry.values.filter((value) => value !== "");
  if (entries.length === 1 && count > 1 && cells.length === count) return cells[i] ?? null;
  const firsts = new Set(entries.map(({ values }) => values[0]?.toLowerCase()));
  return firsts.size === 1 ? (cells[0] ?? null) : null;
}

export function headerValue(
  facts: HeaderFacts,
  key: HeaderKey,
  i: number,
  count: number,
): string | null {
  return valueFor(facts.get(key) ?? [], i, count);
}

/** A unit that stands alone in a cell right above the table, when only one does. */
function unitNearby(header: HeaderLine[], delimiter: string): FileUnit | null {
  const units = header.slice(-8).flatMap(({ text }) => {
    const cells = delimiter.length === 1 ? splitRow(text, delimiter) : [];
    if (headerKeyOf(cells[0] ?? "") !== null) return [];
    return cells.flatMap((cell) => {
      const unit = parseUnit(cell);
      return unit !== null && unit !== "dB" && LEVEL_UNITS.some((known) => known === unit)
        ? [unit]
        : [];
    });
  });
  return new Set(units).size === 1 ? (units[0] ?? null) : null;
}

/** What the column itself calls its unit, when that is none that Neap knows. */
function unknownUnit(column: ColumnInfo): string | null {
  if (column.levelUnit !== null) return null;
  const inName = /[[(]\s*(dB[^\])]*|[^\])]*\/[^\])]*|[num\u00b5\u03bcp]?[AVWT])\s*[\])]/i.exec(
    column.name ?? "",
  )?.[1];
  return inName ?? column.unitText;
}

export function findUnit(input: {
  column: ColumnInfo;
  facts: HeaderFacts;
  header: HeaderLine[];
  delimiter: string;
  referenceUnit: string | null;
  highestLevel: number;
}): Found<FileUnit> {
  const { column, facts, referenceUnit, highestLevel } = input;
  const reference = referenceUnit === null ? null : parseUnit(referenceUnit);
  const guess = reference ?? (highestLevel < 0 ? "dBm" : "dBuV");
  if (column.levelUnit !== null) return { value: column.levelUnit, guess, why: "" };
  const unknown = unknownUnit(column);
  if (unknown !== null)
    return { value: null, guess, why: `The unit ${quote(unknown)} is not one that Neap knows.` };
  const stated = (facts.get("levelUnit") ?? []).flatMap((entry) => unitOf(entry) ?? []);
  if (new Set(stated).size > 1)
    return {
      value: null,
      guess: stated[0] ?? guess,
      why: `The header states more than one unit: ${[...new Set(stated)].join(", ")}.`,
    };
  const value = stated[0] ?? unitNearby(input.header, input.delimiter);
  const why =
    reference === null
      ? "The file does not state the unit of the levels."
      : `The file states the unit ${reference} for the reference level only, not for the levels.`;
  return { value, guess, why };
}

export function findDetector(
  name: string,
  otherNames: string[],
  headerText: string | null,
): Found<Detector> {
  const own = detectorInName(name);
  // "Maximum" beside "Average" are statistics over time, which may be of any detector.
  const isStatistic =
    own.detector === "average" &&
    otherNames.some(
      (other) => /\bm(?:ax|in)/i.test(other) && detectorInName(other).detector === null,
    );
  if (own.detector !== null && !isStatistic)
    return { value: own.detector, guess: own.detector, why: "" };
  const stated = headerText === null ? null : detectorOf(headerText);
  const why =
    headerText === null || stated?.detector
      ? `The file does not state the detector of ${quote(name)}.`
      : `The header says ${quote(headerText)} for the detector, which could be more than one.`;
  return { value: stated?.detector ?? null, guess: stated?.guess ?? own.guess, why };
}

export function findHold(name: string, headerText: string | null): Hold | null {
  const own = holdOf(name);
  // A column called "average" names its detector; only a hold by name is one.
  if (own === "max-hold" || own === "min-hold") return own;
  return headerText === null ? own : (holdOf(headerText) ?? null);
}
