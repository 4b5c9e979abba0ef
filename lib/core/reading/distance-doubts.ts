import { lineRanges } from "../mask/limit-at";
import type { Mask } from "../mask/mask";
import { firstHz, lastHz } from "../sweep/axis";
import type { MeasurementSettings } from "../sweep/settings";
import type { Trace } from "../sweep/trace";
import { formatFrequency } from "../units/format";
import type { LevelUnit } from "../units/level-units";
import type { HeldTrace } from "./held-trace";
import { isRestated } from "./held-trace";
import type { Doubt } from "./reading";
import { fieldDistances, restatementDb, RESTATEMENT_EDGE_HZ } from "./restate-distance";

/** Lowest and highest frequency in Hz that are both swept and under the mask; null without one. */
function commonSpan(mask: Mask, held: readonly HeldTrace[]) {
  const ranges = mask.lines.flatMap(lineRanges);
  const common = held.flatMap(({ trace: { axis } }) =>
    ranges.map((range) => ({
      fromHz: Math.max(range.startHz, firstHz(axis)),
      toHz: Math.min(range.stopHz, lastHz(axis)),
    })),
  );
  const real = common.filter(({ fromHz, toHz }) => toHz >= fromHz);
  if (real.length === 0) return null;
  return {
    fromHz: Math.min(...real.map((r) => r.fromHz)),
    toHz: Math.max(...real.map((r) => r.toHz)),
  };
}

const signed = (db: number) => `${db < 0 ? "−" : "+"}${Math.abs(db).toFixed(2)} dB`;

/** What a restated sweep has against it: the restating itself, and the near field. */
export function distanceDoubts(
  mask: Mask,
  settings: MeasurementSettings,
  held: readonly HeldTrace[],
): Doubt[] {
  const [fromM, toM] = [settings.distanceM, mask.distanceM];
  if (!isRestated(settings, mask) || fromM === null || toM === null) return [];
  const span = commonSpan(mask, held);
  if (!span) return [];
  const upper = restatementDb(fromM, toM, RESTATEMENT_EDGE_HZ);
  const lower = restatementDb(fromM, toM, span.fromHz);
  const parts = [
    ...(span.fromHz < RESTATEMENT_EDGE_HZ
      ? [`by ${signed(lower)} below 30 MHz (40 dB a decade of distance)`]
      : []),
    ...(span.toHz >= RESTATEMENT_EDGE_HZ
      ? [
          `by ${signed(upper)}${span.fromHz < RESTATEMENT_EDGE_HZ ? " above" : ""} (20 dB a decade of distance)`,
        ]
      : []),
  ];
  const valueDb = span.toHz >= RESTATEMENT_EDGE_HZ ? upper : lower;
  const text = `Levels were restated from ${fromM} m to ${toM} m ${parts.join(" and ")}, on request. Measure at the mask's distance to be sure.`;
  const doubts: Doubt[] = [{ code: "distance-restated", text, valueDb }];
  const { reactiveM, farM } = fieldDistances(span.fromHz);
  if (Math.min(fromM, toM) < farM) {
    const near = `At ${formatFrequency(span.fromHz)}, the lowest frequency here, λ/2π is ${reactiveM.toFixed(2)} m and 3λ is ${farM.toFixed(1)} m: nearer than 3λ the field need not fall as the restating takes it to.`;
    doubts.push({ code: "near-field", text: near, valueDb: null });
  }
  return doubts;
}

/** A field restated from electric to magnetic or back, which holds in a plane wave only. */
export function planeWaveDoubts(traces: readonly Trace[], unit: LevelUnit): Doubt[] {
  if (traces.every((trace) => trace.unit === unit || !trace.unit.match(/\/m$|^dBpT$/))) return [];
  const electric = (of: LevelUnit) => of === "dBuV/m";
  if (traces.every((trace) => electric(trace.unit) === electric(unit))) return [];
  const text =
    "The field was restated between electric and magnetic as in a plane wave (51.5 dB); in the near field the two are not tied like this.";
  return [{ code: "plane-wave-assumed", text, valueDb: null }];
}
