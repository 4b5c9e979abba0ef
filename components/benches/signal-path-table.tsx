import { keepUnits } from "@/components/ui/keep-units";
import type { SignalPath } from "@/lib/core/bench/signal-path";
import { calibrationState } from "./calibration";
import { factorSpan } from "./factor-span";
import { FACTOR_MEANINGS, TRANSDUCER_KIND_LABELS } from "./transducer-kinds";

interface SignalPathTableProps {
  path: SignalPath;
  /** ISO date that calibrations are held against. */
  today: string;
}

/** The path in its order, from the field to the instrument. */
export function SignalPathTable({ path, today }: SignalPathTableProps) {
  return (
    <div
      className="overflow-x-auto border border-rule bg-sheet"
      tabIndex={0}
      role="region"
      aria-label="Signal path"
    >
      <table className="w-full text-left">
        <caption className="px-3 py-2 text-left text-sm text-ink-soft">
          From the field, top, to the instrument, bottom.
        </caption>
        <thead className="text-sm text-ink-soft">
          <tr className="border-y border-rule">
            {["Place", "Transducer", "Factor", "Covers", "Rows", "Calibrated on", "Due on"].map(
              (head) => (
                <th key={head} className="px-3 py-2 font-medium whitespace-nowrap">
                  {head}
                </th>
              ),
            )}
          </tr>
        </thead>
        <tbody>
          {path.transducers.map((transducer, i) => (
            <tr key={transducer.name} className="border-b border-rule last:border-0">
              <td className="px-3 py-2 font-mono">{i + 1}</td>
              <th scope="row" className="min-w-40 px-3 py-2 font-medium">
                {keepUnits(transducer.name)}
                <span className="block text-sm font-normal text-ink-soft">
                  {TRANSDUCER_KIND_LABELS[transducer.kind]}
                </span>
              </th>
              <td className="min-w-36 px-3 py-2 text-sm">{FACTOR_MEANINGS[transducer.kind]}</td>
              <td className="px-3 py-2 font-mono whitespace-nowrap">
                {factorSpan(transducer.factors)}
              </td>
              <td className="px-3 py-2 font-mono">{transducer.factors.length}</td>
              <td className="px-3 py-2 font-mono whitespace-nowrap">
                {transducer.calibratedOn ?? <NotStated />}
              </td>
              <td className="px-3 py-2 whitespace-nowrap">
                <Due dueOn={transducer.dueOn} today={today} />
              </td>
            </tr>
          ))}
        </tbody>
      </table>
    </div>
  );
}

function NotStated() {
  return <span className="font-sans text-ink-soft">not stated</span>;
}

function Due({ dueOn, today }: { dueOn: string | null; today: string }) {
  if (dueOn === null) return <NotStated />;
  const overdue = calibrationState(dueOn, today) === "overdue";
  return (
    <>
      <span className="font-mono">{dueOn}</span>
      {overdue ? <span className="ml-2 bg-shoal-bed px-1 text-shoal">overdue</span> : null}
    </>
  );
}
