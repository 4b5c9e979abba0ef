"use client";

import Link from "next/link";
import { useState } from "react";
import { LinkFacts } from "@/components/sweeps/sweep-facts";
import { ActionButton } from "@/components/ui/action-button";
import { ButtonLink } from "@/components/ui/button";
import type { SweepDelta } from "@/lib/core/delta/delta";
import type { LinkSettings } from "@/lib/core/link/link-settings";
import type { Standing } from "@/lib/core/reading/reading";
import { formatMargin } from "@/lib/core/units/format";
import { StandingMark } from "../readings/standing-mark";
import { DeltaTable } from "./delta-table";
import { DeltaValue } from "./delta-value";
import { StepForm } from "./step-form";

export interface RungStep {
  id: string;
  position: number;
  name: string;
  description: string;
  link: LinkSettings | null;
  onRecord: boolean;
  sweeps: { id: string; name: string; purpose: string }[];
  worst: {
    marginDb: number | null;
    standing: Standing;
    lineName: string | null;
    maskTitle: string;
  } | null;
  againstPrevious: SweepDelta[];
  againstStart: SweepDelta[];
}

type ActionResult = { ok: true } | { ok: false; message: string };

export interface RungActions {
  edit: (
    input: unknown,
  ) => Promise<
    | { ok: true; data: { stepId: string } }
    | { ok: false; message: string; fieldErrors: Record<string, string> }
  >;
  remove: (stepId: string) => Promise<ActionResult>;
  record: (stepId: string) => Promise<ActionResult>;
}

interface RungProps {
  step: RungStep;
  buildId: string;
  isLast: boolean;
  mayWrite: boolean;
  actions: RungActions;
}

/** A step of the ladder: where it stands, what it changed, its sweeps and its link settings. */
export function Rung({ step, buildId, isLast, mayWrite, actions }: RungProps) {
  const [editing, setEditing] = useState(false);
  return (
    <li className="relative border-l-2 border-deep pb-8 pl-8 last:pb-2">
      <span
        aria-hidden
        className="absolute top-0 -left-4 flex h-8 w-8 items-center justify-center rounded-full border-2 border-deep bg-paper font-mono text-sm"
      >
        {step.position}
      </span>
      <div className="flex flex-wrap items-start gap-x-6 gap-y-2">
        <div className="min-w-0 flex-1 basis-72">
          <h3 className="text-lg">
            <span className="sr-only">Step {step.position}: </span>
            {step.name}
          </h3>
          <p className="text-sm text-ink-soft">
            {step.description}
            {step.onRecord ? `${step.description ? " · " : ""}on the line of record` : ""}
          </p>
        </div>
        {step.worst ? (
          <div className="sm:text-right">
            <p className="flex items-baseline gap-3 sm:justify-end">
              <span className="font-mono text-2xl whitespace-nowrap">
                {formatMargin(step.worst.marginDb)}
              </span>
              <StandingMark standing={step.worst.standing} />
            </p>
            <p className="text-sm text-ink-soft">
              {step.worst.lineName} line of {step.worst.maskTitle}
            </p>
          </div>
        ) : null}
      </div>
      {editing ? (
        <div className="mt-3">
          <StepForm
            action={actions.edit}
            about={{ stepId: step.id }}
            values={step}
            label="Save step"
            onDone={() => setEditing(false)}
          />
        </div>
      ) : null}
      <div className="mt-3 space-y-4">
        {step.sweeps.length === 0 ? (
          <p className="text-ink-soft">No sweep yet.</p>
        ) : (
          <p className="text-sm">
            Sweeps:{" "}
            {step.sweeps.map((sweep, i) => (
              <span key={sweep.id}>
                {i > 0 ? ", " : ""}
                <Link href={`/sweeps/${sweep.id}`} className="text-deep underline">
                  {sweep.name}
                </Link>
                {sweep.purpose === "product" ? "" : ` (${sweep.purpose})`}
              </span>
            ))}
          </p>
        )}
        {step.position > 0 ? <Deltas step={step} /> : null}
        {step.link ? (
          <details>
            <summary className="cursor-pointer text-sm text-deep underline">Link settings</summary>
            <div className="mt-3">
              <LinkFacts link={step.link} />
            </div>
          </details>
        ) : null}
        {mayWrite ? (
          <div className="flex flex-wrap gap-2 print:hidden">
            <ButtonLink href={`/sweeps/import?build=${buildId}&step=${step.id}`}>
              Import sweeps
            </ButtonLink>
            {step.sweeps.some((sweep) => sweep.purpose === "product") && !step.onRecord ? (
              <ActionButton action={() => actions.record(step.id)}>
                Put on the line of record
              </ActionButton>
            ) : null}
            <ActionButton
              action={async () => {
                setEditing(!editing);
                return { ok: true };
              }}
            >
              {editing ? "Close" : "Edit step"}
            </ActionButton>
            {isLast && step.position > 0 && step.sweeps.length === 0 ? (
              <ActionButton action={() => actions.remove(step.id)}>Take step away</ActionButton>
            ) : null}
          </div>
        ) : null}
      </div>
    </li>
  );
}

function Deltas({ step }: { step: RungStep }) {
  if (step.sweeps.length === 0) return null;
  if (step.againstPrevious.length === 0 && step.againstStart.length === 0)
    return (
      <p className="text-ink-soft">
        No delta: no earlier sweep has the same purpose and an overlapping span.
      </p>
    );
  return (
    <>
      <DeltaGroup title={`Against step ${step.position - 1}`} deltas={step.againstPrevious} />
      {step.position > 1 ? (
        <details>
          <summary className="cursor-pointer text-sm text-deep underline">Against step 0</summary>
          <div className="mt-3">
            <DeltaGroup title="Against step 0" deltas={step.againstStart} />
          </div>
        </details>
      ) : null}
    </>
  );
}

function DeltaGroup({ title, deltas }: { title: string; deltas: SweepDelta[] }) {
  if (deltas.length === 0) return null;
  return (
    <div className="border border-rule bg-sheet px-4 py-3">
      <h4 className="mb-2 font-medium">{title}</h4>
      <div className="space-y-4">
        {deltas.map((delta) => (
          <div key={`${delta.beforeName} ${delta.afterName}`}>
            {deltas.length > 1 ? <p className="text-sm text-ink-soft">{delta.afterName}</p> : null}
            <DeltaSummary delta={delta} />
          </div>
        ))}
      </div>
    </div>
  );
}

/** The sentence and the changes of margin; the numbers behind them on request. */
function DeltaSummary({ delta }: { delta: SweepDelta }) {
  const { changes } = delta;
  if (!changes) return <DeltaTable delta={delta} />;
  const told = changes.margins.filter(
    (margin) => margin.beforeDb !== null || margin.afterDb !== null,
  );
  return (
    <>
      <p>{changes.sentence}</p>
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
              <DeltaValue changeDb={margin.changeDb} better="up" />
            )}
          </li>
        ))}
      </ul>
      <details className="mt-2">
        <summary className="cursor-pointer text-sm text-deep underline">All numbers</summary>
        <div className="mt-3">
          <DeltaTable delta={delta} />
        </div>
      </details>
    </>
  );
}
