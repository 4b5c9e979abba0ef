import type { MismatchField } from "@/lib/core/delta/delta";
import type { LinkSettings } from "@/lib/core/link/link-settings";
import { DEMO_BENCHES } from "./demo-benches";
import { GANNET_CODED } from "./demo-gannet";
import {
  connectorShell,
  GANNET,
  housing,
  linkFerrite,
  longerSupplyLead,
  movedSupplyFerrite,
  supplyFerrite,
  supplyFilter,
  TERN,
} from "./demo-products";
import { SITE_SEED, spreadBy } from "./demo-story";
import { planSweep, type DemoSweep, type SweepPlan } from "./demo-sweep";
import { TERN_SPREAD } from "./demo-tern";
import type { DemoLadder, DemoStep } from "./demo-sweeps";
import type { Treatment } from "./setup";

/** Why somebody compares two steps although something differs. */
interface AcceptedReason {
  fields: MismatchField[];
  reason: string;
}

interface SideStep extends DemoStep {
  /** Name of the step that it starts from, when that is not the last kept one. */
  branchOf?: string;
  isDropped?: boolean;
  /** The difference to the step it is held against was accepted. */
  accepted?: AcceptedReason;
}

/** A ladder beside the one that gives the build's record: a question, answered in a few days. */
export interface SideLadder extends Omit<DemoLadder, "steps"> {
  steps: SideStep[];
}

/** What a supply lead radiates lies here; 50 kHz steps, under half the RBW. */
const LOW_SPAN = { startHz: 30e6, stopHz: 230e6, points: 4_001 };

interface Trial extends Pick<
  SideStep,
  "name" | "description" | "measuredOn" | "branchOf" | "isDropped" | "accepted"
> {
  treatments: Treatment[];
  repeats?: number;
  rbwHz?: number;
}

type Common = Pick<SweepPlan, "programName" | "buildName"> & {
  link: LinkSettings;
  product: SweepPlan["what"]["product"];
  gainDb: number;
};

function lowSweep(common: Common, label: string, trial: Trial | null, day: string): DemoSweep {
  const [bench] = DEMO_BENCHES;
  if (!bench) throw new Error("The demo has no bench.");
  const { programName, buildName, link, product, gainDb } = common;
  const ambient = { siteSeed: SITE_SEED, gainDb };
  return planSweep(bench, {
    programName,
    buildName,
    label,
    measuredOn: day,
    detectors: ["peak", "quasi-peak"],
    span: LOW_SPAN,
    ...(trial?.rbwHz ? { rbwHz: trial.rbwHz } : {}),
    what: trial
      ? { product, link, treatments: trial.treatments, ambient }
      : { product: null, link: null, treatments: [], ambient },
  });
}

function sideSteps(common: Common, trials: Trial[]): SideStep[] {
  return trials.map((trial, i) => {
    const { treatments: _treatments, repeats = 1, rbwHz: _rbw, ...step } = trial;
    const labels = Array.from({ length: repeats }, (_, k) =>
      repeats > 1 ? `trial ${i} ${trial.name}, repeat ${k + 1}` : `trial ${i} ${trial.name}`,
    );
    const sweeps = labels.map((label) => lowSweep(common, label, trial, trial.measuredOn));
    return { ...step, link: common.link, sweeps };
  });
}

function ambientsOf(common: Common, days: string[]): DemoSweep[] {
  return days.map((day) => lowSweep(common, `ambient ${day}`, null, day));
}

const gannet: Common = {
  programName: "Gannet",
  buildName: "G3",
  link: { ...GANNET_CODED, ...spreadBy(0.5) },
  product: GANNET,
  gainDb: -0.5,
};
const tern: Common = {
  programName: "Tern",
  buildName: "T1",
  link: TERN_SPREAD,
  product: TERN,
  gainDb: 6,
};

const shielded = [housing("Board shield can and gasket", 9), connectorShell(4), linkFerrite()];
const foiled = [housing("Copper foil", 5), supplyFerrite()];

/** Beside the ladders of the builds: one change at a time on a cable, in the lowest span only. */
export function demoSideLadders(): SideLadder[] {
  return [
    {
      programName: "Tern",
      buildName: "T1",
      name: "Braid of the mast cable",
      description: "Does it matter how the braid ends? The lead cable was calibrated in between.",
      background: ambientsOf(tern, ["2026-09-08"]),
      steps: sideSteps(tern, [
        {
          name: "Braid on a pigtail",
          description: "As the installer would do it.",
          measuredOn: "2026-09-08",
          treatments: foiled,
        },
        {
          name: "Braid clamped all round",
          description: "To be swept again: the signal path is another one since the calibration.",
          measuredOn: "2026-09-16",
          treatments: [...foiled, connectorShell(6)],
        },
      ]),
    },
    {
      programName: "Gannet",
      buildName: "G3",
      name: "Supply cable, one change at a time",
      description: "What each part on the supply lead buys, three sweeps where it is a close call.",
      background: ambientsOf(gannet, ["2026-11-16", "2026-11-18", "2026-11-20"]),
      steps: sideSteps(gannet, [
        {
          name: "With gasket and ferrites",
          description: "As on record, set up anew three times.",
          measuredOn: "2026-11-16",
          treatments: [...shielded, supplyFerrite()],
          repeats: 3,
        },
        {
          name: "Ferrite 5 cm nearer",
          description: "Costs nothing, so it stays, whatever it does.",
          measuredOn: "2026-11-17",
          treatments: [...shielded, movedSupplyFerrite()],
          repeats: 3,
        },
        {
          name: "Without the ferrite",
          description: "To see what the ferrite buys.",
          measuredOn: "2026-11-17",
          branchOf: "With gasket and ferrites",
          isDropped: true,
          treatments: shielded,
        },
        {
          name: "Choke at the supply entry",
          description: "Common-mode choke on the board, in a rework.",
          measuredOn: "2026-11-18",
          treatments: [...shielded, movedSupplyFerrite(), supplyFilter()],
        },
        {
          name: "Longer supply lead",
          description: "What the installer asked for. Taken back.",
          measuredOn: "2026-11-18",
          isDropped: true,
          treatments: [...shielded, movedSupplyFerrite(), supplyFilter(), longerSupplyLead()],
        },
        {
          name: "Lid screws tightened",
          description: "The receiver was left at 100 kHz from the job before.",
          measuredOn: "2026-11-20",
          accepted: {
            fields: ["rbw"],
            reason:
              "The worst points are single lines of the converter, more than 1 MHz apart: 100 kHz instead of 120 kHz does not move them. Floor and band power of this step are not used.",
          },
          rbwHz: 100e3,
          treatments: [
            housing("Board shield can and gasket, lid tightened", 10),
            connectorShell(4),
            linkFerrite(),
            movedSupplyFerrite(),
            supplyFilter(),
          ],
        },
      ]),
    },
  ];
}
