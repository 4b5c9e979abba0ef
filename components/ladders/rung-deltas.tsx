import { MismatchNote } from "./acceptance";
import { DeltaTable } from "./delta-table";
import { DeltaValue } from "./delta-value";
import type { AcceptanceActions, RungDelta, RungStep } from "./rung-types";

interface RungDeltasProps {
  step: RungStep;
  actions: AcceptanceActions | null;
  /** Mask revisions that nobody confirmed. */
  fromMemory: readonly string[];
}

/** What a step changed against the step that it is held against, and against step 0. */
export function RungDeltas({ step, ...rest }: RungDeltasProps) {
  const { base } = step;
  if (!base || step.sweeps.length === 0) return null;
  if (step.againstPrevious.length === 0 && step.againstStart.length === 0)
    return (
      <p className="text-ink-soft">
        No delta: no sweep of step {base.position} has the same purpose and an overlapping span.
      </p>
    );
  return (
    <>
      <DeltaGroup
        title={`Against step ${base.position}: ${base.name}`}
        deltas={step.againstPrevious}
        {...rest}
      />
      {step.unpaired.length > 0 ? (
        <p className="text-sm text-shoal">
          Nothing at step {base.position} to hold against: {step.unpaired.join(", ")}.
        </p>
      ) : null}
      {base.position > 0 ? (
        <details>
          <summary className="cursor-pointer text-sm text-deep underline">Against step 0</summary>
          <div className="mt-3">
            <DeltaGroup title="Against step 0" deltas={step.againstStart} {...rest} />
          </div>
        </details>
      ) : null}
    </>
  );
}

interface DeltaGroupProps extends Omit<RungDeltasProps, "step"> {
  title: string;
  deltas: RungDelta[];
}

function DeltaGroup({ title, deltas, ...rest }: DeltaGroupProps) {
  if (deltas.length === 0) return null;
  return (
    <div className="border border-rule bg-sheet px-4 py-3">
      <h4 className="mb-2 font-medium">{title}</h4>
      <div className="space-y-4">
        {deltas.map((delta) => (
          <div key={`${delta.beforeId} ${delta.afterId}`}>
            {deltas.length > 1 ? <p className="text-sm text-ink-soft">{delta.afterName}</p> : null}
            <DeltaSummary delta={delta} {...rest} />
          </div>
        ))}
      </div>
    </div>
  );
}

/** The sentence and the changes of margin; the numbers behind them on request. */
function DeltaSummary(props: { delta: RungDelta } & Omit<RungDeltasProps, "step">) {
  const { delta, actions, fromMemory } = props;
  const { changes } = delta;
  const note = <MismatchNote delta={delta} actions={actions} />;
  if (!changes) return note;
  const told = changes.margins.filter(
    (margin) => margin.beforeDb !== null || margin.afterDb !== null,
  );
  return (
    <>
      {note}
      <p className={delta.accepted ? "mt-2" : ""}>{changes.sentence}</p>
      <p className="text-sm text-ink-soft">{changes.repeatability}</p>
      <ul className="mt-1 flex flex-wrap gap-x-6 gap-y-1">
        {told.map((margin) => (
          <li
            key={`${margin.maskRevisionId} ${margin.lineName}`}
            className="flex items-baseline gap-2"
          >
            <span className="text-sm text-ink-soft">{margin.lineName} margin</span>
            {margin.note ? (
              <span className="text-sm text-shoal">not comparable</span>
            ) : (
              <DeltaValue change={margin} better="up" />
            )}
          </li>
        ))}
      </ul>
      <details className="mt-2">
        <summary className="cursor-pointer text-sm text-deep underline">All numbers</summary>
        <div className="mt-3">
          <DeltaTable delta={delta} changes={changes} fromMemory={fromMemory} />
        </div>
      </details>
    </>
  );
}
