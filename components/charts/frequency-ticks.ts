import { hzAtShare, shareOfHz, type AxisScaleKind, type FrequencyView } from "./frequency-scale";

export interface FrequencyTick {
  hz: number;
  /** null: a tick without a label, because there is no room or it is a minor one. */
  label: string | null;
  weight: "decade" | "major" | "minor";
}

const LABEL_CHARACTER_PX = 6.7;
const LABEL_AIR_PX = 16;

/** A round frequency in engineering units, without digits it does not have: "200 MHz". */
export function labelFrequency(hz: number): string {
  const size = Math.abs(hz);
  const [scale, unit] =
    size >= 1e9
      ? ([1e9, "GHz"] as const)
      : size >= 1e6
        ? ([1e6, "MHz"] as const)
        : size >= 1e3
          ? ([1e3, "kHz"] as const)
          : ([1, "Hz"] as const);
  return `${Number((hz / scale).toPrecision(9))} ${unit}`;
}

function niceStepHz(spanHz: number, atMost: number): number {
  const raw = spanHz / Math.max(1, atMost);
  const decade = Math.pow(10, Math.floor(Math.log10(raw)));
  return ([1, 2, 5, 10].find((m) => m * decade >= raw * (1 - 1e-9)) ?? 10) * decade;
}

function linearTicks(view: FrequencyView, widthPx: number): FrequencyTick[] {
  const step = niceStepHz(view.toHz - view.fromHz, widthPx / 90);
  const first = Math.ceil(view.fromHz / step - 1e-9);
  const last = Math.floor(view.toHz / step + 1e-9);
  return Array.from({ length: Math.max(0, last - first + 1) }, (_, i) => ({
    hz: Number(((first + i) * step).toPrecision(12)),
    label: "",
    weight: "major" as const,
  }));
}

function logTicks(view: FrequencyView): FrequencyTick[] {
  const ticks: FrequencyTick[] = [];
  const from = hzAtShare(view, "log", 0);
  const top = Math.floor(Math.log10(view.toHz) + 1e-9);
  for (let decade = Math.floor(Math.log10(from)); decade <= top; decade += 1)
    for (let digit = 1; digit <= 9; digit += 1) {
      const hz = Number(`${digit}e${decade}`);
      if (hz < from * (1 - 1e-9) || hz > view.toHz * (1 + 1e-9)) continue;
      const weight = digit === 1 ? "decade" : digit === 2 || digit === 5 ? "major" : "minor";
      ticks.push({ hz, label: "", weight });
    }
  return ticks;
}

/** Gives labels to decades first, then to the other 1-2-5 ticks, as far as they fit. */
function labelWhatFits(
  ticks: FrequencyTick[],
  view: FrequencyView,
  scale: AxisScaleKind,
  widthPx: number,
): FrequencyTick[] {
  const taken: { from: number; to: number }[] = [];
  const labels = new Map<number, string>();
  for (const weight of ["decade", "major"] as const)
    for (const tick of ticks) {
      if (tick.weight !== weight) continue;
      const label = labelFrequency(tick.hz);
      const x = shareOfHz(view, scale, tick.hz) * widthPx;
      const width = label.length * LABEL_CHARACTER_PX + LABEL_AIR_PX;
      // Labels at the ends are pushed inside, as the axis draws them.
      const from = Math.min(widthPx - width + LABEL_AIR_PX, Math.max(0, x - width / 2));
      if (taken.some((other) => from < other.to && from + width > other.from)) continue;
      taken.push({ from, to: from + width });
      labels.set(tick.hz, label);
    }
  return ticks.map((tick) => ({ ...tick, label: labels.get(tick.hz) ?? null }));
}

/**
 * Ticks of a frequency axis, ascending: decades and 1-2-5 on a log axis, with the digits between
 * them as minor ticks. A view too narrow for 1-2-5 gets evenly spaced round frequencies.
 */
export function frequencyTicks(
  view: FrequencyView,
  scale: AxisScaleKind,
  widthPx: number,
): FrequencyTick[] {
  if (!(view.toHz > view.fromHz) || !(widthPx > 0)) return [];
  const byDecade = scale === "log" ? logTicks(view) : [];
  const lettered = byDecade.filter((tick) => tick.weight !== "minor").length;
  const ticks = lettered >= 3 ? byDecade : linearTicks(view, widthPx);
  return labelWhatFits(ticks, view, scale, widthPx);
}
