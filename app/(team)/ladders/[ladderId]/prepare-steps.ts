import { marginNow } from "@/components/charts/prepare-waterfall";
import type { RungStep } from "@/components/ladders/rung-types";
import type { WaterfallView } from "@/components/ladders/waterfall";
import { linesOfLadder, waterfallOf } from "@/lib/core/delta/waterfall";
import { formatFrequency, formatMargin } from "@/lib/core/units/format";
import type { LadderDetail, LadderStep } from "@/lib/queries/ladder/load-ladder-steps";
import { worstOf } from "@/lib/queries/sweep/worst-of";

/** What the ladder did to its worst margin, from step 0 to the product as it stands; null when it cannot be told. */
export function ladderAnswer(steps: LadderStep[]): { changeDb: number; text: string } | null {
  const last = steps.findLast((step) => step.isOnLine && step.sweeps.length > 0);
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

/** For each mask line that has any margin: what every step bought, whole and band by band. */
export function waterfallsOf(ladder: LadderDetail): WaterfallView[] {
  const { steps, fromMemory } = ladder;
  const now = (view: WaterfallView) => marginNow(view.parts[0]?.bars ?? []) ?? Infinity;
  return linesOfLadder(steps)
    .map(({ maskRevisionId, maskTitle, lineName, guardDb, bands }): WaterfallView => {
      const part = (key: string, title: string, band: (typeof bands)[number] | null) => ({
        key,
        title,
        bars: waterfallOf(steps, { maskRevisionId, lineName, band }),
      });
      return {
        key: `${maskRevisionId} ${lineName}`,
        title: `${lineName} line of ${maskTitle}`,
        isFromMemory: fromMemory.includes(maskRevisionId),
        guardDb,
        parts: [
          part("whole", "Whole line", null),
          ...(bands.length > 1 ? bands : []).map((band) =>
            part(
              `${band.startHz} ${band.stopHz}`,
              `${formatFrequency(band.startHz)} to ${formatFrequency(band.stopHz)}`,
              band,
            ),
          ),
        ],
      };
    })
    .sort((a, b) => now(a) - now(b));
}

/** A step as its rung shows it: no more of its sweeps than their names. */
export function rungOf({ sweeps, ...step }: LadderStep): RungStep {
  return { ...step, sweeps: sweeps.map(({ id, name, purpose }) => ({ id, name, purpose })) };
}
