import { z } from "zod";
import { PROVENANCES } from "@/lib/core/mask/mask";
import { PORTS } from "@/lib/core/sweep/settings";
import { LEVEL_UNITS } from "@/lib/core/units/level-units";
import { storable } from "../storable-text";

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

const open = z.literal("").transform(() => undefined);

export const importMaskSchema = z.object({
  text: z
    .string("Paste the text of a mask file, or choose a file.")
    .max(MAX_MASK_BYTES, "A mask file is at most 1 MB."),
  /** What a CSV leaves open; asked of a person, and what the file says counts before it. */
  answers: z
    .object({
      title: storable.optional(),
      port: open.or(z.enum(PORTS, "Choose the port.")).optional(),
      unit: open.or(z.enum(LEVEL_UNITS, "Choose the unit of the limit.")).optional(),
      provenance: open.or(z.enum(PROVENANCES, "Choose where the numbers come from.")).optional(),
      frequencyUnit: open
        .or(z.enum(["Hz", "kHz", "MHz", "GHz"], "Choose the unit of the frequencies."))
        .optional(),
    })
    .optional(),
});

const stated = (what: string) =>
  storable.trim().min(1, what).max(160, "Keep this under 160 characters.");

export const confirmMaskSchema = z.object({
  maskId,
  /** The revision that was compared; refused when a newer one came in between. */
  basedOnRevision: z.number().int(),
  copy: stated("Say which copy you hold: a later reader may want to look at the same one."),
  edition: stated("Say which edition you compared with."),
  /** The mask's note from now on; it stays as it is when left out. */
  note: storable.trim().max(4000, "Keep this under 4000 characters.").optional(),
  isCompared: z.literal(true, "Compare every row first; only then is the mask confirmed."),
});

export const maskIdSchema = z.object({ maskId });
