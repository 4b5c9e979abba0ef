import type { ReactNode } from "react";

interface FieldFrameProps {
  id: string;
  label: string;
  hint?: ReactNode;
  error?: string | undefined;
  children: ReactNode;
}

/** What describes a control to a screen reader: its hint and its error, when it has them. */
export function describedBy(id: string, hint: ReactNode, error: string | undefined) {
  const ids = [hint ? `${id}-hint` : "", error ? `${id}-error` : ""].join(" ").trim();
  return { "aria-invalid": error ? true : undefined, "aria-describedby": ids || undefined };
}

/** Label above, error and hint below, so that controls side by side stand in one line. */
export function FieldFrame({ id, label, hint, error, children }: FieldFrameProps) {
  return (
    <div className="mb-4">
      <label htmlFor={id} className="mb-1 block font-medium">
        {label}
      </label>
      {children}
      {error ? (
        <p id={`${id}-error`} className="mt-1 text-sm text-aground">
          {error}
        </p>
      ) : null}
      {hint ? (
        <p id={`${id}-hint`} className="mt-1 text-sm text-ink-soft">
          {hint}
        </p>
      ) : null}
    </div>
  );
}
