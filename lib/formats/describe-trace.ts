import { firstHz, frequencyAt, lastHz, pointCount } from "@/lib/core/sweep/axis";
import type { Trace } from "@/lib/core/sweep/trace";
import type { TracePreview } from "./sweep-file";

/** What a preview says of a trace, taken from the very trace that would be stored. */
export function describeTrace(
  trace: Trace,
  index: number,
  column: number,
  isUnitOpen: boolean,
): TracePreview {
  const { axis, levelsDb } = trace;
  let top = -1;
  for (let i = 0; i < levelsDb.length; i += 1)
    if (top < 0 || !((levelsDb[i] ?? NaN) <= (levelsDb[top] ?? NaN)))
      if (!Number.isNaN(levelsDb[i])) top = i;
  return {
    index,
    column,
    name: trace.name,
    kind: trace.kind,
    detector: trace.detector,
    hold: trace.hold,
    unit: isUnitOpen ? null : trace.unit,
    points: pointCount(axis),
    firstHz: firstHz(axis),
    lastHz: lastHz(axis),
    stepHz: axis.kind === "regular" ? axis.stepHz : null,
    firstLevel: levelsDb[0] ?? NaN,
    lastLevel: levelsDb[levelsDb.length - 1] ?? NaN,
    maxLevel: levelsDb[top] ?? NaN,
    maxAtHz: frequencyAt(axis, top),
  };
}
