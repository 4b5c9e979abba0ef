import { reachesMask } from "@/lib/core/reading/combine-readings";
import { decidingPoint } from "@/lib/core/reading/deciding-point";
import { formatFrequency } from "@/lib/core/units/format";
import type { SweepDetail } from "@/lib/queries/sweep/load-sweep-detail";

/** Where the sweep lies: program, build and, where it has one, its ladder. */
export function trailOf(sweep: SweepDetail) {
  const build = `/programs/${sweep.programId}/builds/${sweep.buildId}`;
  return [
    { href: `/programs/${sweep.programId}`, label: sweep.programName },
    { href: build, label: sweep.buildName },
    ...(sweep.ladderId
      ? [
          {
            href: `/ladders/${sweep.ladderId}`,
            label: `${sweep.ladderName}, step ${sweep.stepPosition}`,
          },
        ]
      : []),
  ];
}

/** Bench, day and record in one line. */
export function leadOf(sweep: SweepDetail): string {
  const when = sweep.measuredOn ? `measured on ${sweep.measuredOn}` : "date not stated";
  const record = sweep.onRecord ? "on the line of record" : "not on the line of record";
  return [sweep.benchName, when, ...(sweep.purpose === "product" ? [record] : [])].join(" · ");
}

/** Where the worst margin of a reading lies, in words. */
export function headline({ reading, mask }: SweepDetail["readings"][number]): string {
  const deciding = decidingPoint(reading);
  if (!deciding) return `No part of ${mask.title} was swept with a detector that can decide.`;
  if (!reachesMask(reading)) return `The sweep only touches the edge of ${mask.title}.`;
  const { line, point } = deciding;
  const where = `${line.name} line of ${mask.title} at ${formatFrequency(point.frequencyHz)}`;
  const worst = reading.worstLineIndex === null ? null : reading.lines[reading.worstLineIndex];
  if (!worst?.explanation) return `${where}.`;
  return worst === line
    ? `${where}. ${worst.explanation}`
    : `${where}. ${worst.name} line: ${worst.explanation}`;
}

/** The sweep's own traces and, beside them, the ambient and the floor of its bench. */
export function shownTraces(sweep: SweepDetail) {
  const own = sweep.traces.map((trace) => ({
    sweepId: sweep.id,
    position: trace.position,
    name: trace.name,
    role: trace.position === 0 ? ("main" as const) : ("outline" as const),
    detector: trace.detector,
    hold: trace.hold,
  }));
  const beside = (label: string, others: readonly { id: string; name: string }[]) =>
    others
      .filter((other) => other.id !== sweep.id)
      .slice(0, 1)
      .map((other) => ({
        sweepId: other.id,
        position: 0,
        name: `${label}: ${other.name}`,
        role: "ambient" as const,
        detector: null,
        hold: "none" as const,
      }));
  // A floor taken with another bandwidth stands higher or lower by itself.
  const floor = sweep.floor.filter(({ sameRbw }) => sameRbw);
  return [...own, ...beside("Ambient", sweep.ambient), ...beside("Floor", floor)];
}

/** Whole span of the sweep's traces in Hz. */
export function extentOf(sweep: SweepDetail) {
  return {
    fromHz: Math.min(...sweep.traces.map((trace) => trace.firstHz)),
    toHz: Math.max(...sweep.traces.map((trace) => trace.lastHz)),
  };
}
