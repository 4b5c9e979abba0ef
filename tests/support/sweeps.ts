import type { Context } from "@/lib/auth/context";
import { createBench } from "@/lib/commands/bench/create-bench";
import { reviseSignalPath } from "@/lib/commands/bench/revise-signal-path";
import { createLadder } from "@/lib/commands/ladder/create-ladder";
import { createMask } from "@/lib/commands/mask/create-mask";
import { createBuild } from "@/lib/commands/program/create-build";
import { createProgram } from "@/lib/commands/program/create-program";
import { setProgramMasks } from "@/lib/commands/program/set-program-masks";
import { importSweep } from "@/lib/commands/sweep/import-sweep";
import type { LinkSettings } from "@/lib/core/link/link-settings";
import type { Mask } from "@/lib/core/mask/mask";
import type { Detector, MeasurementSettings } from "@/lib/core/sweep/settings";

export const SETTINGS: MeasurementSettings = {
  rbwHz: 120e3,
  rbwKind: "6dB",
  vbwHz: null,
  sweepTimeS: null,
  attenuationDb: 10,
  preamplifier: false,
  referenceLevelDb: null,
  polarization: "vertical",
  heightM: 1,
  azimuthDeg: null,
  distanceM: 3,
  port: "radiated",
};

export const LINK: LinkSettings = {
  bitRateHz: 3.2e9,
  payload: "prbs23",
  patternBits: null,
  scrambler: "additive",
  scramblerPolynomial: null,
  scramblerRestartBits: null,
  coding: "8b10b",
  spread: null,
  spreadOff: true,
  edgeTimeS: null,
  cable: "coax, 7 m",
};

/** One line from 30 to 300 MHz at a flat limit in dBµV/m at 3 m. */
export function flatMask(
  limitDb: number,
  change: { title?: string; detector?: Detector; startHz?: number; stopHz?: number } = {},
): Mask {
  const { title = "Loft limit", detector = "peak", startHz = 30e6, stopHz = 300e6 } = change;
  const level = { startDb: limitDb, stopDb: limitDb, interpolation: "log" as const };
  return {
    format: "neap-mask",
    version: 1,
    key: "",
    title,
    port: "radiated",
    unit: "dBuV/m",
    distanceM: 3,
    document: "House rule 7",
    clause: "2",
    edition: "B",
    provenance: "team",
    note: "",
    lines: [
      {
        name: detector === "peak" ? "Peak" : "Quasi-peak",
        detector,
        rbwHz: 120e3,
        rbwKind: "6dB",
        segments: [{ startHz, stopHz, ...level }],
      },
    ],
  };
}

const dates = { calibratedOn: "2026-02-01", dueOn: "2027-02-01" };

/**
 * From 30 to 300 MHz the factors add 19 dB + 12 dB a decade above 30 MHz and take 20 dB away:
 * antenna 18 to 28 dB/m, cable 1 to 3 dB, preamplifier 20 dB. Outside nothing is known.
 */
export const TRANSDUCERS = [
  {
    name: "Mast antenna",
    kind: "antenna",
    ...dates,
    factors: [
      { frequencyHz: 30e6, factorDb: 18 },
      { frequencyHz: 300e6, factorDb: 28 },
    ],
  },
  {
    name: "Loft cable",
    kind: "cable",
    ...dates,
    factors: [
      { frequencyHz: 30e6, factorDb: 1 },
      { frequencyHz: 300e6, factorDb: 3 },
    ],
  },
  {
    name: "Preamplifier",
    kind: "preamplifier",
    ...dates,
    factors: [
      { frequencyHz: 1e6, factorDb: 20 },
      { frequencyHz: 1e9, factorDb: 20 },
    ],
  },
];

/** What those factors add in dB at a frequency, by hand. */
export const addedDb = (hz: number) => 18 + 1 - 20 + 12 * Math.log10(hz / 30e6);

export interface Place {
  programId: string;
  buildId: string;
  benchId: string;
  maskId: string;
}

let made = 0;

/** A program with a build and one mask, and a bench with a signal path. */
export async function makePlace(ctx: Context, mask: Mask = flatMask(50)): Promise<Place> {
  made += 1;
  const { programId } = await createProgram(ctx, {
    name: `Gannet ${made}`,
    description: "",
    targetMarginDb: 4,
  });
  const { buildId } = await createBuild(ctx, {
    programId,
    name: "G1",
    builtOn: "2026-05-04",
    notes: "",
  });
  const benchId = await makeBench(ctx, `Loft ${made}`);
  const { maskId } = await createMask(ctx, { mask });
  await setProgramMasks(ctx, { programId, maskIds: [maskId] });
  return { programId, buildId, benchId, maskId };
}

export async function makeBench(ctx: Context, name: string): Promise<string> {
  const { benchId } = await createBench(ctx, {
    name,
    site: "",
    instrument: "An analyzer",
    distanceM: 3,
    guardDb: 2,
    notes: "",
    impedanceOhm: 50,
  });
  await reviseSignalPath(ctx, { benchId, impedanceOhm: 50, transducers: TRANSDUCERS });
  return benchId;
}

/** A ladder on the build; returns its id and the id of step 0. */
export async function makeLadder(ctx: Context, buildId: string, name = "Link") {
  const input = { buildId, name, notes: "", startName: "As built", startDescription: "" };
  return (await createLadder(ctx, input)).ladderId;
}

interface Table {
  startMhz?: number;
  stepMhz?: number;
  unit?: string;
  /** As a column's name would say it. */
  detector?: string;
}

/** A file of one trace, as an analyzer might write it. */
export function csvOf(levels: ArrayLike<number | string>, table: Table = {}): Uint8Array {
  const { startMhz = 30, stepMhz = 10, unit = "dBuV", detector = "peak" } = table;
  const rows = Array.from(levels, (level, i) => `${startMhz + i * stepMhz},${level}`);
  return new TextEncoder().encode(
    `Frequency (MHz),Trace 1 (${unit}) ${detector}\n${rows.join("\n")}\n`,
  );
}

export const text = (content: string) => new TextEncoder().encode(content);

/** 28 points from 30 to 300 MHz at one level in dBµV, other levels by index. */
export function levelsOf(floor: number, peaks: Record<number, number> = {}): number[] {
  return Array.from({ length: 28 }, (_, i) => peaks[i] ?? floor);
}

export function importInput(
  place: Pick<Place, "buildId" | "benchId">,
  bytes: Uint8Array,
  change: Record<string, unknown> = {},
) {
  return {
    buildId: place.buildId,
    benchId: place.benchId,
    stepId: null,
    fileName: "g1_vertical.csv",
    bytes,
    answers: {},
    name: "G1 vertical",
    purpose: "product",
    measuredOn: "2026-06-01",
    corrected: false,
    settings: SETTINGS,
    link: LINK,
    notes: "",
    onRecord: true,
    again: false,
    ...change,
  };
}

export async function importLevels(
  ctx: Context,
  place: Pick<Place, "buildId" | "benchId">,
  levels: ArrayLike<number | string>,
  change: Record<string, unknown> = {},
  table: Table = {},
) {
  return importSweep(ctx, importInput(place, csvOf(levels, table), { again: true, ...change }));
}
