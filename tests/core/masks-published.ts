/**
 * The published tables of every shipped mask, written down a second time by hand and apart from
 * the files; the mark says whether the values were read in a public source or are from memory. One row per detector and RBW: bands in MHz, levels in the unit of the head, "66>56"
 * falling in log f. RBW and their 6 dB kind are those of CISPR 16-1-1, from memory.
 */
export interface PublishedTable {
  /** document | clause | port | distance | unit | provenance */
  head: string;
  source: string;
  rows: string[];
}

const MAINS_A = [
  "quasi-peak 9 kHz | 0.15-0.5: 79 | 0.5-30: 73",
  "average 9 kHz | 0.15-0.5: 66 | 0.5-30: 60",
];
const MAINS_B = [
  "quasi-peak 9 kHz | 0.15-0.5: 66>56 | 0.5-5: 56 | 5-30: 60",
  "average 9 kHz | 0.15-0.5: 56>46 | 0.5-5: 46 | 5-30: 50",
];
const CISPR_32 = "CISPR 32 / EN 55032 | Annex A";

/** Class 5 limits (peak, quasi-peak, average) and the step from one class to the next. */
const CISPR_25_TO_30_MHZ: [string, number, number, number, number][] = [
  ["0.15-0.3", 46, 33, 26, 10],
  ["0.53-1.8", 40, 27, 20, 8],
  ["5.9-6.2", 40, 27, 20, 6],
  ["26-28", 40, 27, 20, 6],
];
const CISPR_25_ABOVE_30_MHZ: [string, number, number, number, number][] = [
  ["30-54", 40, 27, 20, 6],
  ["68-87", 35, 22, 15, 6],
  ["76-108", 38, 25, 18, 6],
  ["142-175", 35, 22, 15, 6],
  ["380-512", 38, 25, 18, 6],
  ["820-960", 44, 31, 24, 6],
];

function cispr25(emissionClass: number): PublishedTable {
  const row = (name: string, rbwKhz: number, column: 1 | 2 | 3, bands: typeof CISPR_25_TO_30_MHZ) =>
    [
      `${name} ${rbwKhz} kHz`,
      ...bands.map((band) => `${band[0]}: ${band[column] + (5 - emissionClass) * band[4]}`),
    ].join(" | ");
  return {
    head: "CISPR 25 | not stated | radiated | 1 m | dBuV/m | from memory",
    source: "CISPR 25 third/fourth edition, component, from memory",
    rows: (["peak", "quasi-peak", "average"] as const).flatMap((name, i) => {
      const column = (i + 1) as 1 | 2 | 3;
      return [
        row(name, 9, column, CISPR_25_TO_30_MHZ),
        row(name, 120, column, CISPR_25_ABOVE_30_MHZ),
      ];
    }),
  };
}

/** 24 or 44 dBµV/m to 100 MHz, then 20 dB per decade to 18 GHz. */
function re102(db: number): PublishedTable {
  const at18Ghz = db + 20 * Math.log10(180);
  return {
    head: "MIL-STD-461 | RE102 | radiated | 1 m | dBuV/m | from memory",
    source: "MIL-STD-461G RE102 ground and its bandwidths, from memory",
    rows: [
      `peak 10 kHz | 2-30: ${db}`,
      `peak 100 kHz | 30-100: ${db} | 100-1000: ${db}>${db + 20}`,
      `peak 1000 kHz | 1000-18000: ${db + 20}>${at18Ghz}`,
    ],
  };
}

/** 62 − 25.13 log10(f/30) to 75 MHz, 52 + 15.13 log10(f/75) to 400 MHz, 63 above. */
function r10(detector: string, lowerDb: number): PublishedTable {
  const at75Mhz = 62 - 25.13 * Math.log10(75 / 30) - lowerDb;
  const at400Mhz = 52 + 15.13 * Math.log10(400 / 75) - lowerDb;
  return {
    head: "UNECE R10 | not stated | radiated | 1 m | dBuV/m | from memory",
    source: "UNECE R10 component, from memory",
    rows: [
      `${detector} 120 kHz | 30-75: ${62 - lowerDb}>${at75Mhz} | 75-400: ${52 - lowerDb}>${at400Mhz} | 400-1000: ${63 - lowerDb}`,
    ],
  };
}

function radiated32(distance: string, low: number, high: number): PublishedTable {
  return {
    head: `${CISPR_32} | radiated | ${distance} | dBuV/m | read`,
    source: "CISPR 32, read",
    rows: [`quasi-peak 120 kHz | 30-230: ${low} | 230-1000: ${high}`],
  };
}

function group1(letter: string, low: number, high: number): PublishedTable {
  return {
    head: "CISPR 11 | not stated | radiated | 10 m | dBuV/m | from memory",
    source: `CISPR 11 group 1 class ${letter}, as CISPR 32 at 10 m, from memory`,
    rows: [`quasi-peak 120 kHz | 30-230: ${low} | 230-1000: ${high}`],
  };
}

