import { compileLine } from "../mask/compile-line";
import type { Mask } from "../mask/mask";
import { doubtsOf } from "./doubts";
import { holdTraces } from "./held-trace";
import { readLine, useTraces } from "./line-reading";
import type { PreparedParts } from "./prepare-parts";
import { prepareParts } from "./prepare-parts";
import type { Reading, Standing } from "./reading";
import { remeasureLine } from "./remeasure";
import { findSuspects } from "./suspects";
import type { SweepPart } from "./sweep-part";

/** Counts up whenever the same input may read differently. */
export const ENGINE_VERSION = 4;

const SUSPECT_RULES = { prominenceDb: 6, marginDb: 20 };

const WORST_FIRST: readonly Standing[] = ["over", "undecided", "inside-guard", "clear"];

/**
 * Holds sweeps that were prepared before against a mask, as one reading. Per frequency and
 * position (polarization, height, azimuth) the line's own detector decides, else the tightest
 * bound; over the positions the worst counts. Levels and margins in dB, frequencies in Hz; each
 * point names the sweep (`partIndex`) and the trace that gave it.
 */
export function readPrepared(
  { parts, traces }: PreparedParts,
  mask: Mask,
  rules = SUSPECT_RULES,
): Reading {
  const { held, refused } = holdTraces(traces, mask);
  const notComparable = held.length === 0 ? refused : null;
  const empty: Reading = {
    engineVersion: ENGINE_VERSION,
    unit: mask.unit,
    guardDb: Math.max(0, ...parts.map((part) => part.guardDb)),
    standing: "undecided",
    worstLineIndex: null,
    lines: [],
    coverage: { fraction: 0, gaps: [] },
    suspects: [],
    remeasure: [],
    remeasureOmitted: 0,
    doubts: [],
    notComparable,
  };
  if (notComparable !== null || mask.lines.length === 0) return empty;
  const compiled = mask.lines.map(compileLine);
  const read = compiled.map((line, i) => {
    const used = useTraces(line, held);
    const { reading, boundDb } = readLine(line, i, used, held);
    const open = boundDb < 0 ? remeasureLine(line, used) : { points: [], omitted: 0 };
    return { reading, ...open };
  });
  const lines = read.map((r) => r.reading);
  const rank = (standing: Standing) => WORST_FIRST.indexOf(standing);
  const margin = (i: number) => lines[i]?.worst?.marginDb ?? Number.POSITIVE_INFINITY;
  const worst = lines.reduce((best, line, i) => {
    const byStanding = rank(line.standing) - rank(lines[best]?.standing ?? "clear");
    return byStanding < 0 || (byStanding === 0 && margin(i) < margin(best)) ? i : best;
  }, 0);
  const rbwHz = Math.max(0, ...parts.map((part) => part.settings.rbwHz ?? 0));
  return {
    ...empty,
    standing: lines[worst]?.standing ?? "undecided",
    worstLineIndex: worst,
    lines,
    coverage: lines.reduce(
      (low, line) => (line.coverage.fraction < low.fraction ? line.coverage : low),
      lines[0]?.coverage ?? empty.coverage,
    ),
    suspects: findSuspects(held, compiled, rbwHz, rules),
    remeasure: read.flatMap((r) => r.points),
    remeasureOmitted: read.reduce((sum, r) => sum + r.omitted, 0),
    doubts: doubtsOf(mask, parts, held, lines),
  };
}

/** Holds several sweeps against a mask as one reading: see `readPrepared`. */
export function readTogether(parts: readonly SweepPart[], mask: Mask): Reading {
  return readPrepared(prepareParts(parts), mask);
}
