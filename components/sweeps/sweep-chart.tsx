"use client";

import { useMemo, useState } from "react";
import { CoastChart } from "@/components/charts/coast-chart";
import type { SuspectFollowMark, SuspectTableFilter } from "@/components/suspects/filter-suspects";
import { filterSuspects, joinSuspects } from "@/components/suspects/filter-suspects";
import type { Act } from "@/components/suspects/outcome";
import type { Mask } from "@/lib/core/mask/mask";
import type { SuspectAmbient } from "@/lib/core/reading/ambient-check";
import type { Suspect } from "@/lib/core/reading/reading";
import type { KnownClock } from "./clock-harmonics";
import { harmonicsIn } from "./clock-harmonics";
import { SuspectTable } from "./suspect-table";
import type { ShownTrace } from "./use-trace-views";
import { useTraceViews } from "./use-trace-views";
import { useUrlView } from "./use-url-view";

interface SweepChartProps {
  name: string;
  traces: ShownTrace[];
  extent: { fromHz: number; toHz: number };
  stepHz: number | null;
  mask: Mask | null;
  suspects: Suspect[];
  guardDb: number;
  /** Known clocks of the build; their harmonics are marked when switched on. */
  clocks: KnownClock[];
  /** What the ambient sweeps of the day say beside each suspect; left out without any. */
  ambient?: SuspectAmbient[] | undefined;
  /** Which suspects the program follows; left out where nothing is followed. */
  followed?: SuspectFollowMark[] | undefined;
  /** Follows one suspect by its number; left out when the reader may not. */
  follow?: ((number: number) => ReturnType<Act>) | undefined;
  /** Follows every suspect over or inside guard; left out when the reader may not. */
  followNear?: Act | undefined;
}

/** So many of the worst suspects in view carry a buoy; zooming in shows the next ones. */
const MOST_BUOYS = 15;

const idOf = (trace: ShownTrace) => `${trace.sweepId} ${trace.position}`;

/** The coast chart of a sweep with its suspects below; pointing at either marks both. */
export function SweepChart(props: SweepChartProps) {
  const { name, extent, stepHz, mask, suspects, guardDb } = props;
  const [highlighted, setHighlighted] = useState<number | null>(null);
  const [hidden, setHidden] = useState<string[]>([]);
  const [marksClocks, setMarksClocks] = useState(false);
  const { view, setView, setScale } = useUrlView(extent);
  const clockMarks = useMemo(
    () => (marksClocks ? harmonicsIn(props.clocks, view) : []),
    [marksClocks, props.clocks, view],
  );
  const all = props.traces;
  const shown = useMemo(() => all.filter((t) => !hidden.includes(idOf(t))), [all, hidden]);
  const { traces, state } = useTraceViews(shown, view, extent);
  const [filter, setFilter] = useState<SuspectTableFilter>({ text: "", hidesAmbient: false });
  const listed = useMemo(
    () => joinSuspects(suspects, props.ambient, props.followed),
    [suspects, props.ambient, props.followed],
  );
  // What the table hides has no buoy either, so that the two show the same numbers.
  const left = useMemo(() => filterSuspects(listed, filter, stepHz), [listed, filter, stepHz]);
  const marked = useMemo(
    () =>
      left
        .filter((s) => s.frequencyHz >= view.fromHz && s.frequencyHz <= view.toHz)
        .slice(0, MOST_BUOYS),
    [left, view],
  );
  return (
    <>
      {props.traces.length > 1 || props.clocks.length > 0 ? (
        <fieldset className="mb-3 flex flex-wrap gap-x-5 gap-y-1 print:hidden">
          <legend className="sr-only">What is shown</legend>
          {props.traces.map((trace) => (
            <label key={idOf(trace)} className="flex items-center gap-1.5">
              <input
                type="checkbox"
                checked={!hidden.includes(idOf(trace))}
                onChange={(event) =>
                  setHidden((now) =>
                    event.target.checked
                      ? now.filter((id) => id !== idOf(trace))
                      : [...now, idOf(trace)],
                  )
                }
              />
              {trace.name}
            </label>
          ))}
          {props.clocks.length > 0 ? (
            <label className="flex items-center gap-1.5">
              <input
                type="checkbox"
                checked={marksClocks}
                onChange={(event) => setMarksClocks(event.target.checked)}
              />
              Known clocks
            </label>
          ) : null}
        </fieldset>
      ) : null}
      <CoastChart
        traces={traces}
        mask={mask}
        suspects={marked}
        view={view}
        extent={extent}
        scale={view.scale}
        onView={setView}
        onScale={setScale}
        highlighted={highlighted}
        onHighlight={setHighlighted}
        state={state}
        label={mask ? `${name} against ${mask.title}` : name}
        guardDb={guardDb}
        clocks={clockMarks}
      />
      {mask ? (
        <SuspectTable
          all={listed}
          shown={left}
          filter={filter}
          onFilter={setFilter}
          stepHz={stepHz}
          unit={mask.unit}
          exportName={`${name} suspects`}
          highlighted={highlighted}
          onHighlight={setHighlighted}
          hasAmbient={(props.ambient ?? []).length > 0}
          hasFollowed={props.followed !== undefined}
          follow={props.follow}
          followNear={props.followNear}
        />
      ) : null}
    </>
  );
}
