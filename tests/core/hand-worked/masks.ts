import { maskLine, maskOf, segment } from "./case";

/** 30 to 32 MHz of 47 CFR 15.109(a), class B at 3 m: 100 µV/m = 40.0 dBµV/m, quasi-peak. */
export const LOW_BAND = maskOf([maskLine("quasi-peak", [segment(30e6, 32e6, 40)])]);

/** The same piece as if it were an average limit. */
export const LOW_BAND_AVERAGE = maskOf([maskLine("average", [segment(30e6, 32e6, 40)])]);

/** 1 MHz to either side of a frequency where the limit changes. */
export function maskAround(borderHz: number, belowDb: number, aboveDb: number) {
  const below = segment(borderHz - 1e6, borderHz, belowDb);
  return maskOf([maskLine("quasi-peak", [below, segment(borderHz, borderHz + 1e6, aboveDb)])]);
}

/** CISPR 25 class 5 at 1 m, the lowest two bands, peak; from memory. */
export const TWO_BANDS = maskOf(
  [
    maskLine("peak", [segment(0.15e6, 0.3e6, 46), segment(0.53e6, 1.8e6, 40)], {
      rbwHz: 9e3,
    }),
  ],
  { distanceM: 1 },
);

/** 47 CFR 15.107(a), class B: quasi-peak 66→56, 56, 60 and average 56→46, 46, 50 dBµV. */
export const MAINS_B = maskOf(
  [
    maskLine(
      "quasi-peak",
      [segment(0.15e6, 0.5e6, 66, 56), segment(0.5e6, 5e6, 56), segment(5e6, 30e6, 60)],
      { rbwHz: 9e3 },
    ),
    maskLine(
      "average",
      [segment(0.15e6, 0.5e6, 56, 46), segment(0.5e6, 5e6, 46), segment(5e6, 30e6, 50)],
      { rbwHz: 9e3 },
    ),
  ],
  { port: "mains", unit: "dBuV", distanceM: null },
);

/** MIL-STD-461G CE102, 28 V: 94 dBµV at 10 kHz falling to 60 at 500 kHz, then 60; from memory. */
export const CE102 = maskOf(
  [
    maskLine("peak", [segment(10e3, 500e3, 94, 60), segment(500e3, 10e6, 60)], {
      rbwHz: null,
      rbwKind: null,
    }),
  ],
  { port: "mains", unit: "dBuV", distanceM: null, provenance: "from memory" },
);
