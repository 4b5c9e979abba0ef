"use client";

import { keepPreviousData, useQueries } from "@tanstack/react-query";
import { useMemo } from "react";
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

/** Data and state of some queries; the same object as long as nothing in it changes. */
function combine(queries: { data: TraceView | undefined; isError: boolean }[]) {
  const state: CoastState = queries.some((query) => query.isError)
    ? "error"
    : queries.some((query) => !query.data)
      ? "loading"
      : "ready";
  return { state, views: queries.map((query) => query.data ?? null) };
}

/** Traces for the coast chart: the part in view, and the whole of each for the strip below. */
export function useTraceViews(
  traces: ShownTrace[],
  view: UrlView,
  extent: { fromHz: number; toHz: number },
): { traces: CoastTrace[]; state: CoastState } {
  const whole = { ...extent, scale: view.scale };
  const queries = [...queriesOf(traces, view), ...queriesOf(traces, whole)];
  const { state, views } = useQueries({ queries, combine });
  const drawn = useMemo(
    () =>
      traces.map(({ sweepId, position, name, role, detector, hold }, i): CoastTrace => ({
        id: `${sweepId} ${position}`,
        name,
        role,
        detector,
        hold,
        view: views[i] ?? null,
        overview: views[traces.length + i] ?? null,
      })),
    [traces, views],
  );
  return { state, traces: drawn };
}
