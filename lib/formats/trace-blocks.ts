import { crc32 } from "node:zlib";
import type { PyramidLevel } from "@/lib/core/sweep/pyramid";

/** Points of a trace in one block. */
export const BLOCK_POINTS = 65_536;

export interface Block {
  position: number;
  crc32: number;
  bytes: Buffer;
}

const BYTES = { level: 4, frequency: 8, pyramid: 12 } as const;

function toBlock(position: number, bytes: Buffer): Block {
  return { position, crc32: crc32(bytes), bytes };
}

/** Little-endian blocks of float32 levels or float64 frequencies. */
export function encodeNumbers(values: Float32Array | Float64Array): Block[] {
  const blocks: Block[] = [];
  for (let from = 0; from < values.length; from += BLOCK_POINTS) {
    const part = values.subarray(from, from + BLOCK_POINTS);
    const bytes = Buffer.from(part.buffer, part.byteOffset, part.byteLength);
    blocks.push(toBlock(blocks.length, bytes));
  }
  return blocks;
}

/** One block for a level of the pyramid: all minima, all maxima, then where the maxima are. */
export function encodePyramid({ minDb, maxDb, maxAt }: PyramidLevel): Block {
  const parts = [minDb, maxDb, maxAt].map((a) => Buffer.from(a.buffer, a.byteOffset, a.byteLength));
  return toBlock(0, Buffer.concat(parts));
}

/** Bytes on their own memory, so that typed arrays may look at them; refuses what rotted. */
function openBlock(block: Pick<Block, "crc32" | "bytes">): ArrayBuffer {
  if (crc32(block.bytes) !== block.crc32) {
    throw new Error("A block of a trace does not match its checksum.");
  }
  return new Uint8Array(block.bytes).buffer;
}

export function decodeLevels(blocks: Pick<Block, "crc32" | "bytes">[]): Float32Array {
  const total = blocks.reduce((sum, block) => sum + block.bytes.length / BYTES.level, 0);
  const levels = new Float32Array(total);
  let at = 0;
  for (const block of blocks) {
    const part = new Float32Array(openBlock(block));
    levels.set(part, at);
    at += part.length;
  }
  return levels;
}

export function decodeFrequencies(blocks: Pick<Block, "crc32" | "bytes">[]): Float64Array {
  const total = blocks.reduce((sum, block) => sum + block.bytes.length / BYTES.frequency, 0);
  const frequencies = new Float64Array(total);
  let at = 0;
  for (const block of blocks) {
    const part = new Float64Array(openBlock(block));
    frequencies.set(part, at);
    at += part.length;
  }
  return frequencies;
}

export function decodePyramid(
  block: Pick<Block, "crc32" | "bytes">,
  samplesPerEntry: number,
): PyramidLevel {
  const memory = openBlock(block);
  const count = memory.byteLength / BYTES.pyramid;
  return {
    samplesPerEntry,
    minDb: new Float32Array(memory, 0, count),
    maxDb: new Float32Array(memory, 4 * count, count),
    maxAt: new Uint32Array(memory, 8 * count, count),
  };
}
