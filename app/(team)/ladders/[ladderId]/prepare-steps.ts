import { formatMargin } from "@/lib/core/units/format";
import type { LadderStep } from "@/lib/queries/ladder/load-ladder-steps";
import { worstOf } from "@/lib/queries/sweep/worst-of";

/** What the whole ladder did to its worst margin, first step to last; null when it cannot be told. */
export function ladderAnswer(steps: LadderStep[]): { changeDb: number; text: string } | null {
  const last = [...steps].reverse().find((step) => step.sweeps.length > 0);
  if (!last || last.position === 0) return null;
  const changes = last.againstStart.flatMap((delta) => delta.changes?.margins ?? []);
  const worst = worstOf(
    changes
      .filter((margin) => margin.afterDb !== null)
      .map((margin) => ({
        ...margin,
        standing: margin.afterStanding,
        marginDb: margin.afterDb,
      })),
  );
  if (!worst || worst.changeDb === null) return null;
  return {
    changeDb: worst.changeDb,
    text: `bought from step 0 to step ${last.position} on the line that is now the worst: ${worst.lineName} of ${worst.maskTitle}, from ${formatMargin(worst.beforeDb)} to ${formatMargin(worst.afterDb)}.`,
  };
}

/** For each mask line that has any margin: the change of every step against the one before. */
export function boughtPerLine(steps: LadderStep[]) {
  const lines = new Map<string, string>();
  for (const step of steps) {
    for (const sweep of step.sweeps) {
      for (const reading of sweep.readings) {
        for (const line of reading.lines) {
          if (line.marginDb !== null && sweep.purpose === "product")
            lines.set(
              `${reading.maskRevisionId} ${line.name}`,
              `${line.name} line of ${reading.maskTitle}`,
            );
        }
      }
    }
  }
  return [...lines].map(([key, title]) => ({
    key,
    title,
    items: steps.slice(1).map((step) => {
      const found = step.againstPrevious
        .flatMap((delta) => delta.changes?.margins ?? [])
        .find((margin) => `${margin.maskRevisionId} ${margin.lineName}` === key);
      return { label: `${step.position} ${step.name}`, changeDb: found?.changeDb ?? null };
    }),
  }));
}
