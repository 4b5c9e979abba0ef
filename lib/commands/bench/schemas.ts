import { z } from "zod";
import { TRANSDUCER_KINDS } from "@/lib/core/bench/signal-path";
import { storable } from "../storable-text";

const benchFields = {
  name: storable.trim().min(1, "Give it a name.").max(80, "Keep the name under 80 characters."),
  site: storable.trim().max(200, "Keep the site under 200 characters."),
  instrument: storable.trim().max(200, "Keep the instrument under 200 characters."),
  distanceM: z
    .number("Write the distance in metres as a number, or leave it empty.")
    .positive("The distance must be above 0 m.")
    .max(1000, "A distance above 1,000 m is no bench.")
    .nullable(),
  guardDb: z
    .number("State the guard in dB; 0 means that there is none.")
    .min(0, "The guard cannot lie below 0 dB.")
    .max(40, "A guard above 40 dB leaves no margin to read."),
  notes: storable.trim().max(4000, "Keep the notes under 4,000 characters."),
};

const impedanceOhm = z
  .number("State the impedance of the instrument's input in Ω.")
  .positive("The impedance must be above 0 Ω.")
  .max(1e6, "An impedance above 1 MΩ is no measuring input.");

const benchId = z.uuid("Choose a bench.");

export const createBenchSchema = z.object({ ...benchFields, impedanceOhm });

export const editBenchSchema = z.object({ benchId, ...benchFields });

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
