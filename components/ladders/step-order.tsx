"use client";

import { ActionButton } from "@/components/ui/action-button";
import { misplacedBranch } from "@/lib/core/delta/ladder-order";
import type { ActionResult } from "./rung-types";

interface StepOrderProps {
  step: { id: string; position: number };
  steps: readonly { id: string; branchOfId: string | null }[];
  reorder: (stepIds: string[]) => Promise<ActionResult>;
}

/** Buttons that move a step by one place. A move that would part a branch from its start is none. */
export function StepOrder({ step, steps, reorder }: StepOrderProps) {
  const moved = (by: 1 | -1) => {
    const [from, to] = [step.position, step.position + by];
    if (from === 0 || to < 1 || to >= steps.length) return null;
    const next = steps.map((one, i) => steps[i === from ? to : i === to ? from : i] ?? one);
    const ordered = next.map((one) => ({ ...one, state: "kept" as const }));
    return misplacedBranch(ordered) ? null : next.map((one) => one.id);
  };
  const [up, down] = [moved(-1), moved(1)];
  return (
    <>
      {up ? <ActionButton action={() => reorder(up)}>Move up</ActionButton> : null}
      {down ? <ActionButton action={() => reorder(down)}>Move down</ActionButton> : null}
    </>
  );
}
