import { z } from "zod";
import { storable } from "../storable-text";

const name = storable
  .trim()
  .min(1, "Give it a name.")
  .max(80, "Keep the name under 80 characters.");

/** Dates of the form 2026-03-31 that exist in the calendar. */
const isoDate = z.iso
  .date("Write the date as year-month-day, for example 2026-03-31.")
  .refine((day) => day >= "1950", "A date before 1950 is a slip of the keys.");

const targetMarginDb = z
  .number("State the target margin in dB.")
  .min(-40, "A target margin below −40 dB is no target.")
  .max(40, "A target margin above 40 dB cannot be read off a bench.");

const programId = z.uuid("Choose a program.");
const buildId = z.uuid("Choose a build.");

export const createProgramSchema = z.object({
  name,
  description: storable.trim().max(2000, "Keep the description under 2,000 characters."),
  targetMarginDb,
});

export const createBuildSchema = z.object({
  programId,
  name,
  builtOn: isoDate.nullable(),
  notes: storable.trim().max(4000, "Keep the notes under 4,000 characters."),
});

export const programRefSchema = z.object({ programId });
export const buildRefSchema = z.object({ buildId });

export const editProgramSchema = createProgramSchema.extend({ programId });
export const editBuildSchema = createBuildSchema.omit({ programId: true }).extend({ buildId });

export const setProgramMasksSchema = z.object({
  programId,
  maskIds: z.array(z.uuid("Choose a mask of the list.")).max(200, "Choose at most 200 masks."),
});

/** One message at the second of two rows that carry the same name. */
function refuseTwins(rows: { name: string }[], context: z.RefinementCtx, list: string): void {
  const seen = new Set<string>();
  rows.forEach((row, index) => {
    const key = row.name.toLowerCase();
    if (seen.has(key)) {
      const path = [list, index, "name"];
      context.addIssue({ code: "custom", path, message: "Another row has this name." });
    }
    seen.add(key);
  });
}

export const setMilestonesSchema = z
  .object({
    programId,
    milestones: z
      .array(
        z.object({
          name,
          dueOn: isoDate,
          /** null: the program's target counts. */
          requiredMarginDb: z
            .number("State the required margin in dB, or leave it empty.")
            .min(-40, "A required margin below −40 dB requires nothing.")
            .max(40, "A required margin above 40 dB cannot be read off a bench.")
            .nullable(),
        }),
      )
      .max(50, "Keep at most 50 milestones."),
  })
  .superRefine((values, context) => refuseTwins(values.milestones, context, "milestones"));

export const setClocksSchema = z
  .object({
    buildId,
    clocks: z
      .array(
        z.object({
          name,
          frequencyHz: z
            .number("State the frequency with its unit, for example 27 MHz.")
            .positive("A clock has a frequency above 0 Hz.")
            .max(1e12, "A clock above 1 THz is no clock."),
          tolerancePpm: z
            .number("State the tolerance in ppm, or leave it empty.")
            .min(0, "A tolerance is 0 ppm or more.")
            .max(100_000, "A tolerance above 100,000 ppm is no tolerance.")
            .nullable(),
        }),
      )
      .max(64, "Keep at most 64 clocks."),
  })
  .superRefine((values, context) => refuseTwins(values.clocks, context, "clocks"));

export const setDistanceRestatingSchema = z.object({
  programId: z.uuid("Choose a program."),
  maskId: z.uuid("Choose a mask of the program."),
  restate: z.boolean(),
});
