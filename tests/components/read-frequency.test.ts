import { describe, expect, test } from "vitest";
import { readFrequency, writeFrequency } from "@/components/programs/read-frequency";

describe("a typed frequency", () => {
  test.each([
    ["27 MHz", 27_000_000],
    ["148,5mhz", 148_500_000],
    [" 26.9997 MHz ", 26_999_700],
    ["3.2 GHz", 3_200_000_000],
    ["32768 Hz", 32_768],
    ["32.768 kHz", 32_768],
  ])("%s is read to the last digit", (text, frequencyHz) => {
    expect(readFrequency(text)).toBe(frequencyHz);
  });

  test.each(["", "27", "MHz", "27 MW", "1,000.5 MHz", "-3 MHz", "27 MHz or so"])(
    "%j is none, so that no unit and no sign is guessed",
    (text) => {
      expect(readFrequency(text)).toBeNaN();
    },
  );

  test.each([
    [27_000_000, "27 MHz"],
    [148_351_648, "148.351648 MHz"],
    [3_200_000_000, "3.2 GHz"],
    [32_768, "32.768 kHz"],
    [50, "50 Hz"],
    [0.5, "0.5 Hz"],
  ])("%d Hz is written so that reading gives it back", (frequencyHz, text) => {
    expect(writeFrequency(frequencyHz)).toBe(text);
    expect(readFrequency(text)).toBe(frequencyHz);
  });
});
