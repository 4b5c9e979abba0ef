import type { InputHTMLAttributes, ReactNode } from "react";
import { useId } from "react";
import { CONTROL } from "./control-style";
import { describedBy, FieldFrame } from "./field-frame";

interface FieldProps extends InputHTMLAttributes<HTMLInputElement> {
  label: string;
  hint?: ReactNode;
  error?: string | undefined;
}

/** A labelled input with its hint and its error; the error is announced with the field. */
export function Field({ label, hint, error, className = "", ...input }: FieldProps) {
  const id = useId();
  return (
    <FieldFrame id={id} label={label} hint={hint} error={error}>
      <input
        id={id}
        {...describedBy(id, hint, error)}
        className={`${CONTROL} ${className}`}
        {...input}
      />
    </FieldFrame>
  );
}
