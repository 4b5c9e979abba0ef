import fc from "fast-check";
import { describe, expect, test } from "vitest";
import type { MaskSegment } from "@/lib/core/mask/mask";
import { readSweep, type ReadSweepInput } from "@/lib/core/reading/read-sweep";
import { readTogether } from "@/lib/core/reading/read-together";
import type { Reading } from "@/lib/core/reading/reading";
import type { SweepPart } from "@/lib/core/reading/sweep-part";
import type { Trace } from "@/lib/core/sweep/trace";
import { maskLine, maskOf, segment } from "./hand-worked/case";
import { anyAxis, anyCase, segments } from "./margins-arbitraries";
import { cutTrace, frequenciesOf, inMegahertz, sameReading, splitSegment } from "./reading-changes";

const RUNS = { numRuns: 120, seed: 15 };
const WORST_FIRST = ["over", "undecided", "inside-guard", "clear"];
const marginOf = (reading: Reading, i: number) => reading.lines[i]?.worst?.marginDb ?? Infinity;

const EXACT = { db: 1e-9, share: 0 };

function withLines(input: ReadSweepInput, change: (list: MaskSegment[]) => MaskSegment[]) {
  const lines = input.mask.lines.map((line) => ({ ...line, segments: change(line.segments) }));
  return { ...input, mask: { ...input.mask, lines } };
}

function withTraces(input: ReadSweepInput, change: (trace: Trace) => Trace): ReadSweepInput {
  return { ...input, traces: input.traces.map(change) };
}

/** Same sweep, same mask: the input as one of several sweeps. */
const partOf = ({ mask: _mask, ...part }: ReadSweepInput): SweepPart => part;

describe("what can only make a reading worse (measurement.md §3, §4)", () => {
  test("a lower limit never raises a margin or betters a standing", () => {
    const lower = fc.array(fc.integer({ min: 0, max: 80 }), { minLength: 5, maxLength: 5 });
    fc.assert(
      fc.property(anyCase(), lower, (input, eighths) => {
        const tight = withLines(input, (list) =>
          list.map((s, i) => {
            const by = (eighths[i] ?? 0) / 8;
            return { ...s, startDb: s.startDb - by, stopDb: s.stopDb - by };
          }),
        );
        const [before, after] = [readSweep(input), readSweep(tight)];
        after.lines.forEach((line, i) => {
          const rank = WORST_FIRST.indexOf(line.standing);
          expect(rank).toBeLessThanOrEqual(WORST_FIRST.indexOf(before.lines[i]!.standing));
          // A line that turned over is known by what made it so, no longer by a lower bound.
          const isNewlyOver = line.standing === "over" && before.lines[i]!.standing !== "over";
          if (!isNewlyOver)
            expect(marginOf(after, i)).toBeLessThanOrEqual(marginOf(before, i) + 1e-9);
        });
      }),
      RUNS,
    );
  });

  test("another segment never raises a margin", () => {
    fc.assert(
      fc.property(anyCase({ isOneDetector: true }), segments, (input, more) => {
        const after = readSweep(withLines(input, (list) => [...list, ...more]));
        const before = readSweep(input);
        after.lines.forEach((_, i) =>
          expect(marginOf(after, i)).toBeLessThanOrEqual(marginOf(before, i) + 1e-9),
        );
      }),
      RUNS,
    );
  });

  test("another trace or another sweep never takes a line out of being over", () => {
    const position = fc.constantFrom("horizontal" as const, "vertical" as const, null);
    fc.assert(
      fc.property(anyCase(), anyCase(), position, (input, other, polarization) => {
        const before = readSweep(input);
        // The other sweep in the unit of this one, so that it can be held against the mask.
        const traces = other.traces.map((t) => ({ ...t, unit: input.traces[0]!.unit }));
        const more = readSweep({ ...input, traces: [...input.traces, ...traces] });
        const second = { ...partOf(other), traces, impedanceOhm: 50 };
        const settings = { ...second.settings, polarization };
        const together = readTogether([{ ...second, settings }, partOf(input)], input.mask);
        before.lines.forEach((line, i) => {
          if (line.standing !== "over") return;
          for (const after of [more, together]) {
            expect(after.lines[i]?.standing).toBe("over");
            expect(marginOf(after, i)).toBeLessThanOrEqual(marginOf(before, i));
          }
        });
      }),
      RUNS,
    );
  });

  test("a level that is missing inside the mask is never clear or inside guard", () => {
    let cleared = 0;
    fc.assert(
      fc.property(
        anyAxis,
        fc.nat(),
        fc.nat(),
        fc.nat(),
        fc.nat({ max: 12 }),
        (axis, a, b, c, g) => {
          const hz = frequenciesOf(axis);
          const [i, k] = [a % hz.length, b % hz.length].sort((x, y) => x - y) as [number, number];
          fc.pre(i < k);
          const mask = {
            ...maskOf([maskLine("peak", [segment(hz[i]!, hz[k]!, 40)])], { distanceM: null }),
            port: "other" as const,
          };
          const levelsDb = new Float32Array(hz.length).fill(30);
          const trace: Trace = {
            name: "A trace",
            kind: "scan",
            detector: "peak",
            hold: "none",
            unit: "dBuV/m",
            axis,
            levelsDb,
          };
          const settings = {
            port: "other",
            distanceM: null,
            rbwHz: 9e3,
          } as ReadSweepInput["settings"];
          const read = () => readSweep({ traces: [trace], settings, mask, guardDb: g });
          if (read().standing !== "undecided") cleared += 1;
          levelsDb[i + (c % (k - i + 1))] = Number.NaN;
          expect(read().standing).toBe("undecided");
          expect(read().coverage.fraction).toBeLessThan(1);
        },
      ),
      RUNS,
    );
    expect(cleared).toBeGreaterThan(20);
  });
});

