import { expect, test } from "vitest";
import { buildPyramid } from "@/lib/core/sweep/pyramid";
import {
  BLOCK_POINTS,
  decodeFrequencies,
  decodeLevels,
  decodePyramid,
  encodeNumbers,
  encodePyramid,
} from "@/lib/formats/trace-blocks";
import { randomFrom } from "../support/traces";

function randomLevels(count: number): Float32Array {
  const random = randomFrom(count);
  return Float32Array.from({ length: count }, (_, i) => (i % 97 === 5 ? NaN : random() * 90 - 20));
}

test.each([0, 1, BLOCK_POINTS - 1, BLOCK_POINTS, BLOCK_POINTS + 1, 200_000])(
  "%i levels come back as they were, gaps included, in blocks of 65,536",
  (count) => {
    const levels = randomLevels(count);
    const blocks = encodeNumbers(levels);
    expect(blocks.map((block) => block.position)).toEqual([...blocks.keys()]);
    expect(blocks).toHaveLength(Math.ceil(count / BLOCK_POINTS));
    const back = decodeLevels(blocks);
    expect(back).toHaveLength(count);
    expect(Buffer.compare(Buffer.from(back.buffer), Buffer.from(levels.buffer))).toBe(0);
  },
);

test("frequencies keep every bit of their float64", () => {
  const frequencies = Float64Array.from({ length: 70_000 }, (_, i) => 9e3 * 1.0002 ** i);
  expect(decodeFrequencies(encodeNumbers(frequencies))).toEqual(frequencies);
});

test("a part of a larger array is stored without its neighbours", () => {
  const whole = Float32Array.of(1, 2, 3, 4, 5);
  expect(decodeLevels(encodeNumbers(whole.subarray(1, 4)))).toEqual(Float32Array.of(2, 3, 4));
});

test("levels are little-endian float32, for whoever reads the database without this program", () => {
  const [block] = encodeNumbers(Float32Array.of(1, -2.5));
  // IEEE 754: 1 is 3f800000 and -2.5 is c0200000.
  expect(block?.bytes.toString("hex")).toBe("0000803f000020c0");
});

test("blocks that lie anywhere in memory can be read", () => {
  const [block] = encodeNumbers(Float32Array.of(4, 5, 6));
  const shifted = Buffer.concat([Buffer.of(0), block?.bytes ?? Buffer.of()]).subarray(1);
  const read = decodeLevels([{ crc32: block?.crc32 ?? 0, bytes: shifted }]);
  expect(read).toEqual(Float32Array.of(4, 5, 6));
});

test("every level of a pyramid comes back as it was", () => {
  const pyramid = buildPyramid(randomLevels(100_000));
  expect(pyramid.length).toBeGreaterThan(1);
  for (const level of pyramid) {
    expect(decodePyramid(encodePyramid(level), level.samplesPerEntry)).toEqual(level);
  }
});

test.each(["levels", "frequencies", "pyramid"])("one flipped bit in %s is refused", (kind) => {
  const levels = randomLevels(10_000);
  const [sound] =
    kind === "levels"
      ? encodeNumbers(levels)
      : kind === "frequencies"
        ? encodeNumbers(Float64Array.from(levels))
        : buildPyramid(levels).map(encodePyramid);
  if (!sound) throw new Error("No block to spoil.");
  const decode = (bytes: Buffer) => {
    const block = { crc32: sound.crc32, bytes };
    if (kind === "levels") return decodeLevels([block]);
    return kind === "frequencies" ? decodeFrequencies([block]) : decodePyramid(block, 16);
  };
  expect(() => decode(sound.bytes)).not.toThrow();
  for (const at of [0, sound.bytes.length >> 1, sound.bytes.length - 1]) {
    const spoiled = Buffer.from(sound.bytes);
    spoiled[at] = (spoiled[at] ?? 0) ^ 0x10;
    expect(() => decode(spoiled)).toThrow("checksum");
  }
  expect(() => decode(sound.bytes.subarray(0, -4))).toThrow("checksum");
});
