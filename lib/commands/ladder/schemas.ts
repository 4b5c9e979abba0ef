import { z } from "zod";
import { STEP_STATES } from "@/lib/core/delta/ladder-order";
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

const branchOfId = z.uuid("Choose a step of this ladder to start from.").nullable();

export const addStepSchema = z.object({
  ladderId: z.uuid(),
  name,
  description,
  /** The step that it starts from; null: the last kept one before it. */
  branchOfId: branchOfId.default(null),
});

export const editStepSchema = z.object({
  stepId: z.uuid(),
  name,
  description,
  /** Left out: stays as it is. */
  branchOfId: branchOfId.optional(),
});

export const stepIdSchema = z.object({ stepId: z.uuid() });

export const stepStateSchema = z.object({
  stepId: z.uuid(),
  state: z.enum(STEP_STATES, "Choose kept or dropped."),
});

export const reorderStepsSchema = z.object({
  ladderId: z.uuid(),
  /** Every step of the ladder once, in the wanted order. */
  stepIds: z.array(z.uuid()).min(1).max(1000),
});
