import fc from "fast-check";
import { expect, it } from "vitest";
import { parseSweepFile } from "@/lib/formats/parse-sweep-file";
import { previewSweepFile } from "@/lib/formats/preview-sweep-file";
import { encode, hz, traces, type Encoding } from "./bytes";

const UNITS_HZ = { Hz: 1, kHz: 1e3, MHz: 1e6, GHz: 1e9 };
const DECIMALS = { Hz: 0, kHz: 3, MHz: 6, GHz: 9 };
const LEVEL_UNITS = {
  dBm: "dBm",
  dBuV: "dBuV",
  "dB\u00b5V": "dBuV",
  "dB\u00b5V/m": "dBuV/m",
  dBuVPerMeter: "dBuV/m",
};

const layout = fc.record({
  startHz: fc.integer({ min: 9_000, max: 2_000_000_000 }),
  stepHz: fc.integer({ min: 100, max: 1_000_000 }),
  // Hundredths of a dB.
  levels: fc.array(fc.integer({ min: -14_999, max: 14_999 }), { minLength: 8, maxLength: 40 }),
  delimiter: fc.constantFrom(",", ";", "\t", "^", " "),
  decimal: fc.constantFrom("." as const, "," as const),
  isQuoted: fc.boolean(),
  header: fc.constantFrom("names", "unit row", "comment names", "keys", "unit columns"),
  levelFirst: fc.boolean(),
  hasIndex: fc.boolean(),
  isDescending: fc.boolean(),
  frequencyUnit: fc.constantFrom("Hz" as const, "kHz" as const, "MHz" as const, "GHz" as const),
  levelUnit: fc.constantFrom(...(Object.keys(LEVEL_UNITS) as (keyof typeof LEVEL_UNITS)[])),
  minus: fc.constantFrom("-", "\u2212"),
  lineEnd: fc.constantFrom("\n", "\r\n", "\r"),
  hasCtrlZ: fc.boolean(),
  encoding: fc.constantFrom<Encoding>(
    "utf-8",
    "utf-8-bom",
    "utf-16le",
    "utf-16be",
    "windows-1252",
    "nul-padded",
  ),
});
type Layout = typeof layout extends fc.Arbitrary<infer T> ? T : never;

/** Prints a known sweep in one of the layouts; what it holds is known beforehand. */
function render(it: Layout): { bytes: Uint8Array; hz: number[]; levels: number[] } {
  const { delimiter: d } = it;
  const quoted = d === "," && it.decimal === ",";
  const minus = it.encoding === "windows-1252" ? "-" : it.minus;
  const print = (value: number, decimals: number) => {
    const text = value.toFixed(decimals).replace(".", it.decimal).replace("-", minus);
    return quoted || (it.isQuoted && d !== " ") ? `"${text}"` : text;
  };
  const frequencies = it.levels.map((_, i) => it.startHz + i * it.stepHz);
  const order = (frequency: string, level: string) =>
    it.levelFirst ? [level, frequency] : [frequency, level];
  const pairs = frequencies.map((value, i) => {
    const frequency = print(value / UNITS_HZ[it.frequencyUnit], DECIMALS[it.frequencyUnit]);
    const level = print((it.levels[i] ?? 0) / 100, 2);
    if (it.header !== "unit columns") return order(frequency, level);
    return order(`${frequency}${d}${it.frequencyUnit}`, `${level}${d}${it.levelUnit}`);
  });
  if (it.isDescending) pairs.reverse();
  const rows = pairs.map((cells, i) => [...(it.hasIndex ? [String(i + 1)] : []), ...cells].join(d));
  const names = (frequency: string, level: string) =>
    [...(it.hasIndex ? ["No."] : []), ...order(frequency, level)].join(d);
  const units = names(it.frequencyUnit, it.levelUnit).replace("No.", "-");
  const full = names(`Frequency[${it.frequencyUnit}]`, `Level[${it.levelUnit}]`);
  const header: Record<string, string[]> = {
    names: [full],
    "unit row": [names("Frequency", "Level"), units],
    "comment names": [`# ${full}`],
    keys: [
      `Frequency unit: ${it.frequencyUnit}`,
      `Level unit: ${it.levelUnit}`,
      names("Frequency", "Level"),
    ],
    "unit columns": ["Bench sweep"],
  };
  const lines = ["Detector: Peak", "RBW: 120 kHz", ...(header[it.header] ?? []), ...rows, ""];
  return {
    bytes: encode(lines.join(it.lineEnd) + (it.hasCtrlZ ? "\u001a" : ""), it.encoding),
    hz: frequencies,
    levels: it.levels.map((level) => level / 100),
  };
}

it("reads a known sweep from every layout as it was printed", () => {
  fc.assert(
    fc.property(layout, (chosen) => {
      // A constant of zero is read as a trace that is off, which has a test of its own.
      fc.pre(new Set(chosen.levels).size > 1);
      const known = render(chosen);
      const [trace, ...others] = traces(known.bytes);
      expect(others).toEqual([]);
      if (!trace) throw new Error("no trace");
      expect(trace.unit).toBe(LEVEL_UNITS[chosen.levelUnit]);
      expect(trace.detector).toBe("peak");
      expect(Array.from(trace.levelsDb)).toEqual(known.levels.map(Math.fround));
      hz(trace).forEach((value, i) =>
        expect(Math.abs(value - (known.hz[i] ?? 0))).toBeLessThan(0.001),
      );
    }),
    { numRuns: 600 },
  );
});

it("gives a preview for any bytes at all, and never throws", () => {
  const nearly = fc
    .array(
      fc.constantFrom("1", "2,5", "-3.1", ";", ",", "\t", "\n", "MHz", "dBm", "nan", '"', " "),
      {
        maxLength: 80,
      },
    )
    .map((parts) => encode(parts.join("")));
  fc.assert(
    fc.property(fc.oneof(fc.uint8Array({ maxLength: 400 }), nearly), (bytes) => {
      const result = parseSweepFile(bytes, "x");
      expect(result.preview).toEqual(previewSweepFile(bytes, "x"));
      expect(result.ok).toBe(result.preview.outcome === "ready");
      if (result.preview.outcome === "refused") expect(result.preview.reason).toMatch(/\S.*\.$/s);
    }),
    { numRuns: 1000 },
  );
});
