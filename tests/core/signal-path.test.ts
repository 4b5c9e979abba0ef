import { expect, it } from "vitest";
import { applySignalPath } from "../../lib/core/bench/apply-signal-path";
import type { SignalPath } from "../../lib/core/bench/signal-path";
import type { Trace } from "../../lib/core/sweep/trace";

it("adds the antenna factor of a published example, and nothing outside the table", () => {
  const path: SignalPath = {
    version: 1,
    impedanceOhm: 50,
    transducers: [
      {
        name: "antenna",
        kind: "antenna",
        calibratedOn: null,
        dueOn: null,
        factors: [
          { frequencyHz: 100e6, factorDb: 7.4 },
          { frequencyHz: 200e6, factorDb: 7.4 },
        ],
      },
    ],
  };
  const trace: Trace = {
    name: "t",
    kind: "scan",
    detector: "peak",
    hold: "none",
    unit: "dBuV",
    axis: { kind: "listed", frequenciesHz: Float64Array.of(144.68e6, 300e6) },
    levelsDb: Float32Array.of(34.98, 34.98),
  };
  const field = applySignalPath(trace, path);
  expect(field?.unit).toBe("dBuV/m");
  // Read: 34.98 dBµV + 7.4 dB/m = 42.38 dBµV/m at 144.68 MHz.
  expect(field?.levelsDb[0]).toBeCloseTo(42.38, 4);
  expect(field?.levelsDb[1]).toBeNaN();
  expect(applySignalPath({ ...trace, unit: "dBuA/m" }, path)).toBeNull();
});
