import type { EquipmentKind } from "@/lib/core/bench/equipment";
import type { FactorPoint, Transducer } from "@/lib/core/bench/signal-path";
import {
  BICONICAL_LOG_ANTENNA,
  HORN_ANTENNA,
  INPUT_ATTENUATOR,
  LONG_CABLE,
  PREAMPLIFIER,
  RECALIBRATED_LONG_CABLE,
  SHORT_CABLE,
} from "../spectra/transducers";

export interface DemoCalibration {
  calibratedOn: string;
  dueOn: string;
  certificateNumber: string;
  /** null: an instrument has none. */
  factors: FactorPoint[] | null;
}

export interface DemoPiece {
  name: string;
  kind: EquipmentKind;
  inventoryNumber: string;
  notes: string;
  calibrations: DemoCalibration[];
}

export const RECEIVER = "Measuring receiver, 9 kHz–7 GHz";
export const ANALYZER = "Signal analyzer, 10 Hz–8 GHz";

/** Insertion loss of the artificial network; invented values. */
const NETWORK_FACTORS: FactorPoint[] = [
  [9e3, 0.32],
  [50e3, 0.14],
  [150e3, 0.09],
  [1e6, 0.07],
  [10e6, 0.11],
  [30e6, 0.18],
].map(([hz, db]) => ({ frequencyHz: hz ?? 0, factorDb: db ?? 0 }));

/** A transducer as the piece that it is, with every calibration that its paths went through. */
function pieceOf(
  inventoryNumber: string,
  notes: string,
  ...calibrated: [Transducer, ...Transducer[]]
): DemoPiece {
  const [{ name, kind }] = calibrated;
  const calibrations = calibrated.map(({ calibratedOn, dueOn, factors }, i) => {
    if (calibratedOn === null || dueOn === null) throw new Error(`${name} states no calibration.`);
    return { calibratedOn, dueOn, factors, certificateNumber: `${inventoryNumber}-C${i + 1}` };
  });
  return { name, kind, inventoryNumber, notes, calibrations };
}

/** What stands in the boat hall. Invented, like its calibrations. */
export const DEMO_EQUIPMENT: DemoPiece[] = [
  {
    name: RECEIVER,
    kind: "instrument",
    inventoryNumber: "SO-001",
    notes: "Weighting detectors to 1 GHz; at the 3 m semi-open bench.",
    calibrations: [
      {
        calibratedOn: "2025-12-18",
        dueOn: "2026-12-18",
        certificateNumber: "SO-001-C1",
        factors: null,
      },
    ],
  },
  {
    name: ANALYZER,
    kind: "instrument",
    inventoryNumber: "SO-002",
    notes: "At the horn bench.",
    calibrations: [
      {
        calibratedOn: "2026-04-20",
        dueOn: "2027-04-20",
        certificateNumber: "SO-002-C1",
        factors: null,
      },
    ],
  },
  pieceOf("SO-010", "Element tips taped after the fall in January.", BICONICAL_LOG_ANTENNA),
  pieceOf("SO-011", "", HORN_ANTENNA),
  pieceOf(
    "SO-020",
    "New connector at the mast end on 2026-09-08; calibrated again after it.",
    LONG_CABLE,
    RECALIBRATED_LONG_CABLE,
  ),
  pieceOf("SO-021", "", SHORT_CABLE),
  pieceOf("SO-030", "Runs warm: on for half an hour before a sweep.", PREAMPLIFIER),
  pieceOf(
    "SO-040",
    "To tell an overload from a signal; not in a path by default.",
    INPUT_ATTENUATOR,
  ),
  {
    name: "Artificial network (LISN), 50 µH, single-phase",
    kind: "lisn",
    inventoryNumber: "SO-050",
    notes: "For the mains bench that is being set up.",
    calibrations: [
      {
        calibratedOn: "2026-05-06",
        dueOn: "2027-05-06",
        certificateNumber: "SO-050-C1",
        factors: NETWORK_FACTORS,
      },
    ],
  },
];
