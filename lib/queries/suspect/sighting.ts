import type { Mask } from "@/lib/core/mask/mask";
import type { Basis, LineReading, Standing } from "@/lib/core/reading/reading";
import type { BandwidthKind, Detector, Polarization } from "@/lib/core/sweep/settings";
import type { LevelUnit } from "@/lib/core/units/level-units";

/** A followed suspect as one reading shows it; levels in the reading's unit, dB. */
export interface Sighting {
  sweepId: string;
  sweepName: string;
  measuredOn: string | null;
  maskId: string;
  maskTitle: string;
  lineName: string | null;
  /** Of the suspect in its reading. */
  number: number;
  frequencyHz: number;
  levelDb: number;
  unit: LevelUnit;
  marginDb: number | null;
  standing: Standing | null;
  basis: Basis;
  detector: Detector | null;
  rbwHz: number | null;
  rbwKind: BandwidthKind | null;
  benchId: string;
  benchName: string;
  signalPathRevisionId: string;
  distanceM: number | null;
  polarization: Polarization | null;
  heightM: number | null;
}

/** What a build says of a followed suspect. */
export interface BuildSighting {
  buildId: string;
  buildName: string;
  builtOn: string | null;
  /** not-seen: swept, but no peak stood out there. not-swept: nothing on record tells. */
  kind: "seen" | "not-seen" | "not-swept";
  /** Lowest margin of what counts; null unless seen. */
  best: Sighting | null;
  /** Every sighting that counts, the lowest margin first. */
  sightings: Sighting[];
  /** Sweeps on record that cover the frequency under a mask. */
  sweptBy: { sweepId: string; sweepName: string }[];
}

const isSamePosition = (a: Sighting, b: Sighting) =>
  a.maskId === b.maskId &&
  a.lineName === b.lineName &&
  a.polarization === b.polarization &&
  a.heightM === b.heightM &&
  a.distanceM === b.distanceM &&
  a.benchId === b.benchId;

/**
 * What counts of a build's sightings, the lowest margin first. An upper bound gives way where the
 * line's own detector saw the same suspect in the same position.
 */
export function rankSightings(sightings: readonly Sighting[]): Sighting[] {
  const last = (marginDb: number | null) => marginDb ?? Number.POSITIVE_INFINITY;
  return sightings
    .filter(
      (one) =>
        one.basis !== "upper-bound" ||
        !sightings.some((other) => other.basis === "like-for-like" && isSamePosition(one, other)),
    )
    .sort(
      (a, b) =>
        (last(a.marginDb) === last(b.marginDb) ? 0 : last(a.marginDb) - last(b.marginDb)) ||
        b.levelDb - a.levelDb ||
        (a.sweepId < b.sweepId ? -1 : 1),
    );
}

/** Whether a reading covers a frequency: a line of its mask lies there and it is in no gap. */
export function coversFrequency(
  mask: Mask,
  lines: readonly Pick<LineReading, "lineIndex" | "coverage">[],
  frequencyHz: number,
): boolean {
  return lines.some(({ lineIndex, coverage }) => {
    const segments = mask.lines[lineIndex]?.segments ?? [];
    const lies = (range: { startHz: number; stopHz: number }) =>
      frequencyHz >= range.startHz && frequencyHz <= range.stopHz;
    return coverage.fraction > 0 && segments.some(lies) && !coverage.gaps.some(lies);
  });
}
