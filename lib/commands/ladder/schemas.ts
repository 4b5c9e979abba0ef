import { z } from "zod";
import { storable } from "../storable-text";

const name = storable
  .trim()
  .min(1, "Give it a name.")
  .max(80, "Keep the name under 80 characters.");
const notes = storable.trim().max(4000, "Keep the notes under 4,000 characters.");
const description = storable.trim().max(1000, "Keep the description under 1,000 characters.");

export const createLadderSchema = z.object({
  buildId: z.uuid("Choose a build."),
  name,
  notes,
  /** Step 0: the state that every later step is held against. */
  startName: name,
  startDescription: description,
});

export const editLadderSchema = z.object({ ladderId: z.uuid(), name, notes });

export const ladderIdSchema = z.object({ ladderId: z.uuid() });

export const addStepSchema = z.object({ ladderId: z.uuid(), name, description });

export const editStepSchema = z.object({ stepId: z.uuid(), name, description });

export const stepIdSchema = z.object({ stepId: z.uuid() });
