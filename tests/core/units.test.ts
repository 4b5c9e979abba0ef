import { expect, it } from "vitest";
import { convertLevel, eirpFromField, fieldFromEirp } from "../../lib/core/units/convert-level";
import { formatFrequency, formatMargin } from "../../lib/core/units/format";
import { parseUnit } from "../../lib/core/units/parse-unit";

it("converts levels as published", () => {
  expect(convertLevel(0, "dBm", "dBuV")).toBeCloseTo(106.9897, 4);
  expect(convertLevel(0, "dBm", "dBuV", 75)).toBeCloseTo(108.7506, 4);
  expect(convertLevel(0, "dBuV", "dBuA")).toBeCloseTo(-33.979, 3);
  expect(convertLevel(0, "dBuV/m", "dBuA/m")).toBeCloseTo(-51.52, 2);
  expect(convertLevel(0, "dBuA/m", "dBpT")).toBeCloseTo(1.984, 3);
  expect(convertLevel(0, "dBuV", "dBuV/m")).toBeNull();
  expect(fieldFromEirp(-10, 3)).toBeCloseTo(85.2, 1);
  expect(eirpFromField(54, 3)).toBeCloseTo(-41.2, 1);
});

it("knows every spelling of a unit", () => {
  for (const text of ["dBuV/m", "dB\u00b5V/m", "dB\u03bcV/m", "dBuVPerMeter", "DBUV/M"])
    expect(parseUnit(text)).toBe("dBuV/m");
  expect(parseUnit("furlong")).toBeNull();
});

it("never hides on which side of the limit a margin lies", () => {
  expect(formatMargin(4.2)).toBe("+4.2 dB");
  expect(formatMargin(-0.04)).toBe("\u22120.04 dB");
  expect(formatMargin(-0)).toBe("+0.0 dB");
  expect(formatFrequency(1.5e9)).toBe("1.500 GHz");
  expect(formatFrequency(88.32e6)).toBe("88.32 MHz");
});
