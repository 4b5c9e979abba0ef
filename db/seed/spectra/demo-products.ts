import type { FactorPoint } from "@/lib/core/bench/signal-path";
import type { ClockSource, Coupling, Leak, ProductModel, Treatment } from "./setup";

// Invented values for invented products: they are chosen so that each ladder tells a story that
// could have happened, not measured on anything.

function oscillator(coupling: Coupling, offsetPpm: number, amplitudeV = 3.3): ClockSource {
  return {
    name: "Reference oscillator, 25 MHz",
    fundamentalHz: 25e6,
    offsetPpm,
    amplitudeV,
    duty: 0.47,
    edgeTimeS: 1.2e-9,
    leak: "seam",
    coupling,
    followsSpread: false,
  };
}

function converter(coupling: Coupling, fundamentalHz: number, amplitudeV: number): ClockSource {
  return {
    name: "DC-DC converter",
    fundamentalHz,
    offsetPpm: 0,
    amplitudeV,
    duty: 0.31,
    edgeTimeS: 6e-9,
    leak: "supply-cable",
    coupling,
    followsSpread: false,
  };
}

/** The serializer's parallel clock: one twentieth of the bit rate, from the spread generator. */
function wordClock(coupling: Coupling, bitRateHz: number): ClockSource {
  return {
    name: "Serializer word clock",
    fundamentalHz: bitRateHz / 20,
    offsetPpm: 0,
    amplitudeV: 1.8,
    duty: 0.5,
    edgeTimeS: 0.35e-9,
    leak: "seam",
    coupling: { ...coupling, atOneGhzDb: coupling.atOneGhzDb - 6 },
    followsSpread: true,
  };
}

function seam(atOneGhzDb: number, slotHz: number): Coupling {
  return {
    atOneGhzDb,
    slopeDbPerDecade: 14,
    resonances: [{ hz: slotHz, gainDb: 7, q: 6 }],
    cableHz: 410e6,
    rippleDb: 2.5,
    verticalDb: -1.5,
  };
}

function supplyCable(atOneGhzDb: number, quarterWaveHz: number): Coupling {
  return {
    atOneGhzDb,
    slopeDbPerDecade: -6,
    resonances: [
      { hz: quarterWaveHz, gainDb: 11, q: 3 },
      { hz: 3 * quarterWaveHz, gainDb: 5, q: 4 },
    ],
    cableHz: 75e6,
    rippleDb: 1.5,
    verticalDb: 4,
  };
}

export const GANNET: ProductModel = {
  amplitudeV: 0.6,
  coupling: {
    atOneGhzDb: -43,
    slopeDbPerDecade: 12,
    resonances: [
      { hz: 1.55e9, gainDb: 4, q: 5 },
      { hz: 780e6, gainDb: 4, q: 6 },
      { hz: 4.7e9, gainDb: 5, q: 7 },
    ],
    cableHz: 190e6,
    rippleDb: 2,
    verticalDb: 1,
  },
  clocks: [
    oscillator(seam(-58, 640e6), 18),
    converter(supplyCable(-79, 52e6), 1.117e6, 12),
    wordClock(seam(-58, 640e6), 3.2e9),
  ],
};

export const PLOVER: ProductModel = {
  amplitudeV: 0.5,
  coupling: {
    atOneGhzDb: -44,
    slopeDbPerDecade: 14,
    resonances: [
      { hz: 2.95e9, gainDb: 5, q: 5 },
      { hz: 1.48e9, gainDb: 3, q: 6 },
      { hz: 310e6, gainDb: 5, q: 5 },
    ],
    cableHz: 130e6,
    rippleDb: 2.5,
    verticalDb: 2,
  },
  clocks: [
    oscillator(seam(-57, 510e6), -27),
    converter(supplyCable(-78, 47e6), 0.612e6, 24),
    wordClock(seam(-60, 510e6), 6e9),
  ],
};

/** Plover with its backlight dimmed: the driver works in short bursts, 200 a second. */
export const PLOVER_DIMMED: ProductModel = {
  ...PLOVER,
  clocks: [
    ...PLOVER.clocks,
    {
      ...converter(supplyCable(-70.5, 64e6), 1.35e6, 36),
      name: "Backlight driver",
      burst: { quasiPeakDb: 7.5, averageDb: 24 },
    },
  ],
};

export const TERN: ProductModel = {
  amplitudeV: 0.8,
  coupling: {
    atOneGhzDb: -52,
    slopeDbPerDecade: 6,
    resonances: [
      { hz: 590e6, gainDb: 6, q: 5 },
      { hz: 1.75e9, gainDb: 4, q: 6 },
    ],
    cableHz: 60e6,
    rippleDb: 3,
    verticalDb: 3,
  },
  clocks: [
    oscillator(seam(-52, 720e6), 41),
    converter(supplyCable(-85, 38e6), 1.83e6, 24),
    wordClock(seam(-54, 720e6), 1.2e9),
  ],
};

function over(...points: [mhz: number, db: number][]): FactorPoint[] {
  return points.map(([mhz, db]) => ({ frequencyHz: mhz * 1e6, factorDb: db }));
}

export function linkFerrite(): Treatment {
  return {
    name: "Ferrite core on the link cable",
    leaks: ["link-cable"],
    attenuation: over([30, 2], [100, 5], [300, 7], [800, 5.5], [1500, 3.5], [3000, 2], [6000, 1]),
  };
}

export function supplyFerrite(): Treatment {
  return {
    name: "Ferrite core on the supply cable",
    leaks: ["supply-cable"],
    attenuation: over([30, 7], [80, 10], [200, 11], [500, 7], [1000, 4]),
  };
}

export function connectorShell(shieldDb: number): Treatment {
  return {
    name: "Connector shell bonded all round",
    leaks: ["link-cable"],
    attenuation: over([30, 1], [200, 0.6 * shieldDb], [1000, shieldDb], [6000, shieldDb - 1]),
  };
}

/** A housing with fewer or shorter slots; it leaks again where the slots get long in waves. */
export function housing(name: string, shieldDb: number): Treatment {
  const leaks: Leak[] = ["seam"];
  const attenuation = over([30, shieldDb], [800, shieldDb], [2500, shieldDb - 3], [6000, 2]);
  return { name, leaks, attenuation };
}

export function supplyFilter(): Treatment {
  return {
    name: "Common-mode choke at the supply entry",
    leaks: ["supply-cable"],
    attenuation: over([30, 7], [100, 7], [300, 5], [1000, 2]),
  };
}

/** The core moved 5 cm nearer to the housing: nothing that a sweep could tell. */
export function movedSupplyFerrite(): Treatment {
  const core = supplyFerrite();
  const attenuation = core.attenuation.map(({ frequencyHz, factorDb }) => ({
    frequencyHz,
    factorDb: factorDb + 0.1,
  }));
  return { ...core, name: "Ferrite core on the supply cable, 5 cm nearer", attenuation };
}

/** A longer lead is a longer antenna. */
export function longerSupplyLead(): Treatment {
  return {
    name: "Supply lead 40 cm longer",
    leaks: ["supply-cable"],
    attenuation: over([30, -4], [60, -3], [120, -1], [230, 0]),
  };
}
