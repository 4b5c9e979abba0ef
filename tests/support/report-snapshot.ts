import type { Mask } from "@/lib/core/mask/mask";
import { readSweep } from "@/lib/core/reading/read-sweep";
import type { MeasurementSettings } from "@/lib/core/sweep/settings";
import type { Trace } from "@/lib/core/sweep/trace";
import { REFUSED, sampleDelta } from "./report-delta";
import { inventedTrace, RBW_HZ, shippedMask, snapshotTrace } from "./report-traces";
import { hashSnapshot } from "@/lib/reports/snapshot-hash";
import { combineByMask } from "@/lib/reports/combine-by-mask";
import type { ReportContent, SnapshotStep, SnapshotSweep } from "@/lib/reports/report-content";
import type { ReportSnapshot, ReportState } from "@/lib/reports/report-snapshot";

const SETTINGS: MeasurementSettings = {
  rbwHz: RBW_HZ,
  rbwKind: "6dB",
  vbwHz: null,
  sweepTimeS: 0.4,
  attenuationDb: 10,
  preamplifier: true,
  referenceLevelDb: null,
  polarization: "vertical",
  heightM: 1.2,
  azimuthDeg: null,
  distanceM: 3,
  port: "radiated",
};

interface SweepChoices {
  id?: string;
  name?: string;
  traces?: Trace[];
  masks?: { mask: Mask; revision: number }[];
  guardDb?: number;
  budget?: SnapshotSweep["bench"]["budget"];
}

/** One product sweep of the invented team's bench, read by the real rules. */
export function sampleSweep(choices: SweepChoices = {}): SnapshotSweep {
  const {
    id = "sweep-1",
    name = "Gannet B3, scrambler on, vertical",
    guardDb = 4,
    budget = null,
  } = choices;
  const traces = choices.traces ?? [inventedTrace("Trace 1", 41)];
  const masks = choices.masks ?? [
    { mask: shippedMask("cispr-32-radiated-class-b-3m"), revision: 2 },
  ];
  return {
    sweepId: id,
    name,
    fileName: `${name.toLowerCase().replaceAll(/[^a-z0-9]+/g, "_")}_scan_with_a_name_as_long_as_benches_make_them_0007.csv`,
    fileSha256: (id === "sweep-1" ? "a7" : "5c").repeat(32),
    purpose: "product",
    onRecord: true,
    ambientSweeps: [],
    floorSweeps: ["Boathouse, input closed"],
    measuredOn: "2026-11-24",
    importedBy: "Maren Holt",
    importedAt: "2026-11-24T15:02:10.000Z",
    corrected: false,
    settings: SETTINGS,
    link: {
      bitRateHz: 3.2e9,
      payload: "prbs23",
      patternBits: null,
      scrambler: "additive",
      scramblerPolynomial: null,
      scramblerRestartBits: null,
      coding: "8b10b",
      spread: { depthPercent: 0.5, direction: "down", modulationHz: 31.5e3, profile: "triangular" },
      spreadOff: null,
      edgeTimeS: null,
      cable: "coax, 7 m, two ferrites",
    },
    bench: {
      name: "Boathouse bench",
      site: "semi-anechoic corner, pier 2",
      instrument: "analyzer, 9 kHz to 3 GHz",
      calibration: {
        name: "Analyzer of the pier",
        calibratedOn: "2026-01-20",
        dueOn: "2027-01-20",
      },
      distanceM: 3,
      guardDb,
      budget,
      signalPathRevision: 5,
      impedanceOhm: 50,
      transducers: [
        {
          name: "Broadband antenna, 30 MHz to 1 GHz",
          kind: "antenna",
          calibratedOn: "2025-03-02",
          dueOn: "2026-09-02",
        },
        {
          name: "Coax run to the bench",
          kind: "cable",
          calibratedOn: "2026-05-11",
          dueOn: "2027-05-11",
        },
        { name: "Preamplifier 20 dB", kind: "preamplifier", calibratedOn: null, dueOn: null },
      ],
    },
    traces: traces.map((trace) => snapshotTrace(trace)),
    readings: masks.map(({ mask, revision }) => ({
      maskRevisionId: `${mask.key} ${revision}`,
      maskRevision: revision,
      mask,
      confirmation: null,
      ambient: [],
      followed: [],
      reading: readSweep({
        traces,
        settings: SETTINGS,
        mask,
        guardDb,
        impedanceOhm: 50,
        context: {
          ambientTaken: false,
          calibration: {
            overdue: ["Broadband antenna, 30 MHz to 1 GHz"],
            unstated: [],
            isDateKnown: true,
            isCorrected: false,
          },
        },
      }),
    })),
  };
}

