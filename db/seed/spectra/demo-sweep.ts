import type { LinkSettings } from "@/lib/core/link/link-settings";
import type { MeasurementSettings, Polarization, SweepPurpose } from "@/lib/core/sweep/settings";
import { pathOn, type DemoBench } from "./demo-benches";
import type { BuildName, ProgramName } from "./demo-story";
import { deriveSeed } from "./random";
import type { SeedDetector, SpectrumSetup } from "./setup";
import { makeSpectrum } from "./spectrum";
import { writeSweepCsv, type CsvLayout } from "./write-csv";

export interface DemoSweep {
  name: string;
  fileName: string;
  purpose: SweepPurpose;
  polarization: Polarization;
  benchKey: DemoBench["key"];
  measuredOn: string;
  /** null for ambient and floor sweeps: the product was off. */
  link: LinkSettings | null;
  settings: MeasurementSettings;
  csvLayout: CsvLayout;
  csvUnit: "dBuV" | "dBm";
  detectors: SeedDetector[];
  /** A connector that was not tight took this much away from every level, dB. */
  looseDb: number;
  setup: Omit<SpectrumSetup, "detector">;
}

/** What was swept, and in which way other than the bench's usual one. */
export interface SweepPlan {
  programName: ProgramName;
  buildName: BuildName;
  label: string;
  measuredOn: string;
  detectors: SeedDetector[];
  what: Pick<SpectrumSetup, "product" | "link" | "treatments" | "ambient">;
  span?: { startHz: number; stopHz: number; points: number };
  polarization?: Polarization;
  rbwHz?: number;
  looseDb?: number;
}

const LAYOUT_OF_PROGRAM: Record<ProgramName, CsvLayout> = {
  Gannet: "header-block",
  Plover: "semicolon-decimal-comma",
  Tern: "plain",
};
const DBM_PER_DBUV_50_OHM = -106.9897;
const NOT_IN_FILE_NAME = /[^a-z0-9]+/g;

const inWords = (startHz: number, stopHz: number) =>
  startHz >= 1e9 ? `${startHz / 1e9}-${stopHz / 1e9} GHz` : `${startHz / 1e6}-${stopHz / 1e6} MHz`;

/** One sweep of the demo on a bench, as data: nothing is worked out yet. */
export function planSweep(bench: DemoBench, plan: SweepPlan): DemoSweep {
  const { detectors, what, measuredOn } = plan;
  const above = bench.key === "above-1-ghz";
  const { startHz, stopHz, points } = plan.span ?? bench;
  const rbwHz = plan.rbwHz ?? bench.rbwHz;
  const name = `${plan.buildName} ${plan.label}, ${inWords(startHz, stopHz)}`;
  // One polarization per bench throughout, the worse one, so that the steps stay comparable.
  const polarization = plan.polarization ?? (above ? "horizontal" : "vertical");
  // Quasi-peak takes about two seconds per MHz.
  const slowS = Math.round((stopHz - startHz) / 0.5e6);
  return {
    name,
    fileName: `${name.toLowerCase().replace(NOT_IN_FILE_NAME, "-")}.csv`,
    purpose: what.product ? "product" : what.ambient ? "ambient" : "floor",
    polarization,
    benchKey: bench.key,
    measuredOn,
    link: what.link,
    settings: {
      rbwHz,
      rbwKind: "6dB",
      vbwHz: 10 * rbwHz > 8e6 ? 8e6 : 10 * rbwHz,
      sweepTimeS: detectors.includes("quasi-peak") ? slowS : above ? 50 : 20,
      attenuationDb: bench.receiver.attenuationDb,
      preamplifier: above,
      referenceLevelDb: null,
      polarization,
      heightM: above ? 1 : 1.5,
      azimuthDeg: null,
      distanceM: bench.distanceM,
      port: "radiated",
    },
    csvLayout: LAYOUT_OF_PROGRAM[plan.programName],
    csvUnit: plan.programName === "Tern" ? "dBm" : "dBuV",
    detectors,
    looseDb: plan.looseDb ?? 0,
    setup: {
      seed: deriveSeed(1_958, name),
      startHz,
      stopHz,
      points,
      rbwHz,
      polarization,
      path: pathOn(bench, measuredOn),
      receiver: bench.receiver,
      driftDb: 0.3,
      ...what,
    },
  };
}

const TRACE_NAMES: Record<SeedDetector, string> = {
  peak: "Peak",
  "quasi-peak": "Quasi-peak",
  average: "Average",
};

/** What an instrument writes for levels at its input. */
function csvOf(sweep: DemoSweep, frequenciesHz: Float64Array, levels: Float32Array[]): string {
  const restateDb = (sweep.csvUnit === "dBm" ? DBM_PER_DBUV_50_OHM : 0) - sweep.looseDb;
  return writeSweepCsv({
    layout: sweep.csvLayout,
    traces: sweep.detectors.map((detector, i) => ({
      name: TRACE_NAMES[detector],
      detector,
      unit: sweep.csvUnit,
      levels: (levels[i] ?? new Float32Array()).map((level) => level + restateDb),
    })),
    frequenciesHz,
    settings: sweep.settings,
    measuredOn: sweep.measuredOn,
  });
}

/** The file of one sweep, byte for byte the same whenever and wherever it is made. */
export function makeDemoCsv(sweep: DemoSweep): string {
  const spectra = sweep.detectors.map((detector) => makeSpectrum({ ...sweep.setup, detector }));
  const levels = spectra.map((spectrum) => spectrum.levelsDbuv);
  return csvOf(sweep, spectra[0]?.frequenciesHz ?? new Float64Array(), levels);
}

/** A file of single-frequency readings of the same sweep at the samples next to `frequenciesHz`. */
export function makeSpotsCsv(sweep: DemoSweep, frequenciesHz: readonly number[]): string {
  const { startHz, stopHz, points } = sweep.setup;
  const stepHz = (stopHz - startHz) / (points - 1);
  const places = frequenciesHz.map((hz) => Math.round((hz - startHz) / stepHz));
  const levels = sweep.detectors.map((detector) => {
    const { levelsDbuv } = makeSpectrum({ ...sweep.setup, detector });
    return Float32Array.from(places, (place) => levelsDbuv[place] ?? Number.NaN);
  });
  return csvOf(
    sweep,
    Float64Array.from(places, (place) => startHz + place * stepHz),
    levels,
  );
}
