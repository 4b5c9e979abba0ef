"use client";

import { keepPreviousData, useQueries } from "@tanstack/react-query";
import type { CoastState, CoastTrace } from "@/components/charts/coast-trace";
import type { Detector, Hold } from "@/lib/core/sweep/settings";
import type { TraceView } from "@/lib/core/sweep/trace-view";
import type { UrlView } from "./use-url-view";

export interface ShownTrace {
  sweepId: string;
  position: number;
  name: string;
  role: CoastTrace["role"];
  detector: Detector | null;
  hold: Hold;
}

async function fetchView(trace: ShownTrace, view: UrlView): Promise<TraceView> {
  const query = new URLSearchParams({
    fromHz: String(view.fromHz),
    toHz: String(view.toHz),
    scale: view.scale,
  });
  const answer = await fetch(`/api/v1/sweeps/${trace.sweepId}/traces/${trace.position}?${query}`);
  if (!answer.ok) throw new Error(`The trace could not be read (${answer.status}).`);
  return (await answer.json()) as TraceView;
}

function queriesOf(traces: ShownTrace[], view: UrlView) {
  return traces.map((trace) => ({
    queryKey: ["trace", trace.sweepId, trace.position, view.fromHz, view.toHz, view.scale],
    queryFn: () => fetchView(trace, view),
    placeholderData: keepPreviousData<TraceView | undefined>,
  }));
}

/** Traces for the coast chart: the part in view, and the whole of each for the strip below. */
export function useTraceViews(
  traces: ShownTrace[],
  view: UrlView,
  extent: { fromHz: number; toHz: number },
): { traces: CoastTrace[]; state: CoastState } {
  const inView = useQueries({ queries: queriesOf(traces, view) });
  const whole = useQueries({ queries: queriesOf(traces, { ...extent, scale: view.scale }) });
  const all = [...inView, ...whole];
  const state = all.some((query) => query.isError)
    ? "error"
    : all.some((query) => !query.data)
      ? "loading"
      : "ready";
  return {
    state,
    traces: traces.map(({ sweepId, position, name, role, detector, hold }, i) => ({
      id: `${sweepId} ${position}`,
      name,
      role,
      detector,
      hold,
      view: inView[i]?.data ?? null,
      overview: whole[i]?.data ?? null,
    })),
  };
}
