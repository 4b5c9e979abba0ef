import type { Role } from "@/lib/auth/permissions";

interface DemoBuild {
  name: string;
  builtOn: string;
  notes: string;
  clocks: { name: string; frequencyHz: number; tolerancePpm: number | null }[];
}

interface DemoProgram {
  name: string;
  description: string;
  targetMarginDb: number;
  /** Keys of shipped masks. */
  masks: string[];
  /** Those of them to whose distance levels are restated. */
  restated?: string[];
  milestones: { name: string; dueOn: string; requiredMarginDb: number | null }[];
  builds: DemoBuild[];
}

export interface DemoTeam {
  name: string;
  domain: string;
  people: { name: string; role: Role }[];
  programs: DemoProgram[];
}

const RADIATED = ["cispr-32-radiated-class-b-3m", "cispr-32-above-1ghz-class-b-3m"];

const gannetClocks = [
  { name: "Link bit rate", frequencyHz: 3.2e9, tolerancePpm: 50 },
  { name: "Reference oscillator", frequencyHz: 25e6, tolerancePpm: 50 },
  { name: "Supply converter", frequencyHz: 2.1e6, tolerancePpm: 100_000 },
];
const ploverClocks = [
  { name: "Link bit rate", frequencyHz: 6e9, tolerancePpm: 50 },
  { name: "Reference oscillator", frequencyHz: 25e6, tolerancePpm: 50 },
];
const ternClocks = [{ name: "Reference oscillator", frequencyHz: 25e6, tolerancePpm: 100 }];

/** The invented teams of the demo. The second one is there to see that teams see nothing of each other. */
export const DEMO_TEAMS: DemoTeam[] = [
  {
    name: "Saltmarsh Optics",
    domain: "saltmarsh.example",
    people: [
      { name: "Isla Marram", role: "admin" },
      { name: "Tomas Reedbed", role: "engineer" },
      { name: "Ines Tideway", role: "manager" },
      { name: "Owen Shingle", role: "liaison" },
    ],
    programs: [
      {
        name: "Gannet",
        description: "Docking camera head on a 3.2 Gb/s coax link",
        targetMarginDb: 6,
        masks: RADIATED,
        milestones: [
          { name: "Design freeze", dueOn: "2026-11-02", requiredMarginDb: 3 },
          { name: "Chamber days at the lab", dueOn: "2027-01-18", requiredMarginDb: 6 },
        ],
        builds: [
          {
            name: "G1",
            builtOn: "2026-05-11",
            notes: "First boards, link at rest pattern",
            clocks: gannetClocks,
          },
          {
            name: "G2",
            builtOn: "2026-07-20",
            notes: "Scrambler on in the link firmware",
            clocks: gannetClocks,
          },
          {
            name: "G3",
            builtOn: "2026-09-28",
            notes: "New connector shell and cable clamp",
            clocks: gannetClocks,
          },
        ],
      },
      {
        name: "Plover",
        description: "Wheelhouse display on a 6 Gb/s twisted-pair link",
        targetMarginDb: 4,
        // At 10 m and not restated: the demo shows that Neap says so instead of comparing.
        masks: [...RADIATED, "cispr-11-group-1-class-b-10m"],
        milestones: [
          { name: "Pilot build", dueOn: "2026-12-14", requiredMarginDb: 3 },
          { name: "Chamber days at the lab", dueOn: "2027-03-08", requiredMarginDb: 4 },
        ],
        builds: [
          {
            name: "P1",
            builtOn: "2026-06-08",
            notes: "Evaluation boards in a sheet-metal box",
            clocks: ploverClocks,
          },
          {
            name: "P2",
            builtOn: "2026-10-12",
            notes: "Die-cast housing, spread clock option",
            clocks: ploverClocks,
          },
          {
            name: "P3",
            builtOn: "2026-11-23",
            notes: "Pilot sample: choke and ferrite on the supply lead, backlight dimmed",
            clocks: [
              ...ploverClocks,
              { name: "Backlight driver", frequencyHz: 1.35e6, tolerancePpm: 100_000 },
            ],
          },
        ],
      },
      {
        name: "Tern",
        description: "Sonar repeater with a link along the mast",
        targetMarginDb: 3,
        masks: [...RADIATED, "iec-60945-radiated-3m", "cispr-11-group-1-class-b-10m"],
        restated: ["cispr-11-group-1-class-b-10m"],
        milestones: [{ name: "Second sample", dueOn: "2027-02-01", requiredMarginDb: null }],
        builds: [
          {
            name: "T1",
            builtOn: "2026-08-17",
            notes: "Bench sample without housing",
            clocks: ternClocks,
          },
        ],
      },
    ],
  },
  {
    name: "Fenwick Instruments",
    domain: "fenwick.example",
    people: [{ name: "Maud Carr", role: "admin" }],
    programs: [
      {
        name: "Sluice",
        description: "Gate level recorder",
        targetMarginDb: 5,
        masks: [],
        milestones: [],
        builds: [{ name: "S1", builtOn: "2026-09-01", notes: "", clocks: [] }],
      },
    ],
  },
];
