import { z } from "zod";
import { REASONED_STATES, SUSPECT_STATES } from "@/lib/core/reading/suspect-state";
import { storable } from "../storable-text";

const suspectId = z.uuid("Choose a followed suspect.");
const readingId = z.uuid("Choose a reading.");
const note = storable.trim().max(4000, "Keep the note under 4,000 characters.");

export const followSuspectSchema = z.object({
  readingId,
  number: z.int("Choose a suspect of the table.").min(1, "Choose a suspect of the table."),
});

export const followAllNearSchema = z.object({ readingId });

export const editSuspectSchema = z.object({
  suspectId,
  source: storable.trim().max(200, "Keep the likely source under 200 characters."),
  toleranceHz: z
    .number("State the tolerance with its unit, for example 240 kHz.")
    .positive("A tolerance is above 0 Hz.")
    .max(1e9, "A tolerance above 1 GHz would take every peak for this one."),
});

export const assignSuspectSchema = z.object({
  suspectId,
  /** null: nobody. */
  ownerId: z.uuid("Choose a member of your team, or nobody.").nullable(),
});

export const setSuspectStateSchema = z
  .object({ suspectId, state: z.enum(SUSPECT_STATES, "Choose a state."), note })
  .superRefine((values, context) => {
    if (!REASONED_STATES.has(values.state) || values.note !== "") return;
    context.addIssue({
      code: "custom",
      path: ["note"],
      message: `Say in a note why it is ${values.state}.`,
    });
  });

export const addNoteSchema = z.object({
  suspectId,
  text: note.min(1, "Write the note first."),
});