const step = (position: number, name: string): SnapshotStep => ({
  position,
  name,
  description: "",
  state: "kept",
  base: position === 0 ? null : { position: position - 1, name: "As built" },
  isBranch: false,
  isOnLine: true,
  onRecord: false,
  worst: null,
  sweeps: [],
  unpaired: [],
  againstPrevious: [],
  againstStart: [],
});

function sampleLadder(): ReportContent["ladder"] {
  const spread = sampleDelta();
  return {
    name: "Link mitigations",
    steps: [
      {
        ...step(0, "As built"),
        description: "Alternating payload, no scrambling.",
        sweeps: ["Gannet B3, plain, vertical"],
      },
      {
        ...step(1, "Scrambler on"),
        description: "Additive scrambler of the link switched on.",
        sweeps: ["Gannet B3, scrambler on, vertical"],
        againstPrevious: [spread],
        againstStart: [spread],
      },
      {
        ...step(2, "Clamp at the bulkhead"),
        base: { position: 1, name: "Scrambler on" },
        state: "dropped",
        isOnLine: false,
        sweeps: ["Gannet B3, clamp, vertical"],
        againstPrevious: [REFUSED],
        againstStart: [REFUSED],
      },
    ],
  };
}

/** A report with two sweeps and a ladder of three steps, the last of them not comparable. */
export function sampleSnapshot(change: Partial<ReportContent> = {}): ReportContent {
  const sweeps = change.sweeps ?? [
    sampleSweep(),
    sampleSweep({
      id: "sweep-2",
      name: "Gannet B3, scrambler on, horizontal, cable routed along the gunwale",
      traces: [
        inventedTrace("Trace 1", 37),
        { ...inventedTrace("Trace 2", 31), detector: "quasi-peak" },
      ],
      masks: [
        { mask: shippedMask("cispr-32-radiated-class-b-3m"), revision: 2 },
        { mask: shippedMask("iec-60945-radiated-3m"), revision: 1 },
      ],
    }),
  ];
  return {
    version: 2,
    number: "SO-2026-0007",
    title: "Gannet B3: what scrambling and spreading bought before the chamber",
    summary:
      "The docking camera head reads close under the class B mask with the scrambler on. What is left are harmonics of the reference clock on the cable screen; the next step is a clamp at the bulkhead.",
    paper: "a4",
    team: "Saltmarsh Optics",
    program: {
      name: "Gannet",
      description: "Docking camera head on a coax link.",
      targetMarginDb: 6,
    },
    build: { name: "B3, second cable screen", builtOn: "2026-11-12", notes: "" },
    issuedAt: "2026-11-27T09:30:00.000Z",
    issuedBy: "Maren Holt",
    replaces: "SO-2026-0004",
    sweeps,
    ...combineByMask(sweeps),
    ladder: sampleLadder(),
    ...change,
  };
}

export function issuedState(
  snapshot: ReportSnapshot,
  change: Partial<ReportState> = {},
): ReportState {
  return {
    state: "issued",
    sha256: hashSnapshot(snapshot),
    approvedBy: null,
    approvedAt: null,
    withdrawnBy: null,
    withdrawnAt: null,
    withdrawnReason: null,
    ...change,
  };
}
