import { describe, expect, test } from "vitest";
import { harmonicsIn } from "@/components/sweeps/clock-harmonics";

describe("harmonicsIn", () => {
  const clock = { name: "Reference", frequencyHz: 25e6 };

  test("gives every harmonic in view, ends included, with its order", () => {
    expect(harmonicsIn([clock], { fromHz: 30e6, toHz: 100e6 })).toEqual([
      { hz: 50e6, label: "Reference × 2" },
      { hz: 75e6, label: "Reference × 3" },
      { hz: 100e6, label: "Reference × 4" },
    ]);
    expect(harmonicsIn([clock], { fromHz: 1, toHz: 25e6 })).toEqual([
      { hz: 25e6, label: "Reference" },
    ]);
    expect(harmonicsIn([clock], { fromHz: 26e6, toHz: 49e6 })).toEqual([]);
  });

  test("leaves out a clock whose harmonics would cover the edge", () => {
    const slow = { name: "Converter", frequencyHz: 2.1e6 };
    const marks = harmonicsIn([slow, clock], { fromHz: 30e6, toHz: 1e9 });
    expect(marks.every((mark) => mark.label.startsWith("Reference"))).toBe(true);
    expect(harmonicsIn([slow], { fromHz: 30e6, toHz: 60e6 }).length).toBe(14);
  });
});
