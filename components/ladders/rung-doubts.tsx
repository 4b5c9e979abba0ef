import { DOUBT_LABELS } from "@/components/readings/doubt-labels";
import type { DoubtCode } from "@/lib/core/reading/reading";
import { UNCHECKED_DOUBTS } from "@/lib/core/reading/reading";

interface StepDoubt {
  code: DoubtCode;
  /** How many sweeps of the step have it. */
  sweeps: number;
}

const inWords = (doubts: readonly StepDoubt[]) =>
  doubts
    .map(({ code, sweeps }) => DOUBT_LABELS[code] + (sweeps > 1 ? ` (${sweeps} sweeps)` : ""))
    .join(", ");

/** The doubts of a step's readings by name; the sweeps' own pages say them in full. */
export function RungDoubts({ doubts }: { doubts: readonly StepDoubt[] }) {
  const unchecked = doubts.filter(({ code }) => UNCHECKED_DOUBTS.has(code));
  const weakening = doubts.filter(({ code }) => !UNCHECKED_DOUBTS.has(code));
  if (doubts.length === 0) return null;
  return (
    <div className="text-sm">
      {weakening.length > 0 ? (
        <p>
          <span className="bg-shoal-bed px-1 text-shoal">Doubts</span> {inWords(weakening)}
        </p>
      ) : null}
      {unchecked.length > 0 ? (
        <p className="text-ink-soft">Could not be checked: {inWords(unchecked)}</p>
      ) : null}
    </div>
  );
}
