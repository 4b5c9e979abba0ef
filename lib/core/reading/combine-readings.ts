import { lineRanges } from "../mask/limit-at";
import type { Mask, MaskLine } from "../mask/mask";
import type { Polarization } from "../sweep/settings";
import { commonRanges, coveredShare, mergeRanges, spansBands } from "./coverage";
import type { FrequencyRange, LineReading, MarginPoint, Reading, Standing } from "./reading";

/** A reading of one sweep; the polarization counts for radiated sweeps only. */
export interface HeldAlone extends Pick<Reading, "lines" | "guardDb"> {
  polarization?: Polarization | null;
  /** First and last frequency in Hz of its scans; left out: it scanned every line. */
  scans?: readonly { firstHz: number; lastHz: number }[];
}

/** Where several sweeps together stand under one line of a mask. Hz and dB. */
export interface CombinedLine {
  name: string;
  standing: Standing;
  worst: MarginPoint | null;
  /** Index of the reading that gave the worst margin. */
  source: number | null;
  /** Share of the line (log frequency, 0…1) that was covered in every polarization swept. */
  coverage: number;
}

export interface CombinedReading {
  standing: Standing;
  lines: CombinedLine[];
  /** The line that the whole is known by; null when none has a margin. */
  deciding: (CombinedLine & { worst: MarginPoint; source: number }) | null;
  /** Lowest coverage over the lines. */
  coverage: number;
}

const WORST_FIRST: readonly Standing[] = ["over", "undecided", "inside-guard", "clear"];

/** What none of the sweeps of one polarization covered, or of those that state none. */
function gapsOf(
  line: MaskLine,
  held: readonly (LineReading | undefined)[],
  readings: readonly HeldAlone[],
): FrequencyRange[] {
  const gapsWhere = (isOwn: (polarization: Polarization | null) => boolean) =>
    commonRanges(
      held
        .filter((_, i) => isOwn(readings[i]?.polarization ?? null))
        .map((reading) => reading?.coverage.gaps ?? lineRanges(line)),
    );
  const ranges = lineRanges(line);
  const meant = readings.filter(
    ({ scans }) =>
      !scans || scans.some(({ firstHz, lastHz }) => spansBands(ranges, firstHz, lastHz)),
  );
  const stated = [...new Set(meant.flatMap(({ polarization }) => polarization ?? []))];
  if (stated.length === 0) return gapsWhere(() => true);
  return mergeRanges(stated.flatMap((p) => gapsWhere((own) => own === null || own === p)));
}

function combineLine(
  line: MaskLine,
  held: readonly (LineReading | undefined)[],
  readings: readonly HeldAlone[],
): CombinedLine {
  const coverage = coveredShare(lineRanges(line), gapsOf(line, held, readings));
  let source: number | null = null;
  let worst: MarginPoint | null = null;
  const isOver = held.some((reading) => reading?.standing === "over");
  held.forEach((reading, i) => {
    // A line that is over is known by what made it so, not by another sweep's lower bound.
    if (isOver && reading?.standing !== "over") return;
    if (reading?.worst && (!worst || reading.worst.marginDb < worst.marginDb)) {
      worst = reading.worst;
      source = i;
    }
  });
  return { name: line.name, standing: "undecided", worst, source, coverage };
}

function standingOf(
  line: CombinedLine,
  held: readonly (LineReading | undefined)[],
  readings: readonly HeldAlone[],
): Standing {
  if (held.some((reading) => reading?.standing === "over")) return "over";
  // Below zero and not over: an upper bound, which only the line's own detector can settle.
  if (!line.worst || line.worst.marginDb < 0 || line.coverage < 1) return "undecided";
  const isInside = held.some(
    (reading, i) => reading?.worst && reading.worst.marginDb < (readings[i]?.guardDb ?? 0),
  );
  return isInside ? "inside-guard" : "clear";
}

/**
 * Readings of several sweeps against the same mask revision taken together, without their levels:
 * over when one of them is, undecided while a bound of one of them lies over the line or a part was
 * not covered in a polarization that was swept, and otherwise inside guard as soon as one of them
 * lies inside the guard of its own bench. Right as long as no sweep silences a bound of another:
 * `mustReadTogether` says when the levels have to be looked at instead.
 */
export function combineReadings(mask: Mask, readings: readonly HeldAlone[]): CombinedReading {
  const lines = mask.lines.map((line, i) => {
    const held = readings.map((reading) => reading.lines[i]);
    const combined = combineLine(line, held, readings);
    return { ...combined, standing: standingOf(combined, held, readings) };
  });
  const over = lines.filter((line) => line.standing === "over");
  let deciding: CombinedReading["deciding"] = null;
  // The lowest of the lines that are over or, when none is, of all: as for a single reading.
  for (const line of over.length > 0 ? over : lines) {
    const { worst, source } = line;
    if (!worst || source === null) continue;
    if (!deciding || worst.marginDb < deciding.worst.marginDb)
      deciding = { ...line, worst, source };
  }
  const standing = WORST_FIRST.find((s) => lines.some((line) => line.standing === s));
  return {
    standing: standing ?? "undecided",
    lines,
    deciding,
    coverage: Math.min(1, ...lines.map((line) => line.coverage)),
  };
}

/** A sweep that covers less of a mask than this only touches its edge. */
const TOUCH = 0.01;

/**
 * Whether a sweep says something about a mask: not when it merely touches its edge, as one that
 * ends at 1 GHz touches a mask that begins there, unless it is over at that very point.
 */
export function reachesMask(reading: Pick<Reading, "lines">): boolean {
  return reading.lines.some(
    ({ worst, standing, coverage }) =>
      worst !== null &&
      // Spots decide though they cover nothing.
      (coverage.fraction === 0 || coverage.fraction >= TOUCH || standing === "over"),
  );
}
