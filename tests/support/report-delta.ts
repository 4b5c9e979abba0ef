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

/** A delta over a mismatch that an engineer accepted, with repeats and moved suspects. */
export function acceptedDelta(): SweepDelta {
  const repeated = (changeDb: number, uncertaintyDb: number) => ({
    changeDb,
    uncertaintyDb,
    repeats: { before: 3, after: 3 },
    isWithinRepeatability: Math.abs(changeDb) <= uncertaintyDb,
  });
  const suspect = (frequencyHz: number, beforeDb: number, afterDb: number) => ({
    detector: "peak" as const,
    frequencyHz,
    window: { startHz: frequencyHz - 240e3, stopHz: frequencyHz + 240e3 },
    beforeDb,
    afterDb,
    beforeAtHz: frequencyHz,
    afterAtHz: frequencyHz,
    ...repeated(afterDb - beforeDb, 1.2),
  });
  const [margin] = sampleDelta().changes?.margins ?? [];
  if (!margin) throw new Error("The sample has no margin.");
  return {
    ...sampleDelta({
      margins: [{ ...margin, beforeDb: 4.2, afterDb: 4.6, ...repeated(0.4, 1.2) }],
      suspects: {
        fresh: [suspect(211.3e6, 21.4, 37.9)],
        gone: [suspect(96.8e6, 41.2, 22.6)],
        followed: [suspect(145.2e6, 44.1, 43.7)],
      },
      repeatability: "Swept 3 times before and 3 times after: ± is half of the 95 % interval.",
    }),
    mismatches: [{ field: "bench", text: "The bench was Boathouse before and Pier after." }],
    accepted: {
      id: "acceptance-1",
      fields: ["bench"],
      reason: "Same antenna and cable, carried over the same day.",
      by: "Ines Tolland",
      at: "2026-11-25T12:20:00.000Z",
    },
  };
}
