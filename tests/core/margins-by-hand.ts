import type { Mask, MaskLine, MaskSegment } from "@/lib/core/mask/mask";
import type { SweepPart } from "@/lib/core/reading/sweep-part";
import type { Trace } from "@/lib/core/sweep/trace";

/**
 * The reading in the plainest possible way, from measurement.md §2 and §4 alone: loops over all
 * samples and all segments, nothing sorted, indexed or left out.
 */
export interface LineByHand {
  /** null where nothing decides. */
  worst: { marginDb: number; frequencyHz: number; basis: "like-for-like" | "upper-bound" } | null;
  isOver: boolean;
  /** Whether a heard margin lies inside its own sweep's guard. */
  isInside: boolean;
  /** Share of the line, log frequency, that was swept. */
  coverage: number;
  /** Heard samples of bounds that lie over the line. */
  boundsOver: { hz: number; reachHz: number; part: SweepPart }[];
}

interface Sample {
  hz: number;
  db: number;
}

interface Swept {
  part: SweepPart;
  trace: Trace;
  samples: Sample[];
  spacings: number[];
  pieces: [number, number][];
}

/** Loose to tight, CISPR 16-1-1: PK ≥ QP ≥ RMS-AV ≥ AV. */
const ORDER = ["peak", "quasi-peak", "rms-average", "average"];
const rankOf = (trace: Trace) => ORDER.indexOf(trace.detector ?? "");

/** What 0 dB of a unit is in dBµV, from volts and ohms. */
function inMicrovolts(unit: string, ohm: number): number {
  if (unit === "dBm") return 20 * Math.log10(Math.sqrt(1e-3 * ohm) * 1e6);
  return unit === "dBmV" ? 60 : 0;
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
  const at = rankOf(trace);
  return at >= 0 && at <= ORDER.indexOf(line.detector);
}

function medianOf(values: readonly number[]): number {
  const sorted = [...values].sort((a, b) => a - b);
  const middle = (sorted.length - 1) / 2;
  return ((sorted[Math.floor(middle)] ?? NaN) + (sorted[Math.ceil(middle)] ?? NaN)) / 2;
}

/** The median of spacing i and of ten to each side of it. */
function spacingAround(spacings: readonly number[], i: number): number {
  return medianOf(spacings.slice(Math.max(0, i - 10), i + 11));
}

/** Pieces of frequency that a scan swept: none across NaN or a spacing above twice the median. */
function sweptPieces(samples: readonly Sample[], spacings: readonly number[]): [number, number][] {
  const pieces: [number, number][] = [];
  for (let i = 0; i + 1 < samples.length; i += 1) {
    const [a, b] = [samples[i], samples[i + 1]];
    if (!a || !b || Number.isNaN(a.db) || Number.isNaN(b.db)) continue;
    if (b.hz - a.hz <= 2 * spacingAround(spacings, i)) pieces.push([a.hz, b.hz]);
  }
  const [first, last] = [samples[0], samples.at(-1)];
  if (samples.length < 2 || !first || !last) return pieces;
  if (!Number.isNaN(first.db)) pieces.push([first.hz - spacingAround(spacings, 0) / 2, first.hz]);
  const lastHalf = spacingAround(spacings, spacings.length - 1) / 2;
  if (!Number.isNaN(last.db)) pieces.push([last.hz, last.hz + lastHalf]);
  return pieces;
}

function sweep(part: SweepPart, trace: Trace, mask: Mask): Swept {
  const ohm = part.impedanceOhm ?? 50;
  const offsetDb = inMicrovolts(trace.unit, ohm) - inMicrovolts(mask.unit, ohm);
  const samples: Sample[] = [];
  trace.levelsDb.forEach((db, i) => {
    const { axis } = trace;
    const hz =
      axis.kind === "regular" ? axis.startHz + axis.stepHz * i : (axis.frequenciesHz[i] ?? NaN);
    samples.push({ hz, db: trace.unit === mask.unit ? db : db + offsetDb });
  });
  const spacings = samples.slice(1).map((sample, k) => sample.hz - (samples[k]?.hz ?? NaN));
  const pieces = trace.kind === "scan" ? sweptPieces(samples, spacings) : [];
  return { part, trace, samples, spacings, pieces };
}

/**
 * Same port and polarization; height and azimuth unless unstated. Of two sweeps the polarization has
 * to be stated; where there is none, the conductor, which these sweeps never state.
 */
export function isInPosition(tight: SweepPart, loose: SweepPart): boolean {
  const [a, b] = [tight.settings, loose.settings];
  if (a.port !== b.port || a.polarization !== b.polarization) return false;
  if (tight !== loose && !(a.port === "radiated" && a.polarization !== null)) return false;
  const isAlike = (own: number | null, bound: number | null) => bound === null || own === bound;
  return isAlike(a.heightM, b.heightM) && isAlike(a.azimuthDeg, b.azimuthDeg);
}

