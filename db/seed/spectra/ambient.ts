import { deriveSeed, drawNormal, makeRandom } from "./random";
import type { AmbientSite } from "./setup";

/** A service on air: `widthHz` wide, its level in dBµV/m at the antenna. */
export interface AmbientEmitter {
  kind: "carrier" | "block";
  centreHz: number;
  widthHz: number;
  /** Carrier: its level. Block: noise-like power in the whole width. */
  levelDb: number;
  /** Share of the time on air; matters to an average detector. */
  duty: number;
}

/** Bands of the usual services (from memory); who is on air in them is invented. */
const BANDS = [
  {
    kind: "carrier",
    startHz: 88e6,
    stopHz: 108e6,
    rasterHz: 100e3,
    widthHz: 130e3,
    count: 11,
    levelDb: 22,
    spreadDb: 5,
    duty: 1,
  },
  {
    kind: "block",
    startHz: 175e6,
    stopHz: 229e6,
    rasterHz: 1.712e6,
    widthHz: 1.536e6,
    count: 3,
    levelDb: 27,
    spreadDb: 3,
    duty: 1,
  },
  {
    kind: "carrier",
    startHz: 380e6,
    stopHz: 400e6,
    rasterHz: 25e3,
    widthHz: 20e3,
    count: 4,
    levelDb: 23,
    spreadDb: 3,
    duty: 0.4,
  },
  {
    kind: "block",
    startHz: 494e6,
    stopHz: 670e6,
    rasterHz: 8e6,
    widthHz: 7.6e6,
    count: 3,
    levelDb: 30,
    spreadDb: 3,
    duty: 1,
  },
  {
    kind: "block",
    startHz: 763e6,
    stopHz: 803e6,
    rasterHz: 10e6,
    widthHz: 9e6,
    count: 3,
    levelDb: 35,
    spreadDb: 3,
    duty: 0.6,
  },
  {
    kind: "block",
    startHz: 930e6,
    stopHz: 955e6,
    rasterHz: 5e6,
    widthHz: 4.5e6,
    count: 3,
    levelDb: 35,
    spreadDb: 3,
    duty: 0.7,
  },
  {
    kind: "block",
    startHz: 1815e6,
    stopHz: 1875e6,
    rasterHz: 20e6,
    widthHz: 18e6,
    count: 3,
    levelDb: 38,
    spreadDb: 3,
    duty: 0.5,
  },
  {
    kind: "block",
    startHz: 2115e6,
    stopHz: 2165e6,
    rasterHz: 15e6,
    widthHz: 13.5e6,
    count: 2,
    levelDb: 37,
    spreadDb: 3,
    duty: 0.5,
  },
  {
    kind: "block",
    startHz: 2412e6,
    stopHz: 2472e6,
    rasterHz: 25e6,
    widthHz: 18e6,
    count: 2,
    levelDb: 43,
    spreadDb: 3,
    duty: 0.06,
  },
  {
    kind: "block",
    startHz: 3430e6,
    stopHz: 3670e6,
    rasterHz: 80e6,
    widthHz: 76e6,
    count: 1,
    levelDb: 42,
    spreadDb: 2,
    duty: 0.3,
  },
  {
    kind: "block",
    startHz: 5180e6,
    stopHz: 5320e6,
    rasterHz: 40e6,
    widthHz: 36e6,
    count: 1,
    levelDb: 44,
    spreadDb: 3,
    duty: 0.06,
  },
] as const;

/** Who is on air at a site, and how strongly on the day of one sweep (fading of about 1 dB). */
export function ambientEmitters(site: AmbientSite, sweepSeed: number): AmbientEmitter[] {
  const onSite = makeRandom(deriveSeed(site.siteSeed, "on air"));
  const today = makeRandom(deriveSeed(sweepSeed, "fading"));
  return BANDS.flatMap((band) => {
    const channels = Math.floor((band.stopHz - band.startHz) / band.rasterHz) + 1;
    const taken = new Set<number>();
    while (taken.size < Math.min(band.count, channels)) taken.add(Math.floor(onSite() * channels));
    return [...taken].map((channel) => ({
      kind: band.kind,
      centreHz: band.startHz + channel * band.rasterHz,
      widthHz: band.widthHz,
      levelDb: band.levelDb + site.gainDb + band.spreadDb * (2 * onSite() - 1) + drawNormal(today),
      duty: band.duty,
    }));
  });
}
