"use client";

import { useId, useMemo } from "react";
import type { Mask } from "@/lib/core/mask/mask";
import { LEVEL_UNIT_LABELS } from "@/lib/core/units/level-units";
import { EmptyPlot } from "./empty-plot";
import { FrequencyFrame } from "./frequency-frame";
import { Coast, Land } from "./land";
import { prepareMask } from "./prepare-mask";
import { useWidth } from "./use-width";

const MARGIN = { top: 24, right: 10, bottom: 24, left: 38 };

/** A mask as coast and land, as far as it has been typed. */
export function MaskChart({ mask, height = 280 }: { mask: Mask; height?: number }) {
  const [measure, width] = useWidth();
  const id = useId();
  const prepared = useMemo(
    () => prepareMask(mask, Math.max(120, width), height, MARGIN),
    [mask, width, height],
  );
  return (
    <figure ref={measure} className="m-0 min-w-0" style={{ minHeight: height }}>
      {!prepared ? (
        <EmptyPlot height={height}>
          No limit to draw yet. A segment needs two frequencies and two levels.
        </EmptyPlot>
      ) : width > 0 ? (
        <>
          <FrequencyFrame
            {...{ width, height }}
            plane={prepared.plane}
            frequencyTicks={prepared.frequencyTicks}
            levelTicks={prepared.levelTicks}
            unit={LEVEL_UNIT_LABELS[mask.unit]}
            margin={MARGIN}
            label={prepared.summary}
          >
            <Land coastline={prepared.coastline} id={id} />
            <Coast coastline={prepared.coastline} />
          </FrequencyFrame>
          {prepared.coastline.unplaced.length > 0 ? (
            <p className="mt-1 text-[0.8rem] text-ink-soft">
              Also drawn: {prepared.coastline.unplaced.join(", ")}.
            </p>
          ) : null}
        </>
      ) : null}
    </figure>
  );
}
