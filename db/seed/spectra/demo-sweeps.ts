import type { LinkSettings } from "@/lib/core/link/link-settings";
import { DEMO_BENCHES, type DemoBench } from "./demo-benches";
import { GANNET_STORY } from "./demo-gannet";
import { PLOVER_STORY } from "./demo-plover";
import type { BuildName, ProgramName, StoryLadder } from "./demo-story";
import { planSweep, type DemoSweep, type SweepPlan } from "./demo-sweep";
import { TERN_STORY } from "./demo-tern";
import type { SeedDetector } from "./setup";

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
  /** Ambient sweeps of the build, most days per bench; floor sweeps where they were taken. */
  background: DemoSweep[];
}

/**
 * Plover's first build was swept with the peak detector alone, as a quick look is: what lies over
 * the mask there is an upper bound and stays undecided.
 */
function detectorsOf(bench: DemoBench, buildName: BuildName): SeedDetector[] {
  if (bench.key === "above-1-ghz") return ["peak", "average"];
  return buildName === "P1" ? ["peak"] : ["peak", "quasi-peak"];
}

/** A quick look at the surroundings: coarse, since what is on air is wide or strong. */
export function coarseSpan({ key, startHz, stopHz }: DemoBench): SweepPlan["span"] {
  return { startHz, stopHz, points: key === "above-1-ghz" ? 2_501 : 4_851 };
}

/** Days on which nobody looked at the surroundings: the sweeps of that day say so. */
const NO_AMBIENT = new Set(["2026-05-27", "2026-10-22"]);

function ladderOf(story: StoryLadder): DemoLadder {
  const { product, ambient, programName, buildName } = story;
  const off = { product: null, link: null, treatments: [] };
  const plan = (bench: DemoBench, label: string, measuredOn: string, what: SweepPlan["what"]) => ({
    programName,
    buildName,
    label,
    measuredOn,
    detectors: detectorsOf(bench, buildName),
    what,
  });
  const days = story.steps.map((step) => step.measuredOn);
  // The surroundings change from day to day.
  const looked = days.filter((day) => !NO_AMBIENT.has(day));
  const background = DEMO_BENCHES.flatMap((bench) =>
    looked.map((day) =>
      planSweep(bench, {
        ...plan(bench, `ambient ${day}`, day, { ...off, ambient }),
        span: coarseSpan(bench),
      }),
    ),
  );
  // The floor belongs to the benches, not to a build: taken once, with the first build.
  if (buildName === "G1")
    for (const bench of DEMO_BENCHES)
      background.push(
        planSweep(bench, plan(bench, "input terminated", days[0] ?? "", { ...off, ambient: null })),
      );
  const steps = story.steps.map((step, i) => ({
    name: step.name,
    description: step.description,
    measuredOn: step.measuredOn,
    link: step.link,
    sweeps: DEMO_BENCHES.map((bench) =>
      planSweep(
        bench,
        plan(bench, `step ${i} ${step.name}`, step.measuredOn, {
          product,
          link: step.link,
          treatments: step.treatments,
          ambient,
        }),
      ),
    ),
  }));
  const { name, description } = story;
  return { programName, buildName, name, description, steps, background };
}

/** Every ladder of the demo that tells how a build was made quiet, in the order of its days. */
export function demoLadders(): DemoLadder[] {
  const firstDay = ({ steps }: StoryLadder) => steps[0]?.measuredOn ?? "";
  return [...GANNET_STORY, ...PLOVER_STORY, ...TERN_STORY]
    .sort((a, b) => firstDay(a).localeCompare(firstDay(b)))
    .map(ladderOf);
}
