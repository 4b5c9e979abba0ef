import type { SweepDelta } from "@/lib/core/delta/delta";

export function sampleDelta(change: Partial<NonNullable<SweepDelta["changes"]>> = {}): SweepDelta {
  return {
    beforeName: "Gannet B3, plain, vertical",
    afterName: "Gannet B3, scrambler on, vertical",
    mismatches: [],
    doubts: ["VBW is not stated for either sweep."],
    changes: {
      detector: "peak",
      margins: [
        {
          maskRevisionId: "revision-2",
          maskTitle: "CISPR 32 class B, 3 m",
          lineName: "Quasi-peak",
          beforeDb: -5.4,
          afterDb: 4.2,
          beforeStanding: "undecided",
          afterStanding: "clear",
          changeDb: 9.6,
          note: null,
        },
      ],
      peakDb: -9.6,
      floorDb: 12.04,
      bandPowerDb: 0.1,
      bandPowerIsPower: false,
      sentence:
        "Peaks came down 9.6 dB, the floor came up 12.0 dB, band power moved 0.1 dB: the energy was spread, not removed.",
      ...change,
    },
  };
}

export const REFUSED: SweepDelta = {
  beforeName: "Gannet B3, scrambler on, vertical",
  afterName: "Gannet B3, clamp, vertical",
  mismatches: [{ field: "rbw", text: "The RBW was 120.0 kHz before and 1.000 MHz after." }],
  doubts: [],
  changes: null,
};

/** A report with two sweeps and a ladder of three steps, the last of them not comparable. */
