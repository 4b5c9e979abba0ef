interface Tick {
  value: number;
  label: string;
}

const HZ_SCALES = [
  { from: 1e9, unit: "GHz" },
  { from: 1e6, unit: "MHz" },
  { from: 1e3, unit: "kHz" },
  { from: 1, unit: "Hz" },
];

function hzLabel(hz: number): string {
  const scale = HZ_SCALES.find(({ from }) => hz >= from * (1 - 1e-9)) ?? { from: 1, unit: "Hz" };
  return `${Number((hz / scale.from).toPrecision(6))} ${scale.unit}`;
}

function decadeTicks(fromHz: number, toHz: number, digits: readonly number[]): number[] {
  const ticks: number[] = [];
  for (let e = Math.floor(Math.log10(fromHz)); Math.pow(10, e) <= toHz; e += 1)
    for (const digit of digits) {
      const hz = Number((digit * Math.pow(10, e)).toPrecision(3));
      if (hz >= fromHz && hz <= toHz) ticks.push(hz);
    }
  return ticks;
}

function evenTicks(from: number, to: number, step: number): number[] {
  const ticks: number[] = [];
  for (let k = Math.ceil(from / step - 1e-9); k * step <= to + step * 1e-9; k += 1)
    ticks.push(Number((k * step).toPrecision(12)));
  return ticks;
}

/** Step of 1, 2 or 5 times a power of ten that parts a span into about `count` pieces. */
function niceStep(span: number, count: number): number {
  const raw = span / count;
  const power = Math.pow(10, Math.floor(Math.log10(raw)));
  return power * ([1, 2, 5, 10].find((digit) => digit * power >= raw) ?? 10);
}

/** 1-2-5 ticks of a log axis in Hz; finer ones where the span is too short for them. */
export function frequencyTicks(fromHz: number, toHz: number): Tick[] {
  let ticks = decadeTicks(fromHz, toHz, [1, 2, 5]);
  if (ticks.length < 3) ticks = decadeTicks(fromHz, toHz, [1, 2, 3, 4, 5, 6, 7, 8, 9]);
  if (ticks.length < 3) ticks = evenTicks(fromHz, toHz, niceStep(toHz - fromHz, 5));
  // Over many decades only the decades are named, so that the names stay apart.
  const decades = Math.log10(toHz / fromHz) > 5;
  return ticks.map((value) => {
    const isDecade = Math.abs(Math.log10(value) - Math.round(Math.log10(value))) < 1e-9;
    return { value, label: decades && !isDecade ? "" : hzLabel(value) };
  });
}

export function levelTicks(fromDb: number, toDb: number): Tick[] {
  const step = toDb - fromDb > 90 ? 20 : 10;
  return evenTicks(fromDb, toDb, step).map((value) => ({
    value,
    label: value < 0 ? `\u2212${Math.abs(value)}` : String(value),
  }));
}
