import { z } from "zod";
import { MAX_GUARD_DB } from "@/lib/core/bench/guard";
import { TRANSDUCER_KINDS } from "@/lib/core/bench/signal-path";
import {
  DISTRIBUTIONS,
  GUARD_RULES,
  REFERENCE_UNCERTAINTIES,
} from "@/lib/core/bench/uncertainty-budget";
import { storable } from "../storable-text";

const guardDb = z
  .number("State the guard in dB; 0 means that there is none.")
  .min(0, "The guard cannot lie below 0 dB.")
  .max(MAX_GUARD_DB, `A guard above ${MAX_GUARD_DB} dB leaves no margin to read.`);

const checkToleranceDb = z
  .number("State the drift that a bench check may show, in dB.")
  .positive("The drift allowed must be above 0 dB.")
  .max(20, "A drift above 20 dB is no tolerance.");

const benchFields = {
  name: storable.trim().min(1, "Give it a name.").max(80, "Keep the name under 80 characters."),
  site: storable.trim().max(200, "Keep the site under 200 characters."),
  instrument: storable.trim().max(200, "Keep the instrument under 200 characters."),
  distanceM: z
    .number("Write the distance in metres as a number, or leave it empty.")
    .positive("The distance must be above 0 m.")
    .max(1000, "A distance above 1,000 m is no bench.")
    .nullable(),
  notes: storable.trim().max(4000, "Keep the notes under 4,000 characters."),
  /** The instrument as a piece of equipment; null: none is named. */
  instrumentId: z.uuid("Choose an instrument.").nullable(),
  checkToleranceDb,
};

const impedanceOhm = z
  .number("State the impedance of the instrument's input in Ω.")
  .positive("The impedance must be above 0 Ω.")
  .max(1e6, "An impedance above 1 MΩ is no measuring input.");

const benchId = z.uuid("Choose a bench.");

/** Drift that an ordinary check shows; common practice, no source. */
const COMMON_TOLERANCE_DB = 2;

export const createBenchSchema = z.object({
  ...benchFields,
  instrumentId: benchFields.instrumentId.default(null),
  checkToleranceDb: checkToleranceDb.default(COMMON_TOLERANCE_DB),
  guardDb,
  impedanceOhm,
});

/** What is left out stays as it is. */
export const editBenchSchema = z.object({
  benchId,
  ...benchFields,
  instrumentId: benchFields.instrumentId.optional(),
  checkToleranceDb: checkToleranceDb.optional(),
  guardDb: guardDb.optional(),
});

export const setGuardRuleSchema = z
  .object({
    benchId,
    guardRule: z.enum(GUARD_RULES, "Choose where the guard comes from."),
    /** What counts when the rule is "stated". */
    guardDb: guardDb.nullable(),
  })
  .refine(({ guardRule, guardDb: db }) => guardRule !== "stated" || db !== null, {
    path: ["guardDb"],
    message: "State the guard in dB; 0 means that there is none.",
  });

/** A number, or what a field held instead: the core says at which field that is a problem. */
const typedNumber = z
  .number()
  .or(z.nan())
  .or(z.literal([Infinity, -Infinity]))
  .nullable();

export const reviseBudgetSchema = z.object({
  benchId,
  /** The revision the editor started from, 0 for none; refused when a newer one came in between. */
  basedOnRevision: z.number().int().optional(),
  title: storable.trim().max(120, "Keep the title under 120 characters."),
  lines: z
    .array(
      z.object({
        name: storable.trim().max(120, "Keep the name under 120 characters."),
        value: typedNumber,
        distribution: z.enum(DISTRIBUTIONS, "Choose how the value is distributed.").nullable(),
        sensitivity: typedNumber,
        degreesOfFreedom: typedNumber,
        observations: typedNumber,
      }),
    )
    .max(60, "A budget holds at most 60 lines."),
  reference: z.enum(REFERENCE_UNCERTAINTIES, "Choose a measurement of the list.").nullable(),
});

export const benchIdSchema = z.object({ benchId });

const MAX_TABLE_TEXT = 500_000;
export const MAX_FACTOR_ROWS = 10_000;
export const TOO_MANY_ROWS = "A factor table holds at most 10,000 rows.";

/** Text of a factor table as typed, pasted or read from a file, with the unit its header lacks. */
export const factorTableSchema = z.object({
  text: z.string().max(MAX_TABLE_TEXT, "This table is too long: keep it under 500,000 characters."),
  frequencyUnitHz: z.number().positive().nullable(),
});

/** A transducer brings its factors as numbers or as the text of a table, never both. */
const transducerSchema = z
  .object({
    name: storable.trim().max(120, "Keep the name under 120 characters."),
    kind: z.enum(TRANSDUCER_KINDS, "Choose what this is."),
    calibratedOn: z.string().max(40).nullable(),
    dueOn: z.string().max(40).nullable(),
    equipmentId: z.uuid("Choose a piece of equipment.").nullable().optional(),
    factors: z
      .array(z.object({ frequencyHz: z.number(), factorDb: z.number() }))
      .max(MAX_FACTOR_ROWS, TOO_MANY_ROWS)
      .optional(),
    table: factorTableSchema.optional(),
  })
  .refine((t) => (t.factors === undefined) !== (t.table === undefined), {
    path: ["factors"],
    message: "Give the factors as numbers or as a table.",
  });

export const reviseSignalPathSchema = z.object({
  benchId,
  /** The revision the editor started from; refused when a newer one came in between. */
  basedOnRevision: z.number().int().optional(),
  impedanceOhm,
  transducers: z.array(transducerSchema).max(40, "A signal path holds at most 40 transducers."),
});
export type ReviseSignalPathValues = z.infer<typeof reviseSignalPathSchema>;