/** Of two sweeps, traces speak for each other only where it is stated what they looked at. */
const stated = (made: ReadSweepInput): ReadSweepInput => ({
  ...made,
  settings: { ...made.settings, polarization: "vertical", conductor: "L1" },
});

describe("what must not matter", () => {
  test("dBm at 50 Ω or dBµV: margins within the rounding of a float32", () => {
    fc.assert(
      fc.property(anyCase({ isOneUnit: true }), (input) => {
        // dBµV = dBm + 10·log10(50) + 90; levels up to 128 dB are kept to 2^-18 = 3.8e-6 dB.
        const add = 10 * Math.log10(50) + 90;
        const inDbm = withTraces({ ...input, impedanceOhm: 50 }, (trace) => ({
          ...trace,
          unit: "dBm",
          levelsDb: trace.levelsDb.map((db) => db - add),
        }));
        sameReading(readSweep(input), readSweep(inDbm), { db: 1e-5, share: 0 });
      }),
      RUNS,
    );
  });

  test("frequencies read in Hz or worked out from MHz", () => {
    fc.assert(
      fc.property(anyCase(), (input) => {
        const megahertz = withTraces(input, (trace) => ({
          ...trace,
          axis: inMegahertz(trace.axis),
        }));
        sameReading(readSweep(input), readSweep(megahertz), { db: 1e-9, share: 1e-12 });
      }),
      RUNS,
    );
  });

  test("the order of traces and of sweeps", () => {
    fc.assert(
      fc.property(anyCase(), (made) => {
        const input = stated(made);
        const traces = [...input.traces].reverse();
        sameReading(readSweep(input), readSweep({ ...input, traces }), EXACT);
        const parts = input.traces.map((trace) => ({ ...partOf(input), traces: [trace] }));
        const together = readTogether(parts, input.mask);
        sameReading(together, readTogether([...parts].reverse(), input.mask), EXACT);
        sameReading(readSweep(input), together, EXACT);
      }),
      RUNS,
    );
  });

  test("a sweep split in two between any two of its points", () => {
    let split = 0;
    fc.assert(
      fc.property(anyCase(), fc.nat(), (made, at) => {
        const input = stated(made);
        const scan = input.traces.find((trace) => trace.kind === "scan");
        fc.pre(scan !== undefined && scan.levelsDb.length > 3);
        const k = 2 + (at % (scan!.levelsDb.length - 3));
        const halves = cutTrace(scan!, k);
        // Where nothing was swept between the two points the halves are two sweeps.
        fc.pre(halves !== null);
        split += 1;
        const others = input.traces.filter((trace) => trace !== scan);
        const [a, b] = halves!;
        const parts = [
          { ...partOf(input), traces: [a, ...others] },
          { ...partOf(input), traces: [b] },
        ];
        const whole = readTogether([{ ...partOf(input), traces: [scan!, ...others] }], input.mask);
        sameReading(whole, readTogether(parts, input.mask), EXACT);
      }),
      RUNS,
    );
    expect(split).toBeGreaterThan(50);
  });

  test("the guard, for margins, coverage, suspects and what to measure again", () => {
    fc.assert(
      fc.property(anyCase(), fc.double({ min: 0, max: 60, noNaN: true }), (input, guardDb) => {
        const [a, b] = [readSweep(input), readSweep({ ...input, guardDb })];
        const strip = (reading: Reading) => ({
          lines: reading.lines.map(({ worst, basis, coverage }) => ({ worst, basis, coverage })),
          suspects: reading.suspects,
          remeasure: reading.remeasure,
        });
        expect(strip(b)).toEqual(strip(a));
        b.lines.forEach((line, i) => {
          const before = a.lines[i]!.standing;
          if (before === "over" || before === "undecided") expect(line.standing).toBe(before);
          else
            expect(line.standing).toBe(line.worst!.marginDb < guardDb ? "inside-guard" : "clear");
        });
      }),
      RUNS,
    );
  });

  test("a segment written as two that touch", () => {
    fc.assert(
      fc.property(anyCase(), fc.double({ min: 0.05, max: 0.95 }), (input, share) => {
        const cut = withLines(input, (list) => list.flatMap((s) => splitSegment(s, share)));
        sameReading(readSweep(input), readSweep(cut), { db: 1e-9, share: 0 });
      }),
      RUNS,
    );
  });
});

