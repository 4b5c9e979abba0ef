import { connectorShell, GANNET, housing, linkFerrite, supplyFerrite } from "./demo-products";
import { linkAtRest, scrambled, SITE_SEED, spreadBy, type StoryLadder } from "./demo-story";

const atRest = linkAtRest(3.2e9, 32, 90e-12, "Coax, 1.5 m");
// 1600 bits at 3.2 Gb/s repeat every 0.5 µs: lines 2 MHz apart.
const scrambling = scrambled(atRest, 1600);
export const GANNET_CODED = { ...scrambling, coding: "8b10b" as const };
const common = { programName: "Gannet" as const, product: GANNET };

export const GANNET_STORY: StoryLadder[] = [
  {
    ...common,
    buildName: "G1",
    name: "Quieting the link",
    description: "What the link's own settings buy, before any metal is changed.",
    ambient: { siteSeed: SITE_SEED, gainDb: 0 },
    steps: [
      {
        name: "Link at rest",
        description: "First boards as delivered: idle word of 32 bits, no scrambler.",
        measuredOn: "2026-05-18",
        link: atRest,
        treatments: [],
      },
      {
        name: "Scrambler on",
        description: "16-bit additive scrambler, restarted every 1600 bits.",
        measuredOn: "2026-05-20",
        link: scrambling,
        treatments: [],
      },
      {
        name: "8b/10b coding",
        description: "Sync words shortened; coding on the payload.",
        measuredOn: "2026-05-27",
        link: GANNET_CODED,
        treatments: [],
      },
      {
        name: "Clock spread 0.5 % down",
        description: "Triangular, 31.5 kHz.",
        measuredOn: "2026-05-29",
        link: { ...GANNET_CODED, ...spreadBy(0.5) },
        treatments: [],
      },
    ],
  },
  {
    ...common,
    buildName: "G2",
    name: "From firmware to cables",
    description:
      "The scrambler is in the firmware now and the cable has a clamp; the supply lead is next.",
    ambient: { siteSeed: SITE_SEED, gainDb: 0.5 },
    steps: [
      {
        name: "As built",
        description: "Scrambler on, coding off.",
        measuredOn: "2026-07-27",
        link: scrambling,
        treatments: [housing("Board shield can", 3), connectorShell(1.5)],
      },
      {
        name: "8b/10b coding",
        description: "Sync words shortened; coding on the payload.",
        measuredOn: "2026-07-28",
        link: GANNET_CODED,
        treatments: [housing("Board shield can", 3), connectorShell(1.5)],
      },
      {
        name: "Clock spread 0.5 % down",
        description: "Triangular, 31.5 kHz.",
        measuredOn: "2026-07-30",
        link: { ...GANNET_CODED, ...spreadBy(0.5) },
        treatments: [housing("Board shield can", 3), connectorShell(1.5)],
      },
      {
        name: "Ferrite on the supply cable",
        description: "Split core, two turns, 4 cm from the housing.",
        measuredOn: "2026-08-04",
        link: { ...GANNET_CODED, ...spreadBy(0.5) },
        treatments: [housing("Board shield can", 3), connectorShell(1.5), supplyFerrite()],
      },
    ],
  },
  {
    ...common,
    buildName: "G3",
    name: "New connector shell",
    description: "Shell bonded all round and a clamp on the cable's braid.",
    ambient: { siteSeed: SITE_SEED, gainDb: -0.5 },
    steps: [
      {
        name: "As built",
        description: "New shell, scrambler and coding on, clock not spread.",
        measuredOn: "2026-10-05",
        link: GANNET_CODED,
        treatments: [housing("Board shield can", 3), connectorShell(4)],
      },
      {
        name: "Clock spread 0.25 % down",
        description: "Half the depth, to see what the deserializer tolerates.",
        measuredOn: "2026-10-06",
        link: { ...GANNET_CODED, ...spreadBy(0.25) },
        treatments: [housing("Board shield can", 3), connectorShell(4)],
      },
      {
        name: "Clock spread 0.5 % down",
        description: "Triangular, 31.5 kHz; no link errors overnight.",
        measuredOn: "2026-10-08",
        link: { ...GANNET_CODED, ...spreadBy(0.5) },
        treatments: [housing("Board shield can", 3), connectorShell(4)],
      },
      {
        name: "Ferrites on both cables",
        description: "One core each on link and supply cable.",
        measuredOn: "2026-10-13",
        link: { ...GANNET_CODED, ...spreadBy(0.5) },
        treatments: [
          housing("Board shield can", 3),
          connectorShell(4),
          linkFerrite(),
          supplyFerrite(),
        ],
      },
      {
        name: "Gasket in the housing seam",
        description: "Conductive gasket along the lid.",
        measuredOn: "2026-10-20",
        link: { ...GANNET_CODED, ...spreadBy(0.5) },
        treatments: [
          housing("Board shield can and gasket", 9),
          connectorShell(4),
          linkFerrite(),
          supplyFerrite(),
        ],
      },
    ],
  },
];
