"use client";

import { LineSeries } from "@visx/xychart";
import { useMemo } from "react";
import type { FactorPoint, Transducer } from "@/lib/core/bench/signal-path";
import { EmptyPlot } from "./empty-plot";
import { FrequencyFrame } from "./frequency-frame";
import { prepareFactors } from "./prepare-factors";
import { useWidth } from "./use-width";
import { WrittenNames } from "./written-names";

const MARGIN = { top: 24, right: 10, bottom: 24, left: 38 };
const frequencyOf = (point: FactorPoint) => point.frequencyHz;
const factorOf = (point: FactorPoint) => point.factorDb;

/** Factors of transducers over frequency, one line each. */
export function FactorChart(props: { transducers: readonly Transducer[]; height?: number }) {
  const { transducers, height = 240 } = props;
  const [measure, width] = useWidth();
  const prepared = useMemo(
    () => prepareFactors(transducers, Math.max(120, width), height, MARGIN),
    [transducers, width, height],
  );
  return (
    <figure ref={measure} className="m-0 min-w-0" style={{ minHeight: height }}>
      {!prepared ? (
        <EmptyPlot height={height}>No factors yet. Add a frequency and its factor.</EmptyPlot>
      ) : width > 0 ? (
        <>
          <FrequencyFrame
            {...{ width, height }}
            plane={prepared.plane}
            frequencyTicks={prepared.frequencyTicks}
            levelTicks={prepared.levelTicks}
            unit="Factor, dB"
            margin={MARGIN}
            label={prepared.summary}
          >
            {prepared.lines.map(({ key, points, style }) => (
              <LineSeries
                key={key}
                dataKey={key}
                data={points}
                xAccessor={frequencyOf}
                yAccessor={factorOf}
                enableEvents={false}
                stroke={style.stroke}
                strokeWidth={1.5}
                strokeDasharray={style.dash}
              />
            ))}
            <WrittenNames names={prepared.names} />
          </FrequencyFrame>
          {prepared.unplaced.length > 0 ? (
            <p className="mt-1 text-[0.8rem] text-ink-soft">
              Also drawn: {prepared.unplaced.join(", ")}.
            </p>
          ) : null}
        </>
      ) : null}
    </figure>
  );
}
