import type { Context } from "@/lib/auth/context";
import { CommandError } from "../result";
import { change, parseInput, requirePermission } from "../run";
import { readCsvInput } from "./read-csv-input";
import { readMaskInput } from "./read-mask-input";
import { importMaskSchema, MAX_MASK_BYTES } from "./schemas";
import { storeMask } from "./store-mask";

function parseJson(text: string): unknown {
  try {
    return JSON.parse(text.replace(/^\uFEFF/, ""));
  } catch (error) {
    const reason = error instanceof Error ? error.message : "";
    throw new CommandError(
      "invalid",
      "This text starts like JSON and is none, so nothing was stored.",
      {
        text: `It cannot be read as JSON: ${reason}`,
      },
    );
  }
}

/** JSON starts with a bracket or is one bare value; every other text is read as CSV. */
const isJson = (text: string) => /^\uFEFF?\s*(?:[{[]|(?:null|true|false)\s*$)/.test(text);

/**
 * Adds a mask of the team's own from the text of a mask file, JSON or CSV; all its problems are
 * named at once.
 */
export async function importMask(ctx: Context, input: unknown): Promise<{ maskId: string }> {
  requirePermission(ctx, "mask.write");
  const { text, answers } = parseInput(importMaskSchema, input);
  if (Buffer.byteLength(text) > MAX_MASK_BYTES) {
    throw new CommandError("invalid", "This file is too large, so nothing was stored.", {
      text: "A mask file is at most 1 MB.",
    });
  }
  if (text.replace("\uFEFF", "").trim() === "") {
    throw new CommandError("invalid", "There is no text to read, so nothing was stored.", {
      text: "Paste the text of a mask file, or choose a file.",
    });
  }
  const format = isJson(text) ? "json" : "csv";
  const mask = format === "json" ? readMaskInput(parseJson(text)) : readCsvInput(text, answers);
  return change(ctx, async (tx, audit) => {
    const { maskId, key } = await storeMask(tx, ctx, mask);
    await audit({
      action: "mask.import",
      subjectType: "mask",
      subjectId: maskId,
      detail: { key, keyInFile: mask.key, format, title: mask.title, provenance: mask.provenance },
    });
    return { maskId };
  });
}
