import type { ReactNode } from "react";
import { keepUnits } from "./keep-units";

interface FactsProps {
  items: { label: string; value: ReactNode; mono?: boolean }[];
}

/** Names and values side by side; a missing value says "not stated". */
export function Facts({ items }: FactsProps) {
  return (
    <dl className="grid grid-cols-[repeat(auto-fill,minmax(11rem,1fr))] gap-x-6 gap-y-3">
      {items.map(({ label, value, mono }) => (
        <div key={label} className="border-t border-rule pt-1">
          <dt className="text-sm text-ink-soft">{label}</dt>
          <dd className={`break-words ${mono && value !== null ? "font-mono" : ""}`}>
            {typeof value === "string"
              ? keepUnits(value)
              : (value ?? <span className="text-ink-soft">not stated</span>)}
          </dd>
        </div>
      ))}
    </dl>
  );
}
