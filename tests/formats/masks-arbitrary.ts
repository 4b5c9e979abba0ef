import fc from "fast-check";
import { INTERPOLATIONS, PROVENANCES, type Mask, type MaskSegment } from "@/lib/core/mask/mask";
import { BANDWIDTH_KINDS, DETECTORS, PORTS } from "@/lib/core/sweep/settings";
import { LEVEL_UNITS } from "@/lib/core/units/level-units";

const positive = (max: number) => fc.double({ min: 1e-3, max, noNaN: true });
const level = fc.double({ min: -400, max: 400, noNaN: true }).map((db) => (db === 0 ? 0 : db));
/** Any text, and often what breaks a table: delimiters, quotes, line ends, formulas, blanks. */
const text = fc.oneof(
  fc.string({ unit: "grapheme", maxLength: 20 }),
  fc
    .array(fc.constantFrom('"', ",", ";", "\t", "\n", "\r\n", "'", "=1+1", "-", "@", " ", "µ", "a"))
    .map((parts) => parts.join("")),
);

/** Bands side by side, some with a gap before them. */
const segments = fc
  .tuple(
    fc.uniqueArray(positive(1e12), { minLength: 2, maxLength: 8 }),
    fc.array(fc.record({ isGap: fc.boolean(), startDb: level, stopDb: level }), {
      minLength: 8,
      maxLength: 8,
    }),
    fc.constantFrom(...INTERPOLATIONS),
  )
  .map(([edges, bands, interpolation]) => {
    const sorted = [...edges].sort((a, b) => a - b);
    const made = sorted.slice(1).flatMap((stopHz, i): MaskSegment[] => {
      const band = bands[i];
      if (!band || (band.isGap && i > 0)) return [];
      const { startDb, stopDb } = band;
      return [{ startHz: sorted[i] ?? 0, stopHz, startDb, stopDb, interpolation }];
    });
    return made;
  });

const line = fc.record({
  detector: fc.constantFrom(...DETECTORS),
  rbwHz: fc.option(positive(1e9), { nil: null }),
  rbwKind: fc.option(fc.constantFrom(...BANDWIDTH_KINDS), { nil: null }),
  segments,
});

/** A mask that validation takes, with texts and numbers that a file may well hold. */
export const arbitraryMask: fc.Arbitrary<Mask> = fc
  .record({
    key: text,
    title: text.map((title) => `${title}x`),
    port: fc.constantFrom(...PORTS),
    unit: fc.constantFrom(...LEVEL_UNITS.filter((unit) => unit !== "dB")),
    distanceM: fc.option(positive(1e3), { nil: null }),
    document: text,
    clause: text,
    edition: text,
    provenance: fc.constantFrom(...PROVENANCES),
    note: text,
    lines: fc.array(fc.tuple(text, line), { minLength: 1, maxLength: 4 }),
  })
  .map(({ lines, ...mask }) => ({
    format: "neap-mask",
    version: 1,
    ...mask,
    lines: lines.map(([name, rest], i) => ({ name: `${name}${i}`, ...rest })),
  }));
