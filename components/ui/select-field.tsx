import type { ReactNode, SelectHTMLAttributes } from "react";
import { useId } from "react";
import { CONTROL } from "./control-style";
import { describedBy, FieldFrame } from "./field-frame";

interface SelectFieldProps extends SelectHTMLAttributes<HTMLSelectElement> {
  label: string;
  hint?: ReactNode;
  error?: string | undefined;
  options: readonly { value: string; label: string }[];
}

export function SelectField({ label, hint, error, options, ...select }: SelectFieldProps) {
  const id = useId();
  return (
    <FieldFrame id={id} label={label} hint={hint} error={error}>
      <select id={id} {...describedBy(id, hint, error)} className={CONTROL} {...select}>
        {options.map((option) => (
          <option key={option.value} value={option.value}>
            {option.label}
          </option>
        ))}
      </select>
    </FieldFrame>
  );
}
