import { csvOf } from "../../support/sweeps";

/**
 * 28 points from 30 to 300 MHz at 20 dBµV with lines at 60, 110, 160, 210 and 260 MHz, before the
 * path of tests/support/sweeps, which adds the same in reference and check.
 */
export function combOf(
  change: Record<number, number> = {},
  table: Parameters<typeof csvOf>[1] = {},
) {
  const lines: Record<number, number> = { 3: 60, 8: 58, 13: 56, 18: 54, 23: 52, ...change };
  return csvOf(
    Array.from({ length: 28 }, (_, i) => lines[i] ?? 20),
    table,
  );
}

export function checkInput(
  benchId: string,
  bytes: Uint8Array,
  change: Record<string, unknown> = {},
) {
  return {
    benchId,
    fileName: "comb.csv",
    bytes,
    answers: {},
    traceIndex: null,
    source: "Comb 50 MHz",
    measuredOn: "2026-06-02",
    corrected: false,
    rbwHz: 120e3,
    isReference: false,
    notes: "",
    ...change,
  };
}

export const referenceInput = (
  benchId: string,
  bytes = combOf(),
  change: Record<string, unknown> = {},
) => checkInput(benchId, bytes, { isReference: true, measuredOn: "2026-06-01", ...change });
