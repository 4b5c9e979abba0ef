"use client";

import Link from "next/link";
import { useState } from "react";
import { UnconfirmedMark } from "@/components/masks/unconfirmed-mark";
import { LinkFacts } from "@/components/sweeps/sweep-facts";
import { ActionButton } from "@/components/ui/action-button";
import { ButtonLink } from "@/components/ui/button";
import { formatMargin } from "@/lib/core/units/format";
import { StandingMark } from "../readings/standing-mark";
import { RungDeltas } from "./rung-deltas";
import { RungDoubts } from "./rung-doubts";
import type { RungActions, RungStep } from "./rung-types";
import { StepForm } from "./step-form";
import { StepOrder } from "./step-order";

interface RungProps {
  step: RungStep;
  /** All steps of the ladder in their order. */
  steps: { id: string; position: number; name: string; branchOfId: string | null }[];
  buildId: string;
  mayWrite: boolean;
  actions: RungActions;
  /** Mask revisions that nobody confirmed. */
  fromMemory: readonly string[];
}

/** A step of the ladder: where it stands, what it changed, its sweeps and its link settings. */
export function Rung({ step, steps, buildId, mayWrite, actions, fromMemory }: RungProps) {
  const [editing, setEditing] = useState(false);
  const isLast = steps.at(-1)?.id === step.id;
  return (
    <li
      className={`relative border-l-2 pb-8 pl-8 last:pb-2 ${step.isOnLine ? "border-deep" : "border-dashed border-ink-soft"}`}
    >
      <span
        aria-hidden
        className={`absolute top-0 -left-4 flex h-8 w-8 items-center justify-center rounded-full border-2 ${step.isOnLine ? "border-deep" : "border-dashed border-ink-soft"} bg-paper font-mono text-sm`}
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
          <p className="text-sm">{placeOf(step)}</p>
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
              {step.worst.lineName} line of {step.worst.maskTitle}{" "}
              <UnconfirmedMark provenance={step.worst.provenance} />
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
            earlier={steps.slice(0, step.position)}
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
        <RungDoubts doubts={step.doubts} />
        <RungDeltas step={step} actions={mayWrite ? actions : null} fromMemory={fromMemory} />
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
            {step.position > 0 ? (
              <ActionButton
                action={() => actions.mark(step.id, step.state === "kept" ? "dropped" : "kept")}
              >
                {step.state === "kept" ? "Mark as dropped" : "Mark as kept"}
              </ActionButton>
            ) : null}
            <StepOrder step={step} steps={steps} reorder={actions.reorder} />
            {isLast && step.position > 0 && step.sweeps.length === 0 ? (
              <ActionButton action={() => actions.remove(step.id)}>Take step away</ActionButton>
            ) : null}
          </div>
        ) : null}
      </div>
    </li>
  );
}

/** What the step starts from when that goes without saying only in the plain case, and its state. */
function placeOf(step: RungStep): string {
  if (!step.base) return "";
  const branch = step.branchOfId ? `Starts from step ${step.base.position}. ` : "";
  if (step.state === "dropped") return `${branch}Dropped: its change was taken out again.`;
  return step.isOnLine ? branch : `${branch}Kept, but left out by a later branch.`;
}
