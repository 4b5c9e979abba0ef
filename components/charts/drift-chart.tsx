"use client";

import Link from "next/link";
import { useMemo } from "react";
import { ChartFrame } from "./chart-frame";
import { EmptyPlot } from "./empty-plot";
import type { DriftPoint } from "./prepare-drift";
import { prepareDrift } from "./prepare-drift";
import { useWidth } from "./use-width";

interface DriftChartProps {
  points: DriftPoint[];
  references: string[];
  toleranceDb: number;
  /** ISO date. */
  today: string;
  height?: number;
}

const WORST = { stroke: "var(--deep)", dash: undefined };
const MEAN = { stroke: "var(--ink)", dash: "5 3" };

/** Drift of a bench over the days of its checks; open water between the edges of the tolerance. */
export function DriftChart(props: DriftChartProps) {
  const { points, references, toleranceDb, today, height = 260 } = props;
  const [measure, width] = useWidth();
  const drift = useMemo(
    () =>
      prepareDrift({
        points,
        references,
        toleranceDb,
        today,
        width: Math.max(240, width),
        height,
      }),
    [points, references, toleranceDb, today, width, height],
  );
  if (points.length === 0)
    return (
      <EmptyPlot height={height}>
        No drift yet. It appears with the first check after the reference.
      </EmptyPlot>
    );
  const { axis, levels, margin, band } = drift;
  const right = width - margin.right;
  const across = `${margin.left},${band.zeroY}H${right}`;
  return (
    <figure ref={measure} className="m-0 min-w-0" style={{ minHeight: height }}>
      {width > 0 ? (
        <div className="relative">
          <ChartFrame
            {...{ width, height, margin }}
            label={drift.summary}
            x={{ kind: "linear", from: axis.from, to: axis.to, ticks: axis.ticks }}
            y={{ kind: "linear", from: levels.fromDb, to: levels.toDb, ticks: drift.levelTicks }}
          >
            <rect
              x={margin.left}
              y={band.topY}
              width={Math.max(0, right - margin.left)}
              height={band.bottomY - band.topY}
              fill="var(--water-1)"
            />
            {[band.topY, band.bottomY].map((y) => (
              <path
                key={y}
                d={`M${margin.left},${y}H${right}`}
                stroke="var(--land-edge)"
                strokeWidth="1.25"
              />
            ))}
            <path d={`M${across}`} stroke="var(--ink-soft)" strokeWidth="1" />
            <text x={right - 6} y={band.topY - 5} textAnchor="end" fontSize="11" fill="var(--ink)">
              tolerance ±{toleranceDb} dB
            </text>
            {drift.referenceXs.map((x, i) => (
              <path
                key={i}
                d={`M${x},${margin.top}V${height - margin.bottom}`}
                stroke="var(--ink-soft)"
                strokeDasharray="1.5 3.5"
              />
            ))}
            <path
              d={drift.meanPath}
              fill="none"
              stroke={MEAN.stroke}
              strokeDasharray={MEAN.dash}
              strokeLinecap="round"
            />
            <path
              d={drift.worstPath}
              fill="none"
              stroke={WORST.stroke}
              strokeWidth="1.5"
              strokeLinejoin="round"
              strokeLinecap="round"
            />
            {drift.marks.map((mark, i) => (
              <DriftMark key={i} {...mark} />
            ))}
            {drift.names.map(({ key, text, x, y }) => (
              <text key={key} x={x} y={y + 4} fontSize="11" fontWeight="500" fill="var(--ink)">
                {text}
              </text>
            ))}
            <text x={0} y={11} fontSize="11" fill="var(--ink-soft)">
              Drift, dB
            </text>
          </ChartFrame>
          {drift.marks.map(({ x, y, text, href }, i) => (
            <Link
              key={i}
              href={href}
              aria-label={text}
              title={text}
              className="absolute block h-6 w-6 rounded-full"
              style={{ left: x - 12, top: y - 12 }}
            />
          ))}
        </div>
      ) : null}
      <ul className="mt-1 flex flex-wrap gap-x-5 text-[0.8rem] text-ink-soft">
        {drift.compact
          ? [
              { text: "largest drift", ...WORST },
              { text: "mean drift", ...MEAN },
            ].map(({ text, stroke, dash }) => (
              <li key={text}>
                <svg width="30" height="8" aria-hidden="true" className="inline-block">
                  <path d="M1,4H29" stroke={stroke} strokeWidth="1.5" strokeDasharray={dash} />
                </svg>{" "}
                {text}
              </li>
            ))
          : null}
        {[false, true].map((drifted) => (
          <li key={String(drifted)}>
            <svg width="14" height="14" viewBox="0 0 14 14" aria-hidden="true" className="inline">
              <DriftMark x={7} y={7} drifted={drifted} />
            </svg>{" "}
            {drifted ? "outside the tolerance" : "within the tolerance"}
          </li>
        ))}
        {drift.referenceXs.length > 0 ? (
          <li>
            <svg width="14" height="14" viewBox="0 0 14 14" aria-hidden="true" className="inline">
              <path d="M7,0V14" stroke="var(--ink-soft)" strokeDasharray="1.5 2.5" />
            </svg>{" "}
            a reference was taken
          </li>
        ) : null}
      </ul>
    </figure>
  );
}

/** A ring inside the tolerance, a solid diamond outside it: told apart without colour. */
function DriftMark({ x, y, drifted }: { x: number; y: number; drifted: boolean }) {
  return drifted ? (
    <path d={`M${x},${y - 6}L${x + 6},${y}L${x},${y + 6}L${x - 6},${y}Z`} fill="var(--shoal)" />
  ) : (
    <circle cx={x} cy={y} r="4.5" fill="var(--sheet)" stroke="var(--deep)" strokeWidth="1.5" />
  );
}
