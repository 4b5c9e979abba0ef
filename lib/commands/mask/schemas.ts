import { z } from "zod";

const maskId = z.uuid("Choose a mask.");

export const MAX_MASK_BYTES = 1_000_000;

/** The mask's own fields are read by `read-mask-input.ts`, by the same rules as a file's. */
export const createMaskSchema = z.object({ mask: z.unknown() });

export const reviseMaskSchema = z.object({
  maskId,
  /** The revision the editor started from; refused when a newer one came in between. */
  basedOnRevision: z.number().int().optional(),
  mask: z.unknown(),
});

export const importMaskSchema = z.object({
  text: z
    .string("Paste the text of a mask file, or choose a file.")
    .max(MAX_MASK_BYTES, "A mask file is at most 1 MB."),
});

export const maskIdSchema = z.object({ maskId });
