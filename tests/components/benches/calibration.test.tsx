import { renderToStaticMarkup } from "react-dom/server";
import { describe, expect, test } from "vitest";
import { calibrationAnswer, calibrationState } from "@/components/benches/calibration";
import { BenchCautions } from "@/components/benches/bench-cautions";
import { SignalPathTable } from "@/components/benches/signal-path-table";
import type { SignalPath, Transducer } from "@/lib/core/bench/signal-path";

const bench = (transducers: number, overdue: number, undated: number) => ({
  transducers,
  overdue,
  undated,
});

describe("calibrations", () => {
  test("hold on their due date, lapse the day after, and are unknown without one", () => {
    expect(calibrationState("2026-06-30", "2026-06-30")).toBe("in-date");
    expect(calibrationState("2026-06-30", "2026-07-01")).toBe("overdue");
    expect(calibrationState(null, "2026-07-01")).toBe("undated");
  });

  test("a bench without transducers or without a due date is not counted as in date", () => {
    expect(
      calibrationAnswer([bench(2, 0, 0), bench(2, 1, 1), bench(1, 0, 1), bench(0, 0, 0)]),
    ).toEqual({
      number: "1 of 4",
      words: "benches have their calibrations in date.",
      rest: "1 has a calibration overdue; 1 has a transducer without a due date; 1 has no transducers yet.",
    });
  });
});

test("the path's table says overdue in words, and not stated where nothing is known", () => {
  const cable: Transducer = {
    name: "Cable",
    kind: "cable",
    calibratedOn: null,
    dueOn: "2026-01-01",
    factors: [
      { frequencyHz: 150e3, factorDb: 0.1 },
      { frequencyHz: 1e9, factorDb: 2.1 },
    ],
  };
  const path: SignalPath = { version: 1, impedanceOhm: 50, transducers: [cable] };
  const html = renderToStaticMarkup(<SignalPathTable path={path} today="2026-12-01" />);
  expect(html).toContain("overdue");
  expect(html).toContain("not stated");
  expect(html).toContain("150.0 kHz to 1.000 GHz");
  const earlier = renderToStaticMarkup(<SignalPathTable path={path} today="2026-01-01" />);
  expect(earlier).not.toContain("overdue");
});

test("the mains caution stands exactly where a LISN is in the path", () => {
  expect(renderToStaticMarkup(<BenchCautions kinds={["lisn"]} />)).toContain("protective");
  const without = renderToStaticMarkup(<BenchCautions kinds={["antenna"]} />);
  expect(without).not.toContain("protective");
  expect(without).toContain("DC block");
});
