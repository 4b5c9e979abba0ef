import { expect, it } from "vitest";
import { formatFrequency, formatMargin } from "../../lib/core/units/format";
import { parseUnit } from "../../lib/core/units/parse-unit";

it("knows every spelling of a unit", () => {
  for (const text of ["dBuV/m", "dB\u00b5V/m", "dB\u03bcV/m", "dBuVPerMeter", "DBUV/M"])
    expect(parseUnit(text)).toBe("dBuV/m");
  for (const text of ["dBuV", "dB\u00b5V", "dB\u03bcV", "DBUV"])
    expect(parseUnit(text)).toBe("dBuV");
  expect(parseUnit("\u00b5V/m")).toBe("uV/m");
  expect(parseUnit("furlong")).toBeNull();
});

it("never hides on which side of the limit a margin lies", () => {
  expect(formatMargin(4.2)).toBe("+4.2 dB");
  expect(formatMargin(-0.04)).toBe("\u22120.04 dB");
  expect(formatMargin(-0)).toBe("+0.0 dB");
  expect(formatFrequency(1.5e9)).toBe("1.500 GHz");
  expect(formatFrequency(88.32e6)).toBe("88.32 MHz");
});
