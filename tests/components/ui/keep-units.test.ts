import { expect, test } from "vitest";
import { keepUnits } from "@/components/ui/keep-units";

test("a number keeps its unit on its line, and nothing else is bound", () => {
  expect(keepUnits("CISPR 25 component class 5, 1 m")).toBe("CISPR 25 component class 5, 1\u00a0m");
  expect(keepUnits("30 MHz to 1 GHz, 24 dBµV/m")).toBe("30\u00a0MHz to 1\u00a0GHz, 24\u00a0dBµV/m");
  expect(keepUnits("input of 50 Ω, 3.2 Gb/s, 6 dB")).toBe(
    "input of 50\u00a0Ω, 3.2\u00a0Gb/s, 6\u00a0dB",
  );
  expect(keepUnits("step 4 more, 2 masks, G3 mains")).toBe("step 4 more, 2 masks, G3 mains");
});
