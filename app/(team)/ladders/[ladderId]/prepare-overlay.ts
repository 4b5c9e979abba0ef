import type { OverlaySweep } from "@/components/ladders/overlay";
import type { LadderDetail, LadderStep } from "@/lib/queries/ladder/load-ladder-steps";

/** Product sweeps of the ladder with the trace that is drawn: their first one. */
export function overlaySweeps(steps: LadderStep[]): OverlaySweep[] {
  return steps.flatMap((step) =>
    step.sweeps
      .filter((sweep) => sweep.purpose === "product")
      .flatMap((sweep) => {
        const [trace] = sweep.traces;
        if (!trace) return [];
        const { detector, hold, firstHz, lastHz } = trace;
        return [
          {
            id: sweep.id,
            label: `Step ${step.position}: ${sweep.name}`,
            trace: { position: 0, detector, hold, firstHz, lastHz },
          },
        ];
      }),
  );
}

/** The last step that has a counterpart in step 0. */
export function chooseOverlay(ladder: LadderDetail): { before: string; after: string } | null {
  for (const step of [...ladder.steps].reverse()) {
    const [delta] = step.againstStart;
    if (delta) return { before: delta.beforeId, after: delta.afterId };
  }
  return null;
}
