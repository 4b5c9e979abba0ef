import type { SweepDelta } from "@/lib/core/delta/delta";

const once = (changeDb: number) => ({
  changeDb,
  uncertaintyDb: null,
  repeats: { before: 1, after: 1 },
  isWithinRepeatability: null,
});

export function sampleDelta(change: Partial<NonNullable<SweepDelta["changes"]>> = {}): SweepDelta {
  return {
    beforeName: "Gannet B3, plain, vertical",
    afterName: "Gannet B3, scrambler on, vertical",
    mismatches: [],
    accepted: null,
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
          ...once(9.6),
          note: null,
          bands: [],
        },
      ],
      peakDb: -9.6,
      floorDb: 12.04,
      bandPowerDb: 0.1,
      bandPowerIsPower: false,
      levels: [
        {
          detector: "peak",
          peak: once(-9.6),
          floor: once(12.04),
          bandPower: once(0.1),
          bandPowerIsPower: false,
        },
      ],
      suspects: { followed: [], fresh: [], gone: [] },
      repeatability: "Swept once before and once after, so no repeatability is known.",
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
  accepted: null,
  doubts: [],
  changes: null,
};

/** A report with two sweeps and a ladder of three steps, the last of them not comparable. */
