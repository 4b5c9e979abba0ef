import { renderToStaticMarkup } from "react-dom/server";
import { describe, expect, it } from "vitest";
import { STANDINGS } from "@/lib/core/reading/reading";
import { prepareFactors } from "@/components/charts/prepare-factors";
import { StandingShape } from "@/components/charts/standing-shape";
import { TraceThumb } from "@/components/charts/trace-thumb";

const MARGIN = { top: 20, right: 10, bottom: 20, left: 40 };

describe("standing shapes", () => {
  it("differ in shape, not in colour alone", () => {
    const shapes = STANDINGS.map((standing) =>
      renderToStaticMarkup(<StandingShape standing={standing} />).replace(/var\(--[a-z-]+\)/g, ""),
    );
    expect(new Set(shapes).size).toBe(STANDINGS.length);
  });
});

describe("factors", () => {
  const transducer = (name: string, factors: [number, number][]) => ({
    name,
    kind: "cable" as const,
    calibratedOn: null,
    dueOn: null,
    factors: factors.map(([frequencyHz, factorDb]) => ({ frequencyHz, factorDb })),
  });

  it("span the frequencies of all transducers and always show zero", () => {
    const drawn = prepareFactors(
      [
        transducer("Cable", [
          [1e6, 2],
          [1e9, 8],
        ]),
        transducer("Antenna", [
          [30e6, 12],
          [3e9, 30],
        ]),
      ],
      800,
      240,
      MARGIN,
    );
    expect(drawn?.plane.view).toEqual({ fromHz: 1e6, toHz: 3e9 });
    expect(drawn?.plane.levels.fromDb).toBeLessThan(0);
    expect(drawn?.lines[0]?.style).not.toEqual(drawn?.lines[1]?.style);
    expect(drawn?.names.map((name) => name.name).sort()).toEqual(["Antenna", "Cable"]);
  });

  it("leave out what is still being typed", () => {
    const drawn = prepareFactors(
      [
        transducer("", [
          [1e9, 8],
          [Number.NaN, 3],
          [1e6, Number.NaN],
          [0, 1],
          [1e6, 2],
        ]),
      ],
      800,
      240,
      MARGIN,
    );
    expect(drawn?.lines[0]?.points.map((p) => p.frequencyHz)).toEqual([1e6, 1e9]);
    expect(drawn?.lines[0]?.name).toBe("Transducer 1");
    expect(prepareFactors([transducer("Cable", [])], 800, 240, MARGIN)).toBeNull();
    const one = prepareFactors([transducer("Cable", [[1e6, 2]])], 800, 240, MARGIN);
    expect(one?.plane.view.fromHz).toBeLessThan(1e6);
  });
});

describe("a thumbnail", () => {
  it("says when it has nothing to show", () => {
    expect(renderToStaticMarkup(<TraceThumb hz={[]} maxDb={[]} label="Trace 1" />)).toContain(
      'aria-label="Trace 1: no levels"',
    );
  });
});
