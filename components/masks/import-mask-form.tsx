"use client";

import { useRouter } from "next/navigation";
import { useState } from "react";
import { readTextFile } from "@/components/benches/read-text-file";
import { Button, ButtonLink } from "@/components/ui/button";
import { ErrorNote } from "@/components/ui/error-note";
import { FileField } from "@/components/ui/file-field";
import { TextArea } from "@/components/ui/text-area";
import { useActionForm } from "@/components/ui/use-action-form";

type Outcome =
  | { ok: true; data: { maskId: string } }
  | { ok: false; message: string; fieldErrors: Record<string, string> };

/** Takes a mask file as text, pasted or chosen; every problem is listed with its place. */
export function ImportMaskForm({ action }: { action: (input: unknown) => Promise<Outcome> }) {
  const router = useRouter();
  const [text, setText] = useState("");
  const [fileMessage, setFileMessage] = useState<string | null>(null);
  const form = useActionForm({
    action,
    read: (): unknown => ({ text }),
    onDone: ({ maskId }) => router.push(`/masks/${maskId}`),
  });
  const problems = Object.entries(form.fieldErrors).filter(([path]) => path !== "text");

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
              {problem.startsWith(`"${path}"`) ? null : (
                <span className="mr-1.5 font-mono text-sm">{path}</span>
              )}
              <span className="text-aground">{problem}</span>
            </li>
          ))}
        </ul>
      ) : null}
      <FileField
        label="Mask file"
        accept=".json,application/json"
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
        error={form.fieldErrors.text}
      />
      <div className="flex gap-2">
        <Button type="submit" disabled={form.pending}>
          Import mask
        </Button>
        <ButtonLink href="/masks">Cancel</ButtonLink>
      </div>
    </form>
  );
}
