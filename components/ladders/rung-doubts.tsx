import { DOUBT_LABELS } from "@/components/readings/doubt-labels";
import { DoubtList } from "@/components/readings/doubt-list";
import type { Doubt } from "@/lib/core/reading/reading";
import { DOUBT_CODES, UNCHECKED_DOUBTS } from "@/lib/core/reading/reading";

/** A doubt and how many sweeps of the step have it. */
type StepDoubt = Doubt & { sweeps: number };

const inWords = (doubts: readonly StepDoubt[]) =>
  DOUBT_CODES.filter((code) => doubts.some((doubt) => doubt.code === code))
    .map((code) => DOUBT_LABELS[code])
    .join(", ");

/** The doubts of a step's readings: by name at once, with number and remedy behind a click. */
export function RungDoubts({ doubts }: { doubts: readonly StepDoubt[] }) {
  const unchecked = doubts.filter(({ code }) => UNCHECKED_DOUBTS.has(code));
  const weakening = doubts.filter(({ code }) => !UNCHECKED_DOUBTS.has(code));
  if (doubts.length === 0) return null;
  const told = doubts.map(({ sweeps, ...doubt }) => ({
    ...doubt,
    text: sweeps > 1 ? `${doubt.text} (${sweeps} sweeps)` : doubt.text,
  }));
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
      <details className="mt-1">
        <summary className="cursor-pointer text-deep underline">What they say</summary>
        <div className="mt-3">
          <DoubtList doubts={told} />
        </div>
      </details>
    </div>
  );
}
