import type { Mask } from "../mask/mask";
import { prepareParts } from "./prepare-parts";
import { readPrepared } from "./read-together";
import type { Reading } from "./reading";
import type { SweepPart } from "./sweep-part";

export interface ReadSweepInput extends SweepPart {
  mask: Mask;
  /** Least prominence in dB of a suspect; 6 when left out. */
  suspectProminenceDb?: number;
  /** How far in dB under the line a suspect is still worth following; 20 when left out. */
  suspectMarginDb?: number;
}

/** Holds one sweep against a mask: margins, standing, coverage, suspects and doubts, in dB and Hz. */
export function readSweep(input: ReadSweepInput): Reading {
  const { mask, suspectProminenceDb = 6, suspectMarginDb = 20, ...part } = input;
  return readPrepared(prepareParts([part]), mask, {
    prominenceDb: suspectProminenceDb,
    marginDb: suspectMarginDb,
  });
}
