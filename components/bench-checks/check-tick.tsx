import { useId } from "react";

interface CheckTickProps {
  label: string;
  checked: boolean;
  hint?: string;
  error?: string | undefined;
  onChange: (checked: boolean) => void;
}

/** A box to tick, with what it means and what is wrong with it. */
export function CheckTick({ label, checked, hint, error, onChange }: CheckTickProps) {
  const id = useId();
  return (
    <div>
      <label className="flex items-start gap-2">
        <input
          type="checkbox"
          className="mt-1 size-4 shrink-0 accent-deep"
          checked={checked}
          aria-invalid={error ? true : undefined}
          aria-describedby={hint || error ? id : undefined}
          onChange={(event) => onChange(event.target.checked)}
        />
        {label}
      </label>
      {hint || error ? (
        <p id={id} className="pl-6 text-sm">
          {error ? <span className="block text-aground">{error}</span> : null}
          {hint ? <span className="block text-ink-soft">{hint}</span> : null}
        </p>
      ) : null}
    </div>
  );
}
