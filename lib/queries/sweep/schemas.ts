import { z } from "zod";

const hz = z.coerce.number("State a frequency in Hz.").min(0, "A frequency is 0 Hz or more.");

export const traceViewSchema = z
  .object({
    position: z.coerce.number().int().min(0).max(9999),
    fromHz: hz,
    toHz: hz,
    columns: z.coerce.number().int().min(2).max(1500, "At most 1,500 columns.").default(1000),
    scale: z.enum(["log", "linear"]).default("log"),
  })
  .refine((view) => view.toHz > view.fromHz, {
    message: "The view ends before it begins.",
    path: ["toHz"],
  });