export const PUBLISHED_TABLES: Record<string, PublishedTable> = {
  "fcc-15-109-class-b-3m": {
    head: "47 CFR part 15 | 15.109(a) | radiated | 3 m | dBuV/m | read",
    source: "47 CFR 15.109(a), detectors 15.35, 40 GHz at most by 15.33(b), read",
    rows: [
      "quasi-peak 120 kHz | 30-88: 40.0 | 88-216: 43.5 | 216-960: 46.0 | 960-1000: 54.0",
      "average 1000 kHz | 1000-40000: 54.0",
      "peak 1000 kHz | 1000-40000: 74.0",
    ],
  },
  "fcc-15-109-class-a-10m": {
    head: "47 CFR part 15 | 15.109(b) | radiated | 10 m | dBuV/m | read",
    source: "47 CFR 15.109(b), detectors 15.35, 40 GHz at most by 15.33(b), read",
    rows: [
      "quasi-peak 120 kHz | 30-88: 39.1 | 88-216: 43.5 | 216-960: 46.4 | 960-1000: 49.5",
      "average 1000 kHz | 1000-40000: 49.5",
      "peak 1000 kHz | 1000-40000: 69.5",
    ],
  },
  "fcc-15-107-class-a": {
    head: "47 CFR part 15 | 15.107(b) | mains | none | dBuV | read",
    source: "47 CFR 15.107(b), read",
    rows: MAINS_A,
  },
  "fcc-15-107-class-b": {
    head: "47 CFR part 15 | 15.107(a) | mains | none | dBuV | read",
    source: "47 CFR 15.107(a), read",
    rows: MAINS_B,
  },
  "fcc-15-209-300m": {
    // The limit is read; which bands are average is not, so the mask stays from memory.
    head: "47 CFR part 15 | 15.209(a), (d) | radiated | 300 m | dBuV/m | from memory",
    source: "47 CFR 15.209(a): 2400/F(kHz) µV/m, read; 15.209(d) detectors from memory",
    rows: [
      `average 0.2 kHz | 0.009-0.09: ${20 * Math.log10(2400 / 9)}>${20 * Math.log10(2400 / 90)} | 0.11-0.15: ${20 * Math.log10(2400 / 110)}>${20 * Math.log10(2400 / 150)}`,
      `average 9 kHz | 0.15-0.49: ${20 * Math.log10(2400 / 150)}>${20 * Math.log10(2400 / 490)}`,
      `quasi-peak 0.2 kHz | 0.09-0.11: ${20 * Math.log10(2400 / 90)}>${20 * Math.log10(2400 / 110)}`,
    ],
  },
  "fcc-15-209-30m": {
    // The limits are read; the detector below 30 MHz is not, so the mask stays from memory.
    head: "47 CFR part 15 | 15.209(a) | radiated | 30 m | dBuV/m | from memory",
    source: "47 CFR 15.209(a): 24000/F(kHz) µV/m, then 30 µV/m, read; detector from memory",
    rows: [
      `quasi-peak 9 kHz | 0.49-1.705: ${20 * Math.log10(24000 / 490)}>${20 * Math.log10(24000 / 1705)} | 1.705-30: ${20 * Math.log10(30)}`,
    ],
  },
  "cispr-32-radiated-class-b-10m": radiated32("10 m", 30, 37),
  "cispr-32-radiated-class-a-10m": radiated32("10 m", 40, 47),
  "cispr-32-radiated-class-b-3m": radiated32("3 m", 40, 47),
  "cispr-32-radiated-class-a-3m": radiated32("3 m", 50, 57),
  "cispr-32-above-1ghz-class-b-3m": {
    head: `${CISPR_32} | radiated | 3 m | dBuV/m | read`,
    source: "CISPR 32 class B above 1 GHz, read",
    rows: [
      "average 1000 kHz | 1000-3000: 50 | 3000-6000: 54",
      "peak 1000 kHz | 1000-3000: 70 | 3000-6000: 74",
    ],
  },
  "cispr-32-above-1ghz-class-a-3m": {
    head: `${CISPR_32} | radiated | 3 m | dBuV/m | from memory`,
    source: "CISPR 32 class A above 1 GHz, from memory",
    rows: [
      "average 1000 kHz | 1000-3000: 56 | 3000-6000: 60",
      "peak 1000 kHz | 1000-3000: 76 | 3000-6000: 80",
    ],
  },
  "cispr-32-mains-class-a": {
    head: `${CISPR_32} | mains | none | dBuV | read`,
    source: "CISPR 32 class A mains, read",
    rows: MAINS_A,
  },
  "cispr-32-mains-class-b": {
    head: `${CISPR_32} | mains | none | dBuV | read`,
    source: "CISPR 32 class B mains, read",
    rows: MAINS_B,
  },
  "cispr-11-group-1-class-a-10m": group1("A", 40, 47),
  "cispr-11-group-1-class-b-10m": group1("B", 30, 37),
  "cispr-25-component-class-1": cispr25(1),
  "cispr-25-component-class-2": cispr25(2),
  "cispr-25-component-class-3": cispr25(3),
  "cispr-25-component-class-4": cispr25(4),
  "cispr-25-component-class-5": cispr25(5),
  "unece-r10-component-broadband": r10("quasi-peak", 0),
  "unece-r10-component-narrowband": r10("average", 10),
  "mil-std-461g-ce102-28v": {
    head: "MIL-STD-461 | CE102 | mains | none | dBuV | from memory",
    source: "MIL-STD-461G CE102 28 V (94 at 10 kHz to 60 at 500 kHz) and its RBW, from memory",
    rows: [
      `peak 1 kHz | 0.01-0.15: 94>${94 - (34 * Math.log10(15)) / Math.log10(50)}`,
      `peak 10 kHz | 0.15-0.5: ${94 - (34 * Math.log10(15)) / Math.log10(50)}>60 | 0.5-10: 60`,
    ],
  },
  "mil-std-461g-re102-ground-24": re102(24),
  "mil-std-461g-re102-ground-44": re102(44),
  "iec-60945-radiated-3m": {
    head: "IEC 60945 | not stated | radiated | 3 m | dBuV/m | from memory",
    source: "IEC 60945, 9 kHz in the band 156 to 165 MHz, from memory",
    rows: [
      "quasi-peak 9 kHz | 0.15-0.3: 80>52 | 0.3-30: 52>34 | 156-165: 24",
      "quasi-peak 120 kHz | 30-2000: 54",
    ],
  },
};
