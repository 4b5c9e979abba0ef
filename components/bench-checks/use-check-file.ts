"use client";

import { useState } from "react";
import type { DeskFile, DeskPreview, Outcome } from "@/components/sweeps/desk-file";
import { newDeskFile, withPreview } from "@/components/sweeps/desk-file";
import type { SweepFileAnswers } from "@/lib/formats/sweep-file";

/** A file with what is said about it, as the server's actions take it. */
export function toCheckForm(file: File, said: unknown): FormData {
  const form = new FormData();
  form.set("file", file);
  form.set("said", JSON.stringify(said));
  return form;
}

/** The one file of a check: what is in it, and what it leaves open. */
export function useCheckFile(
  preview: (form: FormData) => Promise<Outcome<DeskPreview>>,
  onRead: (preview: DeskPreview) => void,
) {
  const [file, setFile] = useState<DeskFile | null>(null);

  async function look(desk: DeskFile, answers: SweepFileAnswers) {
    const refuse = (message: string) => setFile({ ...desk, state: "refused", message });
    setFile({ ...desk, answers, state: "reading", message: null });
    try {
      const outcome = await preview(toCheckForm(desk.file, { answers }));
      if (!outcome.ok) return refuse(outcome.fieldErrors.bytes ?? outcome.message);
      setFile(withPreview({ ...desk, answers }, outcome.data));
      onRead(outcome.data);
    } catch {
      refuse("Neap could not be reached; nothing was stored. Check the connection.");
    }
  }

  return {
    file,
    choose: (chosen: File) => {
      const desk = newDeskFile(chosen, chosen.name, { corrected: false, onRecord: false });
      if (desk.state === "refused") setFile(desk);
      else void look(desk, {});
    },
    answer: (answers: SweepFileAnswers) => {
      if (file) void look(file, answers);
    },
  };
}
