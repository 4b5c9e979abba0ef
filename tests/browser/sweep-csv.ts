export interface SweepCsv {
  /** Stands in the header; with it two files of the same levels are not the same bytes. */
  note: string;
  detector: string;
  unit: string;
  startMhz: number;
  stopMhz: number;
  stepMhz: number;
  floorDb: number;
  /** Single lines out of the floor, each one sample wide at its top. */
  lines: readonly { frequencyMhz: number; levelDb: number }[];
  rbwKhz?: number;
}

/** Bytes of a CSV export: a header, then a frequency in MHz and a level per row. */
export function makeSweepCsv(sweep: SweepCsv): Buffer {
  const { note, detector, unit, startMhz, stopMhz, stepMhz, floorDb, lines, rbwKhz = 120 } = sweep;
  const count = Math.round((stopMhz - startMhz) / stepMhz) + 1;
  const levels = Array.from({ length: count }, (_, i) => floorDb + (i % 2) * 0.5);
  for (const { frequencyMhz, levelDb } of lines) {
    const top = Math.round((frequencyMhz - startMhz) / stepMhz);
    for (const [at, below] of [
      [top - 2, 20],
      [top - 1, 6],
      [top, 0],
      [top + 1, 6],
      [top + 2, 20],
    ] as const) {
      levels[at] = Math.max(floorDb, levelDb - below);
    }
  }
  const rows = levels.map(
    (level, i) => `${(startMhz + i * stepMhz).toFixed(3)},${level.toFixed(2)}`,
  );
  const said = ["Date,2026-11-20", `Comment,${note}`, `Detector,${detector}`];
  const header = [...said, `RBW,${rbwKhz},kHz`, ""];
  return Buffer.from([...header, `Frequency [MHz],Level [${unit}]`, ...rows, ""].join("\n"));
}
