import { z } from "zod";
import { MISMATCH_FIELDS } from "@/lib/core/delta/delta";
import { storable } from "../storable-text";

export const acceptMismatchSchema = z.object({
  beforeSweepId: z.uuid(),
  afterSweepId: z.uuid(),
  /** What the engineer saw differ; whatever else differs is not accepted. */
  fields: z.array(z.enum(MISMATCH_FIELDS)).min(1, "Name what is accepted.").max(20),
  reason: storable
    .trim()
    .min(10, "Write the reason in ten characters or more: it stands beside the delta.")
    .max(1000, "Keep the reason under 1,000 characters."),
});

export const acceptanceIdSchema = z.object({ acceptanceId: z.uuid() });
