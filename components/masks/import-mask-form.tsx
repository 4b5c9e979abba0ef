"use client";

import { useRouter } from "next/navigation";
import { useState } from "react";
import { readTextFile } from "@/components/benches/read-text-file";
import { Button, ButtonLink } from "@/components/ui/button";
import { ErrorNote } from "@/components/ui/error-note";
import { FileField } from "@/components/ui/file-field";
import { TextArea } from "@/components/ui/text-area";
import { useActionForm } from "@/components/ui/use-action-form";
import { ANSWERS, MaskFileAnswers } from "./mask-file-answers";

type Outcome =
  | { ok: true; data: { maskId: string } }
  | { ok: false; message: string; fieldErrors: Record<string, string> };

/** Problems that stand at no field of the form, those of lines in the order of the text. */
function listedProblems(fieldErrors: Record<string, string>, isCsv: boolean): [string, string][] {
  const lineOf = (path: string) => Number(/^line\.(\d+)$/.exec(path)?.[1] ?? 0);
  return Object.entries(fieldErrors)
    .filter(([path]) => path !== "text" && !(isCsv && ANSWERS.some((name) => name === path)))
    .sort(([a], [b]) => lineOf(a) - lineOf(b));
}

/** Takes a mask file as text, pasted or chosen; every problem is listed with its place. */
export function ImportMaskForm({ action }: { action: (input: unknown) => Promise<Outcome> }) {
  const router = useRouter();
  const [text, setText] = useState("");
  const [fileMessage, setFileMessage] = useState<string | null>(null);
  const isCsv = text.trim() !== "" && !/^\uFEFF?\s*[{[]/.test(text);
  const form = useActionForm({
    action,
    read: (data): unknown => ({
      text,
      answers: Object.fromEntries(ANSWERS.map((name) => [name, String(data.get(name) ?? "")])),
    }),
    onDone: ({ maskId }) => router.push(`/masks/${maskId}`),
  });
  const problems = listedProblems(form.fieldErrors, isCsv);

  async function load(file: File) {
    const read = await readTextFile(file);
    setFileMessage(read.ok ? `Loaded from ${file.name}; nothing is stored yet.` : read.message);
    if (read.ok) setText(read.text);
  }

  return (
    <form onSubmit={form.onSubmit} method="post" className="max-w-3xl">
      <ErrorNote message={form.message} />
      {problems.length > 0 ? (
        <ul className="mb-4 space-y-1 border border-rule bg-sheet p-3" aria-label="Problems">
          {problems.map(([path, problem]) => (
            <li key={path}>
              {problem.startsWith(`"${path}"`) || path.startsWith("line.") ? null : (
                <span className="mr-1.5 font-mono text-sm">{path}</span>
              )}
              <span className="text-aground">{problem}</span>
            </li>
          ))}
        </ul>
      ) : null}
      <FileField
        label="Mask file"
        accept=".json,.csv,.tsv,.txt,application/json,text/csv,text/plain"
        onFile={(file) => void load(file)}
      />
      <p role="status" className="mb-2 text-sm empty:mb-0">
        {fileMessage}
      </p>
      <TextArea
        label="Or paste its text"
        name="text"
        rows={16}
        spellCheck={false}
        className="font-mono text-sm"
        value={text}
        onChange={(event) => setText(event.target.value)}
        error={form.fieldErrors["text"]}
      />
      {isCsv ? <MaskFileAnswers fieldErrors={form.fieldErrors} /> : null}
      <div className="flex gap-2">
        <Button type="submit" disabled={form.pending}>
          Import mask
        </Button>
        <ButtonLink href="/masks">Cancel</ButtonLink>
      </div>
    </form>
  );
}
