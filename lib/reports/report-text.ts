import type { FrequencyRange } from "@/lib/core/reading/reading";
import type { MeasurementSettings } from "@/lib/core/sweep/settings";
import { formatFrequency } from "@/lib/core/units/format";
import { NOT_STATED } from "./report-labels";

/** Value with its unit, or "not stated". */
export function stateValue(value: number | null, unit: string): string {
  return value === null ? NOT_STATED : `${value < 0 ? "\u2212" : ""}${Math.abs(value)} ${unit}`;
}

export function stateFrequency(hz: number | null): string {
  return hz === null ? NOT_STATED : formatFrequency(hz);
}

/** ISO date and minute in UTC, "2026-12-01 10:40 UTC". */
export function formatInstant(iso: string): string {
  const instant = new Date(iso);
  if (Number.isNaN(instant.getTime())) return iso;
  const text = instant.toISOString();
  return `${text.slice(0, 10)} ${text.slice(11, 16)} UTC`;
}

export function formatRange(range: FrequencyRange): string {
  return `${formatFrequency(range.startHz)} to ${formatFrequency(range.stopHz)}`;
}

/** Share as whole per cent, floored: what is not fully covered never reads 100 %. */
export function formatCoverage(fraction: number): string {
  return fraction >= 1 ? "100 %" : `${Math.min(99, Math.floor(fraction * 100))} %`;
}

export function formatBandwidth({ rbwHz, rbwKind }: MeasurementSettings): string {
  if (rbwHz === null) return NOT_STATED;
  const kind = rbwKind === null ? "3 dB or 6 dB not stated" : rbwKind.replace("dB", " dB");
  return `${formatFrequency(rbwHz)} (${kind})`;
}

/** "1 sweep", "3 sweeps". */
export function countOf(count: number, singular: string, plural = `${singular}s`): string {
  return `${count} ${count === 1 ? singular : plural}`;
}

export function joinWords(words: readonly string[]): string {
  return words.length < 2
    ? (words[0] ?? "")
    : `${words.slice(0, -1).join(", ")} and ${words.at(-1)}`;
}
