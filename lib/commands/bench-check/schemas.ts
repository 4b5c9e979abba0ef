import { z } from "zod";
import { storable } from "../storable-text";
import { answersSchema, fileSchema } from "../sweep/schemas";

export const recordBenchCheckSchema = z.object({
  benchId: z.uuid("Choose a bench."),
  fileName: storable.trim().min(1, "The file has no name.").max(255),
  bytes: fileSchema,
  answers: answersSchema,
  /** Which trace of the file, from 0; null when it has only one. */
  traceIndex: z.int("Choose the trace.").min(0, "Choose the trace.").nullable(),
  source: storable
    .trim()
    .min(1, "Name the source, for instance the comb and its spacing.")
    .max(120, "Keep the source under 120 characters."),
  measuredOn: z.iso
    .date("Write the date as year-month-day, for example 2026-03-31.")
    .refine((day) => day >= "1950", "No check of this bench is older than 1950."),
  corrected: z.boolean(),
  rbwHz: z
    .number("State the resolution bandwidth: levels compare at one RBW only.")
    .positive("The resolution bandwidth must be above zero."),
  isReference: z.boolean(),
  notes: storable.trim().max(4000, "Keep the notes under 4,000 characters."),
});
export type RecordBenchCheckInput = z.infer<typeof recordBenchCheckSchema>;

export const benchCheckIdSchema = z.object({ checkId: z.uuid() });
