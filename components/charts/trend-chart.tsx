"use client";

import Link from "next/link";
import { useId, useMemo } from "react";
import { STANDING_LABELS, STANDINGS } from "@/lib/core/reading/reading";
import { formatMargin } from "@/lib/core/units/format";
import { ChartFrame } from "./chart-frame";
import { EmptyPlot } from "./empty-plot";
import { prepareTrend } from "./prepare-trend";
import { StandingShape } from "./standing-shape";
import type { TrendMilestone, TrendSeries } from "./trend-data";
import { TrendMilestones } from "./trend-milestones";
import { TrendLines } from "./trend-lines";
import { TrendShore } from "./trend-shore";
import { useWidth } from "./use-width";

export interface TrendChartProps {
  series: TrendSeries[];
  targetDb: number;
  milestones: TrendMilestone[];
  /** ISO date. */
  today: string;
  height?: number;
}

/** Worst margin over builds per mask: above zero is water, below it land. */
export function TrendChart(props: TrendChartProps) {
  const { series, targetDb, milestones, today, height = 300 } = props;
  const [measure, width] = useWidth();
  const id = useId();
  const prepared = useMemo(
    () =>
      prepareTrend({ series, targetDb, milestones, today, width: Math.max(240, width), height }),
    [series, targetDb, milestones, today, width, height],
  );
  if (series.every((one) => one.points.length === 0))
    return (
      <EmptyPlot height={height}>No margins yet. They appear with the first reading.</EmptyPlot>
    );
  const { axis, levels, margin, lines } = prepared;
  return (
    <figure ref={measure} className="m-0 min-w-0" style={{ minHeight: height }}>
      {width > 0 ? (
        <div className="relative">
          <ChartFrame
            {...{ width, height, margin }}
            label={prepared.summary}
            x={{ kind: "linear", from: axis.from, to: axis.to, ticks: axis.ticks }}
            y={{
              kind: "linear",
              from: levels.fromDb,
              to: levels.toDb,
              ticks: prepared.levelTicks,
            }}
          >
            <TrendShore
              {...{ id, width, height, margin }}
              zeroY={prepared.zeroY}
              targetY={prepared.targetY}
              target={`target ${formatMargin(targetDb)}`}
            />
            <TrendMilestones {...{ height, margin }} prepared={prepared} />
            <TrendLines prepared={prepared} width={width} />
            <text x={0} y={11} fontSize="11" fill="var(--ink-soft)">
              Margin, dB
            </text>
          </ChartFrame>
          {lines.flatMap(({ key, marks }) =>
            marks.map((mark, i) =>
              mark.href ? (
                <Link
                  key={`${key}-${i}`}
                  href={mark.href}
                  aria-label={mark.text}
                  title={mark.text}
                  className="absolute block h-6 w-6 rounded-full"
                  style={{ left: mark.x - 12, top: mark.y - 12 }}
                />
              ) : null,
            ),
          )}
        </div>
      ) : null}
      {prepared.compact ? (
        <ul className="mt-1 text-[0.8rem]">
          {prepared.names.map(({ key, rows, last }, i) => (
            <li key={key}>
              <svg width="30" height="8" aria-hidden="true" className="inline-block">
                <path
                  d="M1,4H29"
                  stroke={lines[i]?.style.stroke}
                  strokeWidth="1.5"
                  strokeDasharray={lines[i]?.style.dash}
                />
              </svg>{" "}
              {rows.join(" ")} <span className="font-mono">{last}</span>
            </li>
          ))}
        </ul>
      ) : null}
      <ul className="mt-1 flex flex-wrap gap-x-4 text-[0.8rem] text-ink-soft">
        {STANDINGS.map((standing) => (
          <li key={standing}>
            <StandingShape standing={standing} size={13} /> {STANDING_LABELS[standing]}
          </li>
        ))}
      </ul>
      {prepared.notes.map((note) => (
        <p key={note} className="mt-1 text-[0.8rem] text-ink-soft">
          {note}
        </p>
      ))}
    </figure>
  );
}
