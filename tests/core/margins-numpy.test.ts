import { expect, test } from "vitest";
import { readSweep, type ReadSweepInput } from "../../lib/core/reading/read-sweep";
import { hasNumpy, runPython } from "../support/numpy";
import { randomFrom } from "../support/traces";
import { makeMarginCase } from "./margins-cases";

/** numpy.interp over log10 f or f, the lowest segment, the lowest margin of the traces given. */
const SCRIPT = `
import json, sys
import numpy as np
out = []
# What 0 dB of a unit is in the mask's, from volts, ohms and free space.
def offset(unit, ohm):
    return {
        "dBm": 20 * np.log10(np.sqrt(1e-3 * ohm) * 1e6),
        "dBmV": 60.0,
        "dBuA/m": 20 * np.log10(376.730313668),
    }[unit]
for case in json.load(sys.stdin):
    worst = []
    for line in case["lines"]:
        low = np.inf
        for trace in line["traces"]:
            hz = np.array(trace["hz"])
            db = np.array(trace["db"], dtype=np.float32)
            if trace["unit"] != case["unit"]:
                db = (db.astype(float) + offset(trace["unit"], case["ohm"])).astype(np.float32)
            db = db.astype(float)
            limit = np.full(hz.shape, np.inf)
            for s in line["segments"]:
                f = np.log10 if s["interpolation"] == "log" else np.asarray
                ends = f(np.array([s["startHz"], s["stopHz"]]))
                part = np.interp(f(hz), ends, [s["startDb"], s["stopDb"]])
                inside = (hz >= s["startHz"]) & (hz <= s["stopHz"])
                limit = np.where(inside, np.minimum(limit, part), limit)
            margin = limit - db
            margin = margin[np.isfinite(margin)]
            if margin.size:
                low = min(low, float(margin.min()))
        worst.append(None if low == np.inf else low)
    out.append(worst)
print(json.dumps(out))
`;

/** What decides like for like: traces of the line's own detector with no hold. */
function forPython(input: ReadSweepInput) {
  const lines = input.mask.lines.map((line) => ({
    segments: line.segments,
    traces: input.traces
      .filter((trace) => trace.detector === line.detector)
      .map((trace) => ({
        hz: Array.from(trace.levelsDb, (_, i) =>
          trace.axis.kind === "regular"
            ? trace.axis.startHz + i * trace.axis.stepHz
            : trace.axis.frequenciesHz[i],
        ),
        db: Array.from(trace.levelsDb, (db) => (Number.isNaN(db) ? null : db)),
        unit: trace.unit,
      })),
  }));
  return { lines, unit: input.mask.unit, ohm: input.impedanceOhm };
}

test.skipIf(!hasNumpy)("numpy finds the same worst margins in 200 random sweeps", () => {
  const random = randomFrom(77);
  const inputs = Array.from({ length: 200 }, () => {
    const input = makeMarginCase(random);
    // One detector for all, so that no bound is in play and numpy needs no rule of Neap's.
    const detector = input.mask.lines[0]?.detector ?? "peak";
    const traces = input.traces.map((trace) => ({ ...trace, detector, hold: "none" as const }));
    const lines = input.mask.lines.map((line) => ({ ...line, detector }));
    return { ...input, traces, mask: { ...input.mask, lines } };
  });
  const expected = runPython<(number | null)[][]>(SCRIPT, inputs.map(forPython));
  let compared = 0;
  inputs.forEach((input, i) => {
    readSweep(input).lines.forEach((line, k) => {
      const margin = expected[i]?.[k] ?? null;
      if (margin === null) {
        expect(line.worst, `sweep ${i}, line ${k + 1}`).toBeNull();
        return;
      }
      compared += 1;
      const found = line.worst?.marginDb ?? NaN;
      expect(Math.abs(found - margin), `sweep ${i}, line ${k + 1}`).toBeLessThan(1e-6);
    });
  });
  expect(compared).toBeGreaterThan(200);
});
