import type { SuspectState } from "@/lib/core/reading/suspect-state";
import type { Role } from "@/lib/auth/permissions";

export interface DemoSuspect {
  /** The sweep in whose table it was first marked, and its frequency there. */
  sweepName: string;
  frequencyHz: number;
  /** Key of the mask under which it was seen. */
  maskKey: string;
  source: string;
  owner: Role;
  state: SuspectState;
  /** Why it is in that state. */
  reason: string;
  /** Remarks in their order. */
  notes: { by: Role; text: string }[];
}

const BELOW = "cispr-32-radiated-class-b-3m";
const ABOVE = "cispr-32-above-1ghz-class-b-3m";

/** What the demo follows over the builds of Gannet and of Plover. */
export const DEMO_SUSPECTS: DemoSuspect[] = [
  {
    sweepName: "G1 step 0 Link at rest, 30-1000 MHz",
    frequencyHz: 160e6,
    maskKey: BELOW,
    source: "Serializer word clock, through the lid's seam",
    owner: "engineer",
    state: "treated",
    reason: "Gasket along the lid and the clock spread by 0.5 %: see G3.",
    notes: [
      { by: "engineer", text: "Follows the spread: it is made from the link's clock." },
      { by: "manager", text: "Please keep the gasket in the parts list of the pilot build." },
    ],
  },
  {
    sweepName: "G1 step 0 Link at rest, 30-1000 MHz",
    frequencyHz: 75e6,
    maskKey: BELOW,
    source: "Reference oscillator, third harmonic",
    owner: "engineer",
    state: "explained",
    reason:
      "3 × 25 MHz, 18 ppm high on every build, and it goes away with the oscillator held in reset.",
    notes: [],
  },
  {
    sweepName: "G1 step 0 Link at rest, 1-6 GHz",
    frequencyHz: 1600e6,
    maskKey: ABOVE,
    source: "Link, half the bit rate",
    owner: "engineer",
    state: "open",
    reason: "",
    notes: [
      { by: "engineer", text: "The idle word makes it. Next: what the scrambler leaves of it." },
      { by: "manager", text: "The lab asks for the docking mode to be switchable in the chamber." },
    ],
  },
  {
    sweepName: "P1 step 0 Link at rest, 30-1000 MHz",
    frequencyHz: 46.512e6,
    maskKey: BELOW,
    source: "DC-DC converter, 76th harmonic, on the supply lead",
    owner: "manager",
    state: "open",
    reason: "",
    notes: [{ by: "manager", text: "Decision on the choke's cost before the pilot build." }],
  },
  {
    sweepName: "P1 step 0 Link at rest, 1-6 GHz",
    frequencyHz: 2850e6,
    maskKey: ABOVE,
    source: "Link, beside half the bit rate",
    owner: "engineer",
    state: "accepted",
    reason: "More than 10 dB of room since the die-cast housing; nothing further before the pilot.",
    notes: [],
  },
];
