import type { LinkSettings } from "@/lib/core/link/link-settings";
import type { MeasurementSettings, Polarization, SweepPurpose } from "@/lib/core/sweep/settings";
import { DEMO_BENCHES, type DemoBench } from "./demo-benches";
import { GANNET_STORY } from "./demo-gannet";
import { PLOVER_STORY } from "./demo-plover";
import type { BuildName, ProgramName, StoryLadder } from "./demo-story";
import { TERN_STORY } from "./demo-tern";
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
  setup: Omit<SpectrumSetup, "detector">;
}

export interface DemoStep {
  name: string;
  description: string;
  measuredOn: string;
  link: LinkSettings;
  sweeps: DemoSweep[];
}

export interface DemoLadder {
  programName: ProgramName;
  buildName: BuildName;
  name: string;
  description: string;
  steps: DemoStep[];
  /** Ambient sweeps of the build, one per bench; floor sweeps where they were taken. */
  background: DemoSweep[];
}

const LAYOUT_OF_PROGRAM: Record<ProgramName, CsvLayout> = {
  Gannet: "header-block",
  Plover: "semicolon-decimal-comma",
  Tern: "plain",
};
const DBM_PER_DBUV_50_OHM = -106.9897;
const STEP_FILE = /[^a-z0-9]+/g;

function sweepOf(
  story: StoryLadder,
  bench: DemoBench,
  label: string,
  measuredOn: string,
  detectors: SeedDetector[],
  what: Pick<SpectrumSetup, "product" | "link" | "treatments" | "ambient">,
): DemoSweep {
  const above = bench.key === "above-1-ghz";
  const span = above ? "1-6 GHz" : "30-1000 MHz";
  const name = `${story.buildName} ${label}, ${span}`;
  const purpose: SweepPurpose = what.product ? "product" : what.ambient ? "ambient" : "floor";
  // One polarization per bench throughout, the worse one, so that the steps stay comparable.
  const polarization: Polarization = above ? "horizontal" : "vertical";
  return {
    name,
    fileName: `${name.toLowerCase().replace(STEP_FILE, "-")}.csv`,
    purpose,
    polarization,
    benchKey: bench.key,
    measuredOn,
    link: what.link,
    settings: {
      rbwHz: bench.rbwHz,
      rbwKind: "6dB",
      vbwHz: 10 * bench.rbwHz > 8e6 ? 8e6 : 10 * bench.rbwHz,
      sweepTimeS: detectors.includes("quasi-peak") ? 1940 : above ? 50 : 20,
      attenuationDb: bench.receiver.attenuationDb,
      preamplifier: above,
      referenceLevelDb: null,
      polarization,
      heightM: above ? 1 : 1.5,
      azimuthDeg: null,
      distanceM: bench.distanceM,
      port: "radiated",
    },
    csvLayout: LAYOUT_OF_PROGRAM[story.programName],
    csvUnit: story.programName === "Tern" ? "dBm" : "dBuV",
    detectors,
    setup: {
      seed: deriveSeed(1_958, name),
      startHz: bench.startHz,
      stopHz: bench.stopHz,
      points: bench.points,
      rbwHz: bench.rbwHz,
      polarization,
      path: bench.path,
      receiver: bench.receiver,
      driftDb: 0.3,
      ...what,
    },
  };
}

/**
 * Plover's first build was swept with the peak detector alone, as a quick look is: what lies over
 * the mask there is an upper bound and stays undecided.
 */
function detectorsOf(bench: DemoBench, buildName: BuildName): SeedDetector[] {
  if (bench.key === "above-1-ghz") return ["peak", "average"];
  return buildName === "P1" ? ["peak"] : ["peak", "quasi-peak"];
}

function ladderOf(story: StoryLadder): DemoLadder {
  const { product, ambient } = story;
  const off = { product: null, link: null, treatments: [] };
  const firstDay = story.steps[0]?.measuredOn ?? "";
  const lastDay = story.steps.at(-1)?.measuredOn ?? firstDay;
  // The surroundings change from day to day: taken when the ladder was begun and when it ended.
  const background = DEMO_BENCHES.flatMap((bench) =>
    [firstDay, lastDay].map((day) =>
      sweepOf(story, bench, `ambient ${day}`, day, detectorsOf(bench, story.buildName), {
        ...off,
        ambient,
      }),
    ),
  );
  // The floor belongs to the benches, not to a build: taken once, with the first build.
  if (story.buildName === "G1")
    for (const bench of DEMO_BENCHES)
      background.push(
        sweepOf(story, bench, "input terminated", firstDay, detectorsOf(bench, story.buildName), {
          ...off,
          ambient: null,
        }),
      );
  const steps = story.steps.map((step, i) => ({
    name: step.name,
    description: step.description,
    measuredOn: step.measuredOn,
    link: step.link,
    sweeps: DEMO_BENCHES.map((bench) =>
      sweepOf(
        story,
        bench,
        `step ${i} ${step.name}`,
        step.measuredOn,
        detectorsOf(bench, story.buildName),
        { product, link: step.link, treatments: step.treatments, ambient },
      ),
    ),
  }));
  const { programName, buildName, name, description } = story;
  return { programName, buildName, name, description, steps, background };
}

/** Every ladder of the demo with all its sweeps, as data: nothing is worked out yet. */
export function demoLadders(): DemoLadder[] {
  return [...GANNET_STORY, ...PLOVER_STORY, ...TERN_STORY].map(ladderOf);
}

/** The file of one sweep, byte for byte the same whenever and wherever it is made. */
export function makeDemoCsv(sweep: DemoSweep): string {
  const spectra = sweep.detectors.map((detector) => makeSpectrum({ ...sweep.setup, detector }));
  const names: Record<SeedDetector, string> = {
    peak: "Peak",
    "quasi-peak": "Quasi-peak",
    average: "Average",
  };
  const restateDb = sweep.csvUnit === "dBm" ? DBM_PER_DBUV_50_OHM : 0;
  return writeSweepCsv({
    layout: sweep.csvLayout,
    traces: sweep.detectors.map((detector, i) => ({
      name: names[detector],
      detector,
      unit: sweep.csvUnit,
      levels: (spectra[i]?.levelsDbuv ?? new Float32Array()).map((level) => level + restateDb),
    })),
    frequenciesHz: spectra[0]?.frequenciesHz ?? new Float64Array(),
    settings: sweep.settings,
    measuredOn: sweep.measuredOn,
  });
}