/** Share of the line's bands that was swept, between each pair of neighbouring borders. */
function coverageByHand(line: MaskLine, speaking: readonly Swept[], all: readonly Swept[]): number {
  const bands: [number, number][] = [];
  for (const { startHz, stopHz } of [...line.segments].sort((a, b) => a.startHz - b.startHz)) {
    const last = bands.at(-1);
    if (last && startHz <= last[1]) last[1] = Math.max(last[1], stopHz);
    else bands.push([startHz, stopHz]);
  }
  const widthOf = (ranges: readonly [number, number][]) =>
    ranges.reduce((sum, [a, b]) => sum + Math.max(0, Math.log10(b / a)), 0);
  // Scanned over a hundredth of the line or more, with whatever detector.
  const stated = new Set(
    all.flatMap(({ trace, samples, part: { settings } }) => {
      if (trace.kind !== "scan" || settings.port !== "radiated") return [];
      const [first, last] = [samples[0]?.hz ?? NaN, samples.at(-1)?.hz ?? NaN];
      const common = bands.map(([a, b]): [number, number] => [
        Math.max(a, first),
        Math.min(b, last),
      ]);
      const isMeant = widthOf(common) >= 0.01 * widthOf(bands);
      return isMeant && settings.polarization ? [settings.polarization] : [];
    }),
  );
  let [whole, covered] = [0, 0];
  for (const [from, to] of bands) {
    // A trace without one sample in a band measured nothing of it.
    const here = speaking.filter((one) =>
      one.samples.some((s) => s.hz >= from && s.hz <= to && !Number.isNaN(s.db)),
    );
    const ways =
      stated.size === 0
        ? [here]
        : [...stated].map((p) => here.filter((one) => one.part.settings.polarization === p));
    const pieces = here.flatMap((one) => one.pieces);
    const borders = [...new Set([from, to, ...pieces.flat()])]
      .filter((hz) => hz >= from && hz <= to)
      .sort((a, b) => a - b);
    borders.slice(1).forEach((b, i) => {
      const a = borders[i] ?? b;
      const isSwept = ways.every((way) =>
        way.some((one) => one.pieces.some((piece) => piece[0] <= a && b <= piece[1])),
      );
      if (isSwept) covered += Math.log10(b / a);
    });
    whole += Math.log10(to / from);
  }
  return covered / whole;
}

/** Sums of products leave some parts in 10^14; what differs by less is a tie. */
const rounded = (db: number) => Math.round(db * 1e9) / 1e9;

/** Points further apart than the bandwidth see nothing of what lies between them. */
function isSparse({ part, spacings }: Swept): boolean {
  const { rbwHz } = part.settings;
  return rbwHz !== null && spacings.length > 0 && medianOf(spacings) > rbwHz;
}

/** Sweeps held together against each line of a mask. */
export function readByHand(parts: readonly SweepPart[], mask: Mask): LineByHand[] {
  const swept = parts.flatMap((part) => part.traces.map((trace) => sweep(part, trace, mask)));
  return mask.lines.map((line) => {
    const speaking = swept.filter(({ trace }) => speaks(trace, line));
    let [own, bound] = [Infinity, Infinity];
    let [ownHz, boundHz] = [NaN, NaN];
    let isInside = false;
    const boundsOver: LineByHand["boundsOver"] = [];
    for (const one of speaking) {
      const isOwn = one.trace.detector === line.detector;
      const tighter = speaking.filter(
        (other) => rankOf(other.trace) > rankOf(one.trace) && isInPosition(other.part, one.part),
      );
      const step = one.spacings.length > 0 ? medianOf(one.spacings) : 0;
      const reachHz = Math.max(one.part.settings.rbwHz ?? 0, step);
      for (const { hz, db } of one.samples) {
        const limitDb = limitByHand(line.segments, hz);
        if (Number.isNaN(db) || limitDb === Infinity) continue;
        const margin = rounded(limitDb - db);
        const isSilent =
          !isOwn &&
          tighter.some((other) =>
            other.trace.kind === "scan" && !isSparse(other)
              ? other.pieces.some(([a, b]) => a <= hz && hz <= b)
              : other.samples.some((s) => !Number.isNaN(s.db) && Math.abs(s.hz - hz) <= reachHz),
          );
        if (isSilent) continue;
        if (margin < one.part.guardDb) isInside = true;
        if (isOwn && (margin < own || (margin === own && hz < ownHz))) [own, ownHz] = [margin, hz];
        if (isOwn) continue;
        if (margin < 0) boundsOver.push({ hz, reachHz, part: one.part });
        if (margin < bound || (margin === bound && hz < boundHz)) [bound, boundHz] = [margin, hz];
      }
    }
    // Over by the own detector is known by that margin, whatever a looser one reads elsewhere.
    const isOwn = own < 0 || own <= bound;
    const worst = {
      marginDb: isOwn ? own : bound,
      frequencyHz: isOwn ? ownHz : boundHz,
      basis: isOwn ? ("like-for-like" as const) : ("upper-bound" as const),
    };
    return {
      worst: worst.marginDb === Infinity ? null : worst,
      isOver: own < 0,
      isInside,
      coverage: coverageByHand(line, speaking, swept),
      boundsOver,
    };
  });
}
