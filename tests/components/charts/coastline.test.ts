import { describe, expect, it } from "vitest";
import { limitAt } from "@/lib/core/mask/limit-at";
import { DETECTORS } from "@/lib/core/sweep/settings";
import {
  DETECTOR_DASHES,
  drawableLines,
  linePieces,
  lowestLine,
} from "@/components/charts/coast-lines";
import { limitsWithin, prepareCoastline } from "@/components/charts/prepare-coastline";
import { prepareMask } from "@/components/charts/prepare-mask";
import { planeOf, pointsOf, readMask } from "./fixtures";

const mains = readMask("cispr-32-mains-class-b");
const MARGIN = { top: 20, right: 10, bottom: 20, left: 40 };
const segment = {
  startHz: 1e6,
  stopHz: 2e6,
  startDb: 40,
  stopDb: 40,
  interpolation: "log" as const,
};

describe("mask lines", () => {
  it("have a style of their own for every detector", () => {
    expect(new Set(DETECTORS.map((detector) => DETECTOR_DASHES[detector])).size).toBe(
      DETECTORS.length,
    );
  });

  it("are drawn without the segments that are still being typed", () => {
    const typed = [
      segment,
      { ...segment, startHz: Number.NaN },
      { ...segment, startDb: Number.NaN },
      { ...segment, stopHz: 1e6 },
      { ...segment, startHz: 0 },
    ];
    const line = { ...mains.lines[0]!, segments: typed };
    expect(drawableLines({ ...mains, lines: [line] })[0]?.segments).toEqual([segment]);
    expect(drawableLines({ ...mains, lines: [{ ...line, segments: [] }] })).toEqual([]);
  });

  it.each(["log", "linear"] as const)(
    "hold the mask's own limits at every drawn point, %s",
    (scale) => {
      const view = { fromHz: 150e3, toHz: 30e6 };
      for (const line of mains.lines) {
        const points = linePieces(line, view, scale).flat();
        expect(points.length).toBeGreaterThan(3);
        for (const { hz, db } of points) {
          const limits = line.segments
            .filter((s) => s.startHz <= hz && s.stopHz >= hz)
            .map((s) => limitAt({ ...line, segments: [s] }, hz) ?? Number.NaN);
          const nearest = Math.min(...limits.map((limit) => Math.abs(limit - db)));
          expect(nearest).toBeLessThan(1e-9);
        }
      }
    },
  );

  it("follow the curve that a line straight in log f makes on a linear axis", () => {
    const view = { fromHz: 150e3, toHz: 1e6 };
    const plane = planeOf(view, "linear");
    const line = mains.lines[0]!;
    const points = linePieces(line, view, "linear").flat();
    const middle = 325e3;
    const after = points.findIndex((point) => point.hz >= middle);
    const [a, b] = [points[after - 1]!, points[after]!];
    const drawn = a.db + ((b.db - a.db) * (middle - a.hz)) / (b.hz - a.hz);
    expect(Math.abs(plane.yOf(drawn) - plane.yOf(limitAt(line, middle) ?? 0))).toBeLessThan(0.25);
  });

  it("merge into one coast at the lowest limit", () => {
    const lowest = lowestLine(mains.lines);
    for (const hz of [150e3, 300e3, 1e6, 5e6, 10e6]) {
      const own = mains.lines.map((line) => limitAt(line, hz) ?? Number.POSITIVE_INFINITY);
      expect(lowest && limitAt(lowest, hz)).toBe(Math.min(...own));
    }
  });
});

describe("the coastline", () => {
  it("puts land above the lowest limit and writes every name once", () => {
    const plane = planeOf({ fromHz: 150e3, toHz: 30e6 });
    const coast = prepareCoastline(mains, plane);
    const ys = pointsOf(coast.land).map((point) => point.y);
    expect(Math.max(...ys)).toBeCloseTo(plane.yOf(46), 1);
    expect(Math.min(...ys)).toBe(plane.top);
    expect([...coast.names.map((name) => name.name), ...coast.unplaced].sort()).toEqual([
      "Average",
      "Quasi-peak",
    ]);
  });

  it("leaves open water between bands without a limit", () => {
    const plane = planeOf({ fromHz: 150e3, toHz: 30e6 });
    const coast = prepareCoastline(readMask("cispr-25-component-class-3"), plane);
    const between = plane.xOf(400e3);
    const bands = coast.land.split("M").slice(1).map(pointsOf);
    expect(bands).toHaveLength(4);
    for (const band of bands) {
      const xs = [Number(band[0]?.x), ...band.map((point) => point.x)];
      expect(Math.min(...xs) < between && Math.max(...xs) > between).toBe(false);
    }
  });

  it("knows the land of one detector apart from that of the others", () => {
    const coast = prepareCoastline(mains, planeOf({ fromHz: 150e3, toHz: 30e6 }));
    const deepest = (path: string) => Math.max(...pointsOf(path).map((point) => point.y));
    expect(deepest(coast.landOf("quasi-peak"))).toBeLessThan(deepest(coast.landOf("average")));
    expect(coast.landOf("peak")).toBe("");
  });

  it("collects the limits that an axis has to hold", () => {
    const limits = limitsWithin(mains, 150e3, 30e6);
    expect([Math.min(...limits), Math.max(...limits)]).toEqual([46, 66]);
    expect(limitsWithin(mains, 40e6, 50e6)).toEqual([]);
  });
});

describe("a mask that is being typed", () => {
  it("is drawn as far as it is whole", () => {
    const half = { ...segment, stopHz: Number.NaN };
    const line = { ...mains.lines[0]!, name: "", segments: [segment, half] };
    const drawn = prepareMask({ ...mains, title: "", lines: [line] }, 600, 280, MARGIN);
    expect(drawn?.coastline.lines).toHaveLength(1);
    expect(drawn?.coastline.land).not.toContain("NaN");
    expect(drawn?.summary).toContain("a line without a name from 1.000 MHz to 2.000 MHz");
  });

  it("is not drawn before its first whole segment", () => {
    expect(prepareMask({ ...mains, lines: [] }, 600, 280, MARGIN)).toBeNull();
  });
});
