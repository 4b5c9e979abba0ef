"use client";

import { useId, useRef, useState } from "react";

interface DropZoneProps {
  label: string;
  hint: string;
  accept?: string;
  onFiles: (files: File[]) => void;
}

/** A place to drop files, which is also a button that asks for them. */
export function DropZone({ label, hint, accept, onFiles }: DropZoneProps) {
  const id = useId();
  const input = useRef<HTMLInputElement>(null);
  const [over, setOver] = useState(false);
  const take = (list: FileList | null) => {
    if (list && list.length > 0) onFiles([...list]);
    if (input.current) input.current.value = "";
  };
  return (
    <div
      onDragOver={(event) => {
        event.preventDefault();
        setOver(true);
      }}
      onDragLeave={() => setOver(false)}
      onDrop={(event) => {
        event.preventDefault();
        setOver(false);
        take(event.dataTransfer.files);
      }}
      className={`relative border-2 border-dashed p-8 text-center focus-within:outline-2 focus-within:outline-offset-2 focus-within:outline-deep ${over ? "border-deep bg-water-1" : "border-ink-soft/60 bg-sheet"}`}
    >
      <label htmlFor={id} className="block cursor-pointer">
        <span className="block text-lg font-medium text-deep underline">{label}</span>
        <span className="mt-1 block text-sm text-ink-soft">{hint}</span>
      </label>
      <input
        ref={input}
        id={id}
        type="file"
        multiple
        accept={accept}
        onChange={(event) => take(event.target.files)}
        className="absolute inset-0 h-full w-full cursor-pointer opacity-0"
      />
    </div>
  );
}
