import { z } from "zod";

const name = z
  .string()
  .trim()
  .min(1, "Give it a name.")
  .max(80, "Keep the name under 80 characters.");

/** Dates of the form 2026-03-31 that exist in the calendar. */
const isoDate = z.iso.date("Write the date as year-month-day, for example 2026-03-31.");

export const createProgramSchema = z.object({
  name,
  description: z.string().trim().max(2000, "Keep the description under 2,000 characters."),
  targetMarginDb: z
    .number("State the target margin in dB.")
    .min(-40, "A target margin below −40 dB is no target.")
    .max(40, "A target margin above 40 dB cannot be read off a bench."),
});

export const createBuildSchema = z.object({
  programId: z.uuid("Choose a program."),
  name,
  builtOn: isoDate.nullable(),
  notes: z.string().trim().max(4000, "Keep the notes under 4,000 characters."),
});
