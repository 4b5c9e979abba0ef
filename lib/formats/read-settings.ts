import type { MeasurementSettings } from "@/lib/core/sweep/settings";
import {
  dateOf,
  frequencyHzOf,
  metresOf,
  onOff,
  quantityOf,
  secondsOf,
  type Quantity,
} from "./header-values";
import type { HeaderKey } from "./header-keys";
import type { DecimalMark } from "./parse-number";
import { quote } from "./refusal";
import type { HeaderEntry, HeaderFacts } from "./read-header";

export interface FileSettings {
  settings: Partial<MeasurementSettings> & { measuredOn?: string | null };
  /** Unit that the reference level carries: a hint to the traces' own. */
  referenceUnit: string | null;
  warnings: string[];
}

interface SettingsInput {
  facts: HeaderFacts;
  decimal: DecimalMark;
  /** Hz per unit of numbers in the header that carry none; null when unknown. */
  headerUnitHz: number | null;
}

/** The one value that all entries agree on; two that differ are warned about and left out. */
function agreed<T>(
  entries: HeaderEntry[],
  read: (entry: HeaderEntry) => T | null,
  warnings: string[],
): T | null {
  const values = entries.flatMap((entry) => {
    const value = read(entry);
    return value === null ? [] : [{ value, entry }];
  });
  const first = values[0];
  const other = values.find(({ value }) => value !== first?.value);
  if (!first) return null;
  if (!other) return first.value;
  warnings.push(
    `${first.entry.name} is stated twice and differently (lines ${first.entry.line} and ${other.entry.line}); it was left open.`,
  );
  return null;
}

/** Reads what the header says about how the sweep was measured; what it leaves open stays open. */
export function readSettings({ facts, decimal, headerUnitHz }: SettingsInput): FileSettings {
  const warnings: string[] = [];
  const settings: FileSettings["settings"] = {};
  const entries = (key: HeaderKey) => facts.get(key) ?? [];
  const quantity = (entry: HeaderEntry): Quantity | null => quantityOf(entry, decimal);
  const withUnit =
    (convert: (quantity: Quantity) => number | null) =>
    (entry: HeaderEntry): number | null => {
      const found = quantity(entry);
      if (found === null) return null;
      const value = convert(found);
      if (value === null)
        warnings.push(
          `Line ${entry.line}: ${entry.name} ${found.value} carries no unit that is known and was left open.`,
        );
      return value;
    };
  const bandwidth = withUnit((found) =>
    found.value > 0 ? frequencyHzOf(found, headerUnitHz) : null,
  );

  const rbwHz = agreed(entries("rbw"), bandwidth, warnings);
  if (rbwHz !== null) settings.rbwHz = rbwHz;
  const isVbwOff = entries("vbwEnabled").some((entry) => onOff(entry.values[0] ?? "") === false);
  const vbwHz = isVbwOff ? null : agreed(entries("vbw"), bandwidth, warnings);
  if (vbwHz !== null) settings.vbwHz = vbwHz;
  const sweepTimeS = agreed(entries("sweepTime"), withUnit(secondsOf), warnings);
  if (sweepTimeS !== null && sweepTimeS > 0) settings.sweepTimeS = sweepTimeS;
  const decibels = (entry: HeaderEntry) => quantity(entry)?.value ?? null;
  const attenuationDb = agreed(
    entries("attenuation"),
    withUnit((found) => (found.unit === null || /^db$/i.test(found.unit) ? found.value : null)),
    warnings,
  );
  if (attenuationDb !== null) settings.attenuationDb = attenuationDb;
  const preamplifier = agreed(
    entries("preamplifier"),
    (entry) => onOff(entry.values[0] ?? "") ?? (quantity(entry)?.value === 0 ? false : null),
    warnings,
  );
  if (preamplifier !== null) settings.preamplifier = preamplifier;
  const reference = entries("referenceLevel").flatMap((entry) => quantity(entry) ?? [])[0];
  const referenceLevelDb = agreed(entries("referenceLevel"), decibels, warnings);
  if (referenceLevelDb !== null) settings.referenceLevelDb = referenceLevelDb;
  const distanceM = agreed(entries("distance"), withUnit(metresOf), warnings);
  if (distanceM !== null && distanceM > 0) settings.distanceM = distanceM;
  const heightM = agreed(entries("height"), withUnit(metresOf), warnings);
  if (heightM !== null && heightM > 0) settings.heightM = heightM;
  const polarization = agreed(
    entries("polarization"),
    (entry) =>
      /^h/i.test(entry.values[0] ?? "")
        ? ("horizontal" as const)
        : /^v/i.test(entry.values[0] ?? "")
          ? ("vertical" as const)
          : null,
    warnings,
  );
  if (polarization !== null) settings.polarization = polarization;

  for (const entry of entries("date")) {
    const date = dateOf(entry.values.join(" "));
    if (date === "open")
      warnings.push(
        `Line ${entry.line}: in the date ${quote(entry.values[0] ?? "")} day and month may swap; it was left open.`,
      );
    else if (date !== null) settings.measuredOn ??= date;
  }
  return { settings, referenceUnit: reference?.unit ?? null, warnings };
}
