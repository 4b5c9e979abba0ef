import { z } from "zod";
import {
  CODINGS,
  PAYLOADS,
  SCRAMBLERS,
  SPREAD_DIRECTIONS,
  SPREAD_PROFILES,
} from "@/lib/core/link/link-settings";
import {
  BANDWIDTH_KINDS,
  DETECTORS,
  HOLDS,
  POLARIZATIONS,
  PORTS,
  SWEEP_PURPOSES,
  TRACE_KINDS,
} from "@/lib/core/sweep/settings";
import { LEVEL_UNITS, LINEAR_UNITS } from "@/lib/core/units/level-units";
import { storable } from "../storable-text";

const numberOrNull = (what: string) => z.number(`State ${what} as a number, or leave it empty.`);
const positive = (what: string) =>
  numberOrNull(what).positive(`${what[0]?.toUpperCase()}${what.slice(1)} must be above zero.`);

export const measurementSettingsSchema = z.object({
  rbwHz: positive("the resolution bandwidth").nullable(),
  rbwKind: z.enum(BANDWIDTH_KINDS).nullable(),
  vbwHz: positive("the video bandwidth").nullable(),
  sweepTimeS: positive("the sweep time").nullable(),
  attenuationDb: numberOrNull("the attenuation").min(0, "Attenuation is 0 dB or more.").nullable(),
  preamplifier: z.boolean().nullable(),
  referenceLevelDb: numberOrNull("the reference level").nullable(),
  polarization: z.enum(POLARIZATIONS).nullable(),
  conductor: storable.trim().max(60, "Keep it under 60 characters.").nullable().optional(),
  heightM: numberOrNull("the height").min(0, "The height is 0 m or more.").nullable(),
  azimuthDeg: numberOrNull("the azimuth")
    .min(-360, "An azimuth lies between −360° and 360°.")
    .max(360, "An azimuth lies between −360° and 360°.")
    .nullable(),
  distanceM: positive("the distance").nullable(),
  port: z.enum(PORTS, "Choose the port that was measured."),
});

const spreadSchema = z.object({
  depthPercent: positive("the spread's depth").max(20, "A spread above 20 % is no clock any more."),
  direction: z.enum(SPREAD_DIRECTIONS, "Choose the direction of the spread."),
  modulationHz: positive("the modulation rate"),
  profile: z.enum(SPREAD_PROFILES, "Choose the profile of the spread."),
});

export const linkSettingsSchema = z.object({
  bitRateHz: positive("the bit rate").nullable(),
  payload: z.enum(PAYLOADS).nullable(),
  patternBits: z
    .int("Pattern length is a whole number of bits.")
    .positive("Pattern length is at least one bit.")
    .nullable(),
  scrambler: z.enum(SCRAMBLERS).nullable(),
  scramblerPolynomial: storable.trim().max(120, "Keep it under 120 characters.").nullable(),
  scramblerRestartBits: z
    .int("The restart period is a whole number of bits.")
    .positive("The restart period is at least one bit.")
    .nullable(),
  coding: z.enum(CODINGS).nullable(),
  spread: spreadSchema.nullable(),
  spreadOff: z.boolean().nullable(),
  edgeTimeS: positive("the edge time").nullable(),
  cable: storable.trim().max(200, "Keep it under 200 characters.").nullable(),
});

const fileUnit = z.enum([...LEVEL_UNITS, ...LINEAR_UNITS]);

/** What a person answered about a file; the same shape as the reader of files takes. */
export const answersSchema = z.object({
  unit: fileUnit.optional(),
  detector: z.enum(DETECTORS).optional(),
  frequencyUnitHz: z.number().positive().optional(),
  hold: z.enum(HOLDS).optional(),
  kind: z.enum(TRACE_KINDS).optional(),
  decimal: z.enum([".", ","]).optional(),
  traces: z
    .array(
      z.object({
        column: z.int().min(0),
        name: storable.trim().max(80).optional(),
        unit: fileUnit.optional(),
        detector: z.enum(DETECTORS).optional(),
        hold: z.enum(HOLDS).optional(),
        use: z.boolean().optional(),
      }),
    )
    .max(64)
    .optional(),
});

export const MOST_FILE_BYTES = 60 * 1024 * 1024;

export const fileSchema = z
  .instanceof(Uint8Array, { message: "Choose a file." })
  .refine((bytes) => bytes.length > 0, "The file is empty.")
  .refine(
    (bytes) => bytes.length <= MOST_FILE_BYTES,
    "The file is larger than 60 MB. Export fewer traces or a narrower span.",
  );

const fileName = storable.trim().min(1, "The file has no name.").max(255);

export const previewFileSchema = z.object({
  fileName,
  bytes: fileSchema,
  answers: answersSchema,
});

export const importSweepSchema = z.object({
  buildId: z.uuid("Choose a build."),
  stepId: z.uuid("Choose a step.").nullable(),
  benchId: z.uuid("Choose the bench that it was measured on."),
  fileName,
  bytes: fileSchema,
  answers: answersSchema,
  name: storable
    .trim()
    .min(1, "Give the sweep a name.")
    .max(120, "Keep the name under 120 characters."),
  purpose: z.enum(SWEEP_PURPOSES, "Choose what the sweep shows."),
  measuredOn: z.iso
    .date("Write the date as year-month-day, for example 2026-03-31.")
    .refine((day) => day >= "1950", "No sweep of this product is older than 1950.")
    .nullable(),
  corrected: z.boolean(),
  settings: measurementSettingsSchema,
  link: linkSettingsSchema,
  notes: storable.trim().max(4000, "Keep the notes under 4,000 characters."),
  onRecord: z.boolean(),
  /** Import the same bytes once more on purpose. */
  again: z.boolean(),
});
export type ImportSweepInput = z.infer<typeof importSweepSchema>;

export const sweepIdSchema = z.object({ sweepId: z.uuid() });

export const setOnRecordSchema = z.object({ sweepId: z.uuid(), onRecord: z.boolean() });

export const recordStepSchema = z.object({ stepId: z.uuid() });
