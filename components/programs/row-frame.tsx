import type { ReactNode } from "react";
import { Button } from "@/components/ui/button";

interface RowFrameProps {
  /** What this row is, for whoever hears it: "Milestone 2". */
  label: string;
  onRemove: () => void;
  children: ReactNode;
}

/** One row of a list that is edited as a whole: its fields side by side, and taking it out. */
export function RowFrame({ label, onRemove, children }: RowFrameProps) {
  return (
    <fieldset className="mb-3 min-w-0 border border-rule bg-sheet px-4 pt-3">
      <legend className="sr-only">{label}</legend>
      <div className="grid items-start gap-x-4 sm:grid-cols-[1fr_1fr_1fr_auto]">
        {children}
        <Button
          look="quiet"
          className="mb-4 sm:mt-7"
          aria-label={`Remove ${label.toLowerCase()}`}
          onClick={onRemove}
        >
          Remove
        </Button>
      </div>
    </fieldset>
  );
}
