import type { InputHTMLAttributes, ReactNode } from "react";
import { useId } from "react";

interface FieldProps extends InputHTMLAttributes<HTMLInputElement> {
  label: string;
  hint?: ReactNode;
  error?: string | undefined;
}

/** A labelled input with its hint and its error; the error is announced with the field. */
export function Field({ label, hint, error, ...input }: FieldProps) {
  const id = useId();
  const described = [hint ? `${id}-hint` : "", error ? `${id}-error` : ""].join(" ").trim();
  return (
    <div className="mb-4">
      <label htmlFor={id} className="mb-1 block font-medium">
        {label}
      </label>
      {hint ? (
        <p id={`${id}-hint`} className="mb-1 text-sm text-ink-soft">
          {hint}
        </p>
      ) : null}
      <input
        id={id}
        aria-invalid={error ? true : undefined}
        aria-describedby={described || undefined}
        className="min-h-10 w-full rounded-sm border border-ink-soft bg-sheet px-3 aria-invalid:border-aground"
        {...input}
      />
      {error ? (
        <p id={`${id}-error`} className="mt-1 text-sm text-aground">
          {error}
        </p>
      ) : null}
    </div>
  );
}
