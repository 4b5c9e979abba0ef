"use client";

import { useMemo, useState } from "react";
import { CoastChart } from "@/components/charts/coast-chart";
import { useTraceViews } from "@/components/sweeps/use-trace-views";
import { useUrlView } from "@/components/sweeps/use-url-view";
import { SelectField } from "@/components/ui/select-field";
import { lineRanges } from "@/lib/core/mask/limit-at";
import type { Mask } from "@/lib/core/mask/mask";
import type { Detector, Hold } from "@/lib/core/sweep/settings";

export interface OverlaySweep {
  id: string;
  label: string;
  trace: {
    position: number;
    detector: Detector | null;
    hold: Hold;
    firstHz: number;
    lastHz: number;
  };
}

interface OverlayProps {
  sweeps: OverlaySweep[];
  before: string;
  after: string;
  /** The one that overlaps most with what is shown is drawn. */
  masks: Mask[];
}

const NONE: never[] = [];

/** Two sweeps of the ladder over each other: the later one as water, the earlier as an outline. */
export function Overlay({ sweeps, masks, ...initial }: OverlayProps) {
  const [before, setBefore] = useState(initial.before);
  const [after, setAfter] = useState(initial.after);
  const shown = useMemo(() => {
    const find = (id: string) => sweeps.find((sweep) => sweep.id === id);
    return [
      { sweep: find(after), role: "main" as const },
      { sweep: find(before), role: "outline" as const },
    ].flatMap(({ sweep, role }) =>
      sweep ? [{ ...sweep.trace, sweepId: sweep.id, name: sweep.label, role }] : [],
    );
  }, [sweeps, before, after]);
  const extent = useMemo(
    () => ({
      fromHz: Math.min(...shown.map((trace) => trace.firstHz)),
      toHz: Math.max(...shown.map((trace) => trace.lastHz)),
    }),
    [shown],
  );
  const mask = useMemo(() => widestMask(masks, extent), [masks, extent]);
  const { view, setView, setScale } = useUrlView(extent);
  const { traces, state } = useTraceViews(shown, view, extent);
  const options = sweeps.map(({ id, label }) => ({ value: id, label }));
  return (
    <>
      <div className="grid max-w-3xl gap-x-5 print:hidden sm:grid-cols-2">
        <SelectField
          label="Before, as an outline"
          options={options}
          value={before}
          onChange={(event) => setBefore(event.target.value)}
        />
        <SelectField
          label="After, as water"
          options={options}
          value={after}
          onChange={(event) => setAfter(event.target.value)}
        />
      </div>
      <CoastChart
        traces={traces}
        mask={mask}
        suspects={NONE}
        view={view}
        extent={extent}
        scale={view.scale}
        onView={setView}
        onScale={setScale}
        highlighted={null}
        onHighlight={() => undefined}
        state={state}
        label="Before and after"
      />
    </>
  );
}

/** The mask that shares most of the span, on a log axis; null without any. */
function widestMask(masks: Mask[], extent: { fromHz: number; toHz: number }): Mask | null {
  const shared = (mask: Mask) =>
    mask.lines.flatMap(lineRanges).reduce((sum, { startHz, stopHz }) => {
      const [from, to] = [Math.max(startHz, extent.fromHz), Math.min(stopHz, extent.toHz)];
      return sum + (to > from ? Math.log(to / from) : 0);
    }, 0);
  const [best] = masks
    .map((mask) => ({ mask, width: shared(mask) }))
    .filter(({ width }) => width > 0)
    .sort((a, b) => b.width - a.width);
  return best?.mask ?? null;
}
