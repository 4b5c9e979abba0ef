import { DETECTOR_LABELS } from "@/lib/core/sweep/settings";
import type { BuildSighting, Sighting } from "./sighting";

/** How a suspect moved from the build that saw it first to the newest one that sees it. */
export interface SuspectChange {
  fromBuild: string;
  toBuild: string;
  /** Positive is better; null when the two may not be compared. */
  marginDb: number | null;
  levelDb: number | null;
  /** Why the two may not be compared; empty when they may. */
  reasons: string[];
  /** What differs without forbidding the comparison. */
  cautions: string[];
}

const stated = (value: number | string | null) => value ?? "not stated";

const bandwidthOf = ({ rbwHz, rbwKind }: Sighting) =>
  `${rbwHz === null ? "not stated" : `${rbwHz / 1e3} kHz`}${rbwKind === null ? "" : ` (${rbwKind})`}`;

/** What keeps two sightings from being subtracted, each as "name: before, then after". */
export function differencesOf(before: Sighting, after: Sighting): string[] {
  const detectorOf = ({ detector }: Sighting) =>
    detector === null ? "not stated" : DETECTOR_LABELS[detector];
  const pairs: [string, string | number, string | number][] = [
    ["mask", before.maskTitle, after.maskTitle],
    ["mask line", stated(before.lineName), stated(after.lineName)],
    ["detector", detectorOf(before), detectorOf(after)],
    ["unit", before.unit, after.unit],
    ["RBW", bandwidthOf(before), bandwidthOf(after)],
    ["distance in m", stated(before.distanceM), stated(after.distanceM)],
  ];
  const told = pairs
    .filter(([, was, is]) => was !== is)
    .map(([name, was, is]) => `${name}: ${was}, then ${is}`);
  return before.benchId === after.benchId
    ? told
    : [...told, `bench: ${before.benchName}, then ${after.benchName}`];
}

function cautionsOf(before: Sighting, after: Sighting): string[] {
  const cautions: string[] = [];
  if (before.rbwHz === null && after.rbwHz === null) cautions.push("The RBW is not stated.");
  if (before.signalPathRevisionId !== after.signalPathRevisionId) {
    cautions.push("The signal path was revised in between.");
  }
  if (before.polarization !== after.polarization) {
    const [was, is] = [stated(before.polarization), stated(after.polarization)];
    cautions.push(`Polarization ${was}, then ${is}.`);
  }
  if (before.heightM !== after.heightM) {
    const tell = ({ heightM }: Sighting) => (heightM === null ? "not stated" : `${heightM} m`);
    cautions.push(`Antenna height ${tell(before)}, then ${tell(after)}.`);
  }
  return cautions;
}

/**
 * The newest build's worst sighting against the same thing in the first build that saw the
 * suspect. null while fewer than two builds saw it. Never a number across another mask line,
 * detector, unit, RBW, distance or bench.
 */
export function changeSinceFirst(builds: readonly BuildSighting[]): SuspectChange | null {
  const seen = builds.filter((build) => build.kind === "seen");
  const first = seen[0];
  const newest = seen.at(-1);
  const after = newest?.best;
  if (!first?.best || !newest || !after || first === newest) return null;
  const like = first.sightings.filter((one) => differencesOf(one, after).length === 0);
  const before = like.find((one) => cautionsOf(one, after).length === 0) ?? like[0];
  const named = { fromBuild: first.buildName, toBuild: newest.buildName };
  if (!before) {
    const reasons = differencesOf(first.best, after);
    return { ...named, marginDb: null, levelDb: null, reasons, cautions: [] };
  }
  return {
    ...named,
    marginDb:
      after.marginDb === null || before.marginDb === null ? null : after.marginDb - before.marginDb,
    levelDb: after.levelDb - before.levelDb,
    reasons: [],
    cautions: cautionsOf(before, after),
  };
}
