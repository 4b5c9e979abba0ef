import { housing, supplyFerrite, TERN } from "./demo-products";
import { linkAtRest, scrambled, SITE_SEED, spreadBy, type StoryLadder } from "./demo-story";

const atRest = linkAtRest(1.2e9, 24, 180e-12, "Mast cable, 12 m");
// 600 bits at 1.2 Gb/s: lines 2 MHz apart.
const scrambling = scrambled(atRest, 600);
export const TERN_SPREAD = { ...scrambling, ...spreadBy(0.5) };

export const TERN_STORY: StoryLadder[] = [
  {
    programName: "Tern",
    buildName: "T1",
    name: "Bench sample",
    description: "Bare boards on the bench; the absorber door had to stay open for the mast cable.",
    product: TERN,
    // The door was open: what is on air comes in some 6 dB stronger.
    ambient: { siteSeed: SITE_SEED, gainDb: 6 },
    steps: [
      {
        name: "Link at rest",
        description: "Idle word of 24 bits, no scrambler.",
        measuredOn: "2026-08-24",
        link: atRest,
        treatments: [],
      },
      {
        name: "Scrambler on",
        description: "16-bit additive scrambler, restarted every 600 bits.",
        measuredOn: "2026-08-25",
        link: scrambling,
        treatments: [],
      },
      {
        name: "Clock spread 0.5 % down",
        description: "Triangular, 31.5 kHz.",
        measuredOn: "2026-08-27",
        link: TERN_SPREAD,
        treatments: [],
      },
      {
        name: "Foil around the boards, ferrite on the supply",
        description: "Copper foil for a try; one core on the supply cable.",
        measuredOn: "2026-09-02",
        link: TERN_SPREAD,
        treatments: [housing("Copper foil", 5), supplyFerrite()],
      },
    ],
  },
];
