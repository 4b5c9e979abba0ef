import { DEMO_BENCHES, type DemoBench } from "./demo-benches";
import { GANNET_CODED } from "./demo-gannet";
import { PLOVER_SLOW } from "./demo-plover";
import {
  connectorShell,
  GANNET,
  housing,
  linkFerrite,
  PLOVER,
  PLOVER_DIMMED,
  supplyFerrite,
  supplyFilter,
} from "./demo-products";
import { SITE_SEED, spreadBy } from "./demo-story";
import { planSweep, type DemoSweep, type SweepPlan } from "./demo-sweep";
import { coarseSpan } from "./demo-sweeps";
import type { AmbientSite, ProductModel } from "./setup";

/** A sweep of a build that belongs to no ladder. */
export interface DemoSingle {
  sweep: DemoSweep;
  notes: string;
  onRecord: boolean;
  /**
   * Taken as single-frequency readings: of the points that another sweep leaves undecided, those
   * that were measured before the day was over.
   */
  spotsOf?: { sweepName: string; measured: number };
}

function benchOf(key: DemoBench["key"]): DemoBench {
  const bench = DEMO_BENCHES.find((candidate) => candidate.key === key);
  if (!bench) throw new Error(`The demo has no bench ${key}.`);
  return bench;
}
const below = benchOf("below-1-ghz");
const above = benchOf("above-1-ghz");

const g3 = { programName: "Gannet", buildName: "G3" } as const;
const p2 = { programName: "Plover", buildName: "P2" } as const;
const p3 = { programName: "Plover", buildName: "P3" } as const;
const site = (gainDb: number): AmbientSite => ({ siteSeed: SITE_SEED, gainDb });
const gannetLink = { ...GANNET_CODED, ...spreadBy(0.5) };

const finalGannet: SweepPlan["what"] = {
  product: GANNET,
  link: gannetLink,
  treatments: [
    housing("Board shield can and gasket", 9),
    connectorShell(4),
    linkFerrite(),
    supplyFerrite(),
  ],
  ambient: site(-0.5),
};

const dieCast = (product: ProductModel): SweepPlan["what"] => ({
  product,
  link: PLOVER_SLOW,
  treatments: [
    housing("Die-cast housing", 8),
    linkFerrite(),
    connectorShell(3),
    supplyFilter(),
    supplyFerrite(),
  ],
  ambient: site(0.3),
});

const quiet = (gainDb: number): SweepPlan["what"] => ({
  product: null,
  link: null,
  treatments: [],
  ambient: site(gainDb),
});

function single(
  bench: DemoBench,
  plan: SweepPlan,
  rest: Partial<Omit<DemoSingle, "sweep">> = {},
): DemoSingle {
  return { sweep: planSweep(bench, plan), notes: "", onRecord: false, ...rest };
}

/** Sweeps outside the ladders, in the order of their days. */
export function demoSingles(): DemoSingle[] {
  const ambient = (
    bench: DemoBench,
    build: typeof g3 | typeof p2 | typeof p3,
    day: string,
    detectors: SweepPlan["detectors"],
    polarization?: "horizontal",
  ) =>
    single(bench, {
      ...build,
      label: polarization ? `ambient ${day}, horizontal` : `ambient ${day}`,
      measuredOn: day,
      detectors,
      what: quiet(0),
      span: coarseSpan(bench),
      ...(polarization ? { polarization } : {}),
    });
  const dimmed = single(
    below,
    {
      ...p3,
      label: "pilot sample, backlight dimmed",
      measuredOn: "2026-11-25",
      detectors: ["peak"],
      what: dieCast(PLOVER_DIMMED),
    },
    {
      onRecord: true,
      notes: "Peak only. What lies over the line is measured again with the quasi-peak detector.",
    },
  );
  return [
    ambient(below, g3, "2026-10-21", ["peak", "quasi-peak"], "horizontal"),
    single(
      below,
      {
        ...g3,
        label: "as on record, horizontal",
        measuredOn: "2026-10-21",
        detectors: ["peak", "quasi-peak"],
        polarization: "horizontal",
        what: finalGannet,
      },
      { onRecord: true, notes: "The other polarization of the last step." },
    ),
    single(
      below,
      {
        ...p2,
        label: "quick look at the choke",
        measuredOn: "2026-11-02",
        detectors: ["peak", "quasi-peak"],
        span: { startHz: 30e6, stopHz: 230e6, points: 4_001 },
        looseDb: 3.4,
        what: { ...dieCast(PLOVER), treatments: [housing("Die-cast housing", 8), supplyFilter()] },
      },
      {
        notes:
          "Too good to be true: the connector at the mast was loose that day, as the bench check shows. Not on record.",
      },
    ),
    ambient(below, p3, "2026-11-25", ["peak", "quasi-peak"]),
    dimmed,
    single(
      below,
      {
        ...p3,
        label: "pilot sample, quasi-peak readings",
        measuredOn: "2026-11-26",
        detectors: ["quasi-peak"],
        what: dieCast(PLOVER_DIMMED),
      },
      {
        onRecord: true,
        notes: "2 s on each frequency, same position. The rest is for tomorrow.",
        spotsOf: { sweepName: dimmed.sweep.name, measured: 4 },
      },
    ),
    single(
      above,
      {
        ...p3,
        label: "pilot sample",
        measuredOn: "2026-11-30",
        detectors: ["peak", "average"],
        what: dieCast(PLOVER_DIMMED),
      },
      { onRecord: true, notes: "The 3 m cable is due for calibration since Saturday." },
    ),
  ];
}
