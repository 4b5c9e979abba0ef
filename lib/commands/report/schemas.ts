import { z } from "zod";
import { storable } from "../storable-text";
import { PAPERS } from "@/lib/reports/paper";

const content = {
  title: storable
    .trim()
    .min(1, "Give the report a title.")
    .max(120, "Keep the title under 120 characters."),
  summary: storable.trim().max(4000, "Keep the summary under 4,000 characters."),
  paper: z.enum(PAPERS, "Choose the paper."),
  sweepIds: z
    .array(z.uuid())
    .min(1, "Choose at least one sweep.")
    .max(40, "At most 40 sweeps fit one report.")
    .refine((ids) => new Set(ids).size === ids.length, "A sweep is listed twice."),
  ladderId: z.uuid().nullable(),
  replacesId: z.uuid().nullable(),
};

export const createReportSchema = z.object({ buildId: z.uuid("Choose a build."), ...content });

export const editReportSchema = z.object({ reportId: z.uuid(), ...content });

export const reportIdSchema = z.object({ reportId: z.uuid() });

export const withdrawReportSchema = z.object({
  reportId: z.uuid(),
  reason: storable
    .trim()
    .min(1, "Say why: whoever holds the PDF will ask.")
    .max(400, "Keep the reason under 400 characters."),
});