test("levels raised by x dB lower every margin by x, to the rounding of a float32", () => {
  fc.assert(
    fc.property(
      anyCase({ isOneDetector: true, isOneUnit: true }),
      fc.double({ min: -30, max: 30, noNaN: true }),
      (input, x) => {
        const raised = withTraces(input, (trace) => ({
          ...trace,
          levelsDb: trace.levelsDb.map((db) => db + x),
        }));
        const [before, after] = [readSweep(input), readSweep(raised)];
        before.lines.forEach((line, i) => {
          if (!line.worst) return expect(after.lines[i]?.worst).toBeNull();
          // Up to 128 dB a float32 is exact to 2^-18 = 3.8e-6 dB.
          const off = Math.abs(marginOf(after, i) - (line.worst.marginDb - x));
          expect(off).toBeLessThan(4e-6);
        });
      },
    ),
    RUNS,
  );
});

test("the worst of a line is the worst of one of its bands, each inside its own band", () => {
  fc.assert(
    fc.property(anyCase(), (input) => {
      for (const line of readSweep(input).lines) {
        const worsts = line.bands.flatMap((band) => (band.worst ? [band.worst] : []));
        if (line.worst) expect(worsts).toContainEqual(line.worst);
        else expect(worsts).toEqual([]);
        if (line.standing !== "over" && line.worst)
          for (const worst of worsts)
            expect(worst.marginDb).toBeGreaterThanOrEqual(line.worst.marginDb);
        for (const { startHz, stopHz, worst } of line.bands) {
          if (!worst) continue;
          expect(worst.frequencyHz).toBeGreaterThanOrEqual(startHz * (1 - 1e-12));
          expect(worst.frequencyHz).toBeLessThanOrEqual(stopHz * (1 + 1e-12));
        }
      }
    }),
    RUNS,
  );
});
