import { connectorShell, housing, linkFerrite, PLOVER, supplyFilter } from "./demo-products";
import { linkAtRest, scrambled, SITE_SEED, spreadBy, type StoryLadder } from "./demo-story";

const atRest = linkAtRest(6e9, 40, 55e-12, "Shielded twisted pair, 5 m");
// 3000 bits at 6 Gb/s: lines 2 MHz apart.
const scrambling = scrambled(atRest, 3000);
const coded = { ...scrambling, coding: "128b130b" as const };
/** The link as it is from the die-cast build's third step on. */
export const PLOVER_SLOW = { ...coded, ...spreadBy(0.25), edgeTimeS: 75e-12 };
const common = { programName: "Plover" as const, product: PLOVER };

export const PLOVER_STORY: StoryLadder[] = [
  {
    ...common,
    buildName: "P1",
    name: "Evaluation boards",
    description: "How far the link's settings carry in a sheet-metal box.",
    ambient: { siteSeed: SITE_SEED, gainDb: 0 },
    steps: [
      {
        name: "Link at rest",
        description: "Idle word of 40 bits, no scrambler.",
        measuredOn: "2026-06-15",
        link: atRest,
        treatments: [],
      },
      {
        name: "Scrambler on",
        description: "16-bit additive scrambler, restarted every 3000 bits.",
        measuredOn: "2026-06-16",
        link: scrambling,
        treatments: [],
      },
      {
        name: "128b/130b coding",
        description: "Block coding with short sync headers.",
        measuredOn: "2026-06-22",
        link: coded,
        treatments: [],
      },
      {
        name: "Clock spread 0.5 % down",
        description: "Triangular, 31.5 kHz, from the evaluation clock board.",
        measuredOn: "2026-06-25",
        link: { ...coded, ...spreadBy(0.5) },
        treatments: [],
      },
    ],
  },
  {
    ...common,
    buildName: "P2",
    name: "Die-cast housing",
    description: "The housing is there; the spread clock is an option and costs link budget.",
    ambient: { siteSeed: SITE_SEED, gainDb: 0.3 },
    steps: [
      {
        name: "As built",
        description: "Die-cast housing, coding on, clock not spread.",
        measuredOn: "2026-10-19",
        link: coded,
        treatments: [housing("Die-cast housing", 8)],
      },
      {
        name: "Clock spread 0.25 % down",
        description: "What the display's receiver is specified for.",
        measuredOn: "2026-10-20",
        link: { ...coded, ...spreadBy(0.25) },
        treatments: [housing("Die-cast housing", 8)],
      },
      {
        name: "Slower edges",
        description: "Driver set from 55 ps to 75 ps.",
        measuredOn: "2026-10-22",
        link: PLOVER_SLOW,
        treatments: [housing("Die-cast housing", 8)],
      },
      {
        name: "Ferrite on the link cable",
        description: "One core at the display end.",
        measuredOn: "2026-11-03",
        link: PLOVER_SLOW,
        treatments: [housing("Die-cast housing", 8), linkFerrite()],
      },
      {
        name: "Connector shell and supply choke",
        description: "Shell bonded all round; common-mode choke at the supply entry.",
        measuredOn: "2026-11-10",
        link: PLOVER_SLOW,
        treatments: [
          housing("Die-cast housing", 8),
          linkFerrite(),
          connectorShell(3),
          supplyFilter(),
        ],
      },
    ],
  },
];
