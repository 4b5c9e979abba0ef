import type { Transducer } from "@/lib/core/bench/signal-path";
import { calibrationState } from "./calibration";

interface PathAnswerProps {
  transducers: readonly Pick<Transducer, "dueOn">[];
  /** ISO date that calibrations are held against. */
  today: string;
}

/** "Can I trust this arrangement?" for one bench: how many of its calibrations are in date. */
export function PathAnswer({ transducers, today }: PathAnswerProps) {
  const count = (state: string) =>
    transducers.filter((t) => calibrationState(t.dueOn, today) === state).length;
  const total = transducers.length;
  const overdue = count("overdue");
  const undated = count("undated");
  if (total === 0) return null;
  const rest = [
    ...(overdue > 0 ? [`${overdue} ${overdue === 1 ? "is" : "are"} overdue`] : []),
    ...(undated > 0 ? [`${undated} ${undated === 1 ? "states" : "state"} no due date`] : []),
  ].join("; ");
  return (
    <div className="mb-6">
      <p>
        <span className="font-mono text-4xl [word-spacing:-0.3em] whitespace-nowrap">
          {count("in-date")} of {total}
        </span>{" "}
        <span className="text-lg">
          {total === 1 ? "calibration is in date." : "calibrations are in date."}
        </span>
      </p>
      {rest ? <p className="mt-1 text-shoal">{rest}.</p> : null}
    </div>
  );
}
