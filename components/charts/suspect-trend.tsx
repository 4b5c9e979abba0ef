"use client";

import Link from "next/link";
import { useId, useMemo } from "react";
import { STANDING_LABELS, STANDINGS } from "@/lib/core/reading/reading";
import type { LevelUnit } from "@/lib/core/units/level-units";
import { LEVEL_UNIT_LABELS } from "@/lib/core/units/level-units";
import { ChartFrame } from "./chart-frame";
import { EmptyPlot } from "./empty-plot";
import { Land } from "./land";
import type { SuspectTrendPanel } from "./prepare-suspect-trend";
import { prepareSuspectTrend } from "./prepare-suspect-trend";
import { StandingMark, StandingShape } from "./standing-shape";
import type { SuspectTrendPoint } from "./suspect-trend-data";
import { useWidth } from "./use-width";

const MARGIN_PX = 220;
const LEVEL_PX = 170;

interface SuspectTrendProps {
  /** In the order of builds. */
  points: SuspectTrendPoint[];
  unit: LevelUnit;
}

/** Margin and level of one followed suspect over the builds of its program. */
export function SuspectTrend({ points, unit }: SuspectTrendProps) {
  const [measure, width] = useWidth();
  const id = useId();
  const prepared = useMemo(
    () =>
      prepareSuspectTrend({
        points,
        unit,
        width: Math.max(240, width),
        marginHeight: MARGIN_PX,
        levelHeight: LEVEL_PX,
      }),
    [points, unit, width],
  );
  if (points.every((point) => point.kind !== "seen"))
    return (
      <EmptyPlot height={MARGIN_PX}>
        No sweep on the line of record shows this suspect yet.
      </EmptyPlot>
    );
  const { marginPanel, levelPanel } = prepared;
  const right = width - marginPanel.margin.right;
  const shore = `M${marginPanel.margin.left},${marginPanel.zeroY}H${right}`;
  const land = `${shore}V${MARGIN_PX - marginPanel.margin.bottom}H${marginPanel.margin.left}Z`;
  return (
    <figure ref={measure} className="m-0 min-w-0" style={{ minHeight: MARGIN_PX + LEVEL_PX }}>
      {width > 0 ? (
        <>
          <Panel
            {...{ width, prepared }}
            panel={marginPanel}
            height={MARGIN_PX}
            title="Margin, dB"
            label={prepared.summary}
          >
            <Land coastline={{ land, shore }} id={id} />
            <path d={shore} fill="none" stroke="var(--land-edge)" strokeWidth="1.75" />
            <text
              x={marginPanel.margin.left + 6}
              y={marginPanel.zeroY + 13}
              fontSize="11"
              fontWeight="500"
              fill="var(--ink)"
            >
              mask
            </text>
          </Panel>
          <Panel
            {...{ width, prepared }}
            panel={levelPanel}
            height={LEVEL_PX}
            title={`Level, ${LEVEL_UNIT_LABELS[unit]}`}
            label={`Level of the same sightings. ${prepared.summary}`}
          />
        </>
      ) : null}
      <ul className="mt-1 flex flex-wrap gap-x-4 text-[0.8rem] text-ink-soft">
        {STANDINGS.map((standing) => (
          <li key={standing}>
            <StandingShape standing={standing} size={13} /> {STANDING_LABELS[standing]}
          </li>
        ))}
        <li>
          <svg width="13" height="13" viewBox="0 0 13 13" aria-hidden className="inline-block">
            <NotSeenMark x={6.5} y={6.5} />
          </svg>{" "}
          not seen: swept, but no peak stood out within 20 dB of the mask
        </li>
      </ul>
      {prepared.notes.map((note) => (
        <p key={note} className="mt-1 text-[0.8rem] text-ink-soft">
          {note}
        </p>
      ))}
    </figure>
  );
}

function NotSeenMark({ x, y }: { x: number; y: number }) {
  return (
    <path
      d={`M${x - 5},${y - 4}H${x + 5}L${x},${y + 5}Z`}
      fill="var(--sheet)"
      stroke="var(--ink-soft)"
      strokeWidth="1.25"
    />
  );
}

function Panel(props: {
  width: number;
  height: number;
  panel: SuspectTrendPanel;
  prepared: ReturnType<typeof prepareSuspectTrend>;
  title: string;
  label: string;
  children?: React.ReactNode;
}) {
  const { width, height, panel, prepared, title, label, children } = props;
  const { axis } = prepared;
  return (
    <div className="relative">
      <ChartFrame
        {...{ width, height, label }}
        margin={panel.margin}
        x={{ kind: "linear", from: axis.from, to: axis.to, ticks: axis.ticks }}
        y={{
          kind: "linear",
          from: panel.levels.fromDb,
          to: panel.levels.toDb,
          ticks: panel.ticks,
        }}
      >
        {children}
        <path d={panel.path} fill="none" stroke="var(--deep)" strokeWidth="1.5" />
        {panel.marks.map((mark, i) =>
          mark.standing ? (
            <StandingMark key={i} standing={mark.standing} x={mark.x} y={mark.y} radius={5} />
          ) : (
            <circle key={i} cx={mark.x} cy={mark.y} r={3.5} fill="var(--deep)" />
          ),
        )}
        {panel.notSeen.map(({ x, y, word }) => (
          <g key={x}>
            <NotSeenMark x={x} y={y} />
            <text x={x} y={y - 8} fontSize="11" textAnchor="middle" fill="var(--ink-soft)">
              {word}
            </text>
          </g>
        ))}
        <text x={0} y={11} fontSize="11" fill="var(--ink-soft)">
          {title}
        </text>
      </ChartFrame>
      {panel.marks.map((mark, i) =>
        mark.href ? (
          <Link
            key={i}
            href={mark.href}
            aria-label={mark.text}
            title={mark.text}
            className="absolute block h-6 w-6 rounded-full"
            style={{ left: mark.x - 12, top: mark.y - 12 }}
          />
        ) : null,
      )}
    </div>
  );
}
