import type { Doubt } from "@/lib/core/reading/reading";
import { UNCHECKED_DOUBTS } from "@/lib/core/reading/reading";
import { DOUBT_LABELS } from "./doubt-labels";

/** What weakens a reading and what could not be checked, each with its number and its remedy. */
export function DoubtList({ doubts }: { doubts: Doubt[] }) {
  if (doubts.length === 0) return <p className="text-ink-soft">None that Neap can see.</p>;
  const unchecked = doubts.filter(({ code }) => UNCHECKED_DOUBTS.has(code));
  const weakening = doubts.filter(({ code }) => !UNCHECKED_DOUBTS.has(code));
  return (
    <div className="max-w-[80ch] space-y-5">
      <DoubtGroup
        title="What weakens the reading"
        doubts={weakening}
        className="border-shoal bg-shoal-bed"
      />
      <DoubtGroup
        title="What could not be checked"
        doubts={unchecked}
        className="border-rule bg-sheet"
      />
    </div>
  );
}

/** Which way the number points differs from doubt to doubt, so the sentence alone says it. */
const size = (valueDb: number) => `${Math.abs(valueDb).toFixed(1)} dB`;

interface DoubtGroupProps {
  title: string;
  doubts: Doubt[];
  className: string;
}

function DoubtGroup({ title, doubts, className }: DoubtGroupProps) {
  if (doubts.length === 0) return null;
  return (
    <div>
      <h3 className="mb-2 font-medium">
        {title} <span className="font-mono text-ink-soft">{doubts.length}</span>
      </h3>
      <ul className="space-y-2">
        {doubts.map(({ code, text, valueDb }) => (
          <li key={`${code} ${text}`} className={`border-l-4 px-3 py-2 ${className}`}>
            <span className="flex flex-wrap items-baseline gap-x-4">
              <span className="font-medium">{DOUBT_LABELS[code]}</span>
              {valueDb === null ? null : (
                <span className="ml-auto font-mono whitespace-nowrap">{size(valueDb)}</span>
              )}
            </span>
            {text}
          </li>
        ))}
      </ul>
    </div>
  );
}
