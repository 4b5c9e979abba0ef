import type { ReactNode, TextareaHTMLAttributes } from "react";
import { useId } from "react";
import { CONTROL } from "./control-style";
import { describedBy, FieldFrame } from "./field-frame";

interface TextAreaProps extends TextareaHTMLAttributes<HTMLTextAreaElement> {
  label: string;
  hint?: ReactNode;
  error?: string | undefined;
}

export function TextArea({ label, hint, error, className = "", ...area }: TextAreaProps) {
  const id = useId();
  return (
    <FieldFrame id={id} label={label} hint={hint} error={error}>
      <textarea
        id={id}
        rows={3}
        {...describedBy(id, hint, error)}
        className={`${CONTROL} py-2 ${className}`}
        {...area}
      />
    </FieldFrame>
  );
}
