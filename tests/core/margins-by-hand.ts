import type { MaskLine, MaskSegment } from "../../lib/core/mask/mask";
import type { ReadSweepInput } from "../../lib/core/reading/read-sweep";
import type { Trace } from "../../lib/core/sweep/trace";

/** The worst margin of one line; `isOver` is what the line's own detector says. */
export interface MarginByHand {
  marginDb: number;
  frequencyHz: number;
  basis: "like-for-like" | "upper-bound";
  isOver: boolean;
}

interface Sample {
  hz: number;
  db: number;
}

/** Loose to tight, CISPR 16-1-1: PK ≥ QP ≥ RMS-AV ≥ AV. */
const ORDER = ["peak", "quasi-peak", "rms-average", "average"];

/** What 0 dB of a unit is in dBµV or dBµV/m. */
function offsetOf(unit: string, ohm: number): number {
  if (unit === "dBm") return 20 * Math.log10(Math.sqrt(1e-3 * ohm) * 1e6);
  if (unit === "dBmV") return 60;
  if (unit === "dBuA/m") return 20 * Math.log10(376.730313668);
  return 0;
}

function samplesOf(trace: Trace, offsetDb: number): Sample[] {
  const samples: Sample[] = [];
  trace.levelsDb.forEach((db, i) => {
    const { axis } = trace;
    const hz =
      axis.kind === "regular" ? axis.startHz + axis.stepHz * i : (axis.frequenciesHz[i] ?? NaN);
    // A level is kept as a float32, restated ones too.
    samples.push({ hz, db: offsetDb === 0 ? db : Math.fround(db + offsetDb) });
  });
  return samples;
}

function limitByHand(segments: readonly MaskSegment[], hz: number): number {
  let lowest = Infinity;
  for (const s of segments) {
    if (hz < s.startHz || s.stopHz < hz) continue;
    const scale = s.interpolation === "log" ? Math.log10 : (f: number) => f;
    const [a, b, x] = [scale(s.startHz), scale(s.stopHz), scale(hz)];
    lowest = Math.min(lowest, (s.startDb * (b - x) + s.stopDb * (x - a)) / (b - a));
  }
  return lowest;
}

/** Whether a trace can say something of the line: its own detector or a looser one. */
function speaks(trace: Trace, line: MaskLine): boolean {
  if (trace.detector === null || trace.hold === "min-hold") return false;
  const isAverage = line.detector === "average" || line.detector === "rms-average";
  if (trace.hold === "average" && !isAverage) return false;
  const at = ORDER.indexOf(trace.detector);
  return at >= 0 && at <= ORDER.indexOf(line.detector);
}

function medianOf(values: readonly number[]): number {
  const sorted = [...values].sort((a, b) => a - b);
  const middle = (sorted.length - 1) / 2;
  return ((sorted[Math.floor(middle)] ?? NaN) + (sorted[Math.ceil(middle)] ?? NaN)) / 2;
}

/** From each sample to the next, Hz. */
function spacingsOf(samples: readonly Sample[]): number[] {
  return samples.slice(1).map((sample, k) => sample.hz - (samples[k]?.hz ?? NaN));
}

/** The median of spacing i and of ten to each side of it. */
function spacingAround(spacings: readonly number[], i: number): number {
  return medianOf(spacings.slice(Math.max(0, i - 10), i + 11));
}

/** Pieces of frequency that a scan swept: none across NaN or a spacing above twice the median. */
function sweptPieces(samples: readonly Sample[]): [number, number][] {
  const spacings = spacingsOf(samples);
  const pieces: [number, number][] = [];
  for (let i = 0; i + 1 < samples.length; i += 1) {
    const [a, b] = [samples[i], samples[i + 1]];
    if (!a || !b || Number.isNaN(a.db) || Number.isNaN(b.db)) continue;
    if (b.hz - a.hz <= 2 * spacingAround(spacings, i)) pieces.push([a.hz, b.hz]);
  }
  const [first, last] = [samples[0], samples.at(-1)];
  if (samples.length < 2 || !first || !last) return pieces;
  const firstHalf = spacingAround(spacings, 0) / 2;
  const lastHalf = spacingAround(spacings, spacings.length - 1) / 2;
  if (!Number.isNaN(first.db)) pieces.push([first.hz - firstHalf, first.hz]);
  if (!Number.isNaN(last.db)) pieces.push([last.hz, last.hz + lastHalf]);
  return pieces;
}

/** The worst margin of each line, with plain loops over samples; null where nothing decides. */
export function readByHand(input: ReadSweepInput): (MarginByHand | null)[] {
  const { mask, settings } = input;
  const swept = input.traces.map((trace) => {
    const sameUnit = trace.unit === mask.unit;
    const samples = samplesOf(trace, sameUnit ? 0 : offsetOf(trace.unit, input.impedanceOhm ?? 50));
    return { trace, samples, pieces: trace.kind === "scan" ? sweptPieces(samples) : [] };
  });
  return mask.lines.map((line) => {
    const speaking = swept.filter(({ trace }) => speaks(trace, line));
    let [own, bound] = [Infinity, Infinity];
    let [ownHz, boundHz] = [NaN, NaN];
    for (const { trace, samples } of speaking) {
      const isOwn = trace.detector === line.detector;
      const tighter = speaking.filter(
        (other) => ORDER.indexOf(other.trace.detector ?? "") > ORDER.indexOf(trace.detector ?? ""),
      );
      const spacings = spacingsOf(samples);
      const reach = Math.max(settings.rbwHz ?? 0, spacings.length > 0 ? medianOf(spacings) : 0);
      for (const { hz, db } of samples) {
        const limit = limitByHand(line.segments, hz);
        if (Number.isNaN(db) || limit === Infinity) continue;
        const margin = limit - db;
        if (isOwn && margin < own) [own, ownHz] = [margin, hz];
        if (isOwn || margin >= bound) continue;
        const isSilent = tighter.some((other) =>
          other.trace.kind === "scan"
            ? other.pieces.some(([a, b]) => a <= hz && hz <= b)
            : other.samples.some((s) => !Number.isNaN(s.db) && Math.abs(s.hz - hz) <= reach),
        );
        if (!isSilent) [bound, boundHz] = [margin, hz];
      }
    }
    if (own === Infinity && bound === Infinity) return null;
    // Over by the own detector is known by that margin, whatever a looser one reads elsewhere.
    const isOwn = own < 0 || own <= bound;
    return {
      marginDb: isOwn ? own : bound,
      frequencyHz: isOwn ? ownHz : boundHz,
      basis: isOwn ? "like-for-like" : "upper-bound",
      isOver: own < 0,
    };
  });
}
