"use client";

import { useRouter } from "next/navigation";
import { useState } from "react";
import { readTextFile } from "@/components/benches/read-text-file";
import { Button, ButtonLink } from "@/components/ui/button";
import { ErrorNote } from "@/components/ui/error-note";
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

  async function load(input: HTMLInputElement) {
    const file = input.files?.[0];
    if (!file) return;
    const read = await readTextFile(file);
    setFileMessage(read.ok ? `Loaded from ${file.name}; nothing is stored yet.` : read.message);
    if (read.ok) setText(read.text);
    input.value = "";
  }

  return (
    <form onSubmit={form.onSubmit} method="post" className="max-w-3xl">
      <ErrorNote message={form.message} />
      {problems.length > 0 ? (
        <ul className="mb-4 space-y-1 border border-rule bg-sheet p-3" aria-label="Problems">
          {problems.map(([path, problem]) => (
            <li key={path}>
              <span className="font-mono text-sm">{path}</span>{" "}
              <span className="text-aground">{problem}</span>
            </li>
          ))}
        </ul>
      ) : null}
      <label className="mb-4 block">
        <span className="mb-1 block font-medium">Choose a mask file</span>
        <input
          type="file"
          accept=".json,application/json"
          className="block max-w-full"
          onChange={(event) => void load(event.currentTarget)}
        />
      </label>
      <p role="status" className="mb-2 text-sm text-ink-soft">
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
