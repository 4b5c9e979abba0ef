import type { Role } from "@/lib/auth/permissions";

interface DemoBuild {
  name: string;
  builtOn: string;
  notes: string;
}

export interface DemoTeam {
  name: string;
  domain: string;
  people: { name: string; role: Role }[];
  programs: { name: string; description: string; targetMarginDb: number; builds: DemoBuild[] }[];
}

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
        builds: [
          { name: "G1", builtOn: "2026-05-11", notes: "First boards, link at rest pattern" },
          { name: "G2", builtOn: "2026-07-20", notes: "Scrambler on in the link firmware" },
          { name: "G3", builtOn: "2026-09-28", notes: "New connector shell and cable clamp" },
        ],
      },
      {
        name: "Plover",
        description: "Wheelhouse display on a 6 Gb/s twisted-pair link",
        targetMarginDb: 4,
        builds: [
          { name: "P1", builtOn: "2026-06-08", notes: "Evaluation boards in a sheet-metal box" },
          { name: "P2", builtOn: "2026-10-12", notes: "Die-cast housing, spread clock option" },
        ],
      },
      {
        name: "Tern",
        description: "Sonar repeater with a link along the mast",
        targetMarginDb: 3,
        builds: [{ name: "T1", builtOn: "2026-08-17", notes: "Bench sample without housing" }],
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
        builds: [{ name: "S1", builtOn: "2026-09-01", notes: "" }],
      },
    ],
  },
];
