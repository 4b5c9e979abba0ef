"use client";

import { useState } from "react";
import { writeChange } from "@/components/charts/prepare-waterfall";
import { WaterfallChart } from "@/components/charts/waterfall-chart";
import { UnconfirmedMark } from "@/components/masks/unconfirmed-mark";
import { SelectField } from "@/components/ui/select-field";
import type { WaterfallBar } from "@/lib/core/delta/waterfall";
import { formatMargin } from "@/lib/core/units/format";
import { DeltaValue } from "./delta-value";

export interface WaterfallView {
  key: string;
  title: string;
  isFromMemory: boolean;
  guardDb: number;
  /** The whole line first, then its bands. */
  parts: { key: string; title: string; bars: WaterfallBar[] }[];
}

interface WaterfallProps {
  lines: WaterfallView[];
  targetDb: number;
}

/** What each step bought on one mask line or band, drawn and in words. */
export function Waterfall({ lines, targetDb }: WaterfallProps) {
  const [lineKey, setLineKey] = useState("");
  const [partKey, setPartKey] = useState("");
  const line = lines.find((one) => one.key === lineKey) ?? lines[0];
  const part = line?.parts.find((one) => one.key === partKey) ?? line?.parts[0];
  if (!line || !part) return null;
  const options = (list: readonly { key: string; title: string }[]) =>
    list.map(({ key, title }) => ({ value: key, label: title }));
  return (
    <>
      <div className="grid max-w-3xl gap-x-5 print:hidden sm:grid-cols-2">
        <SelectField
          label="Mask line"
          options={options(lines)}
          value={line.key}
          onChange={(event) => setLineKey(event.target.value)}
        />
        <SelectField
          label="Part of it"
          options={options(line.parts)}
          value={part.key}
          onChange={(event) => setPartKey(event.target.value)}
        />
      </div>
      <p className="mb-2">
        {line.title}
        {part.key === "whole" ? "" : `, ${part.title}`}{" "}
        <UnconfirmedMark provenance={line.isFromMemory ? "from memory" : ""} />
      </p>
      <WaterfallChart bars={part.bars} guardDb={line.guardDb} targetDb={targetDb} />
      <ol className="mt-3 text-sm">
        {part.bars.map((bar) => (
          <li
            key={bar.stepId}
            className="flex flex-wrap items-baseline gap-x-4 gap-y-1 border-b border-rule py-1.5"
          >
            <span className="min-w-0 flex-1 basis-56">
              <span className="font-mono">{bar.position}</span> {bar.name}
              <span className="text-ink-soft">{whereOf(bar)}</span>
            </span>
            {bar.change ? (
              <DeltaValue change={bar.change} better="up" />
            ) : (
              <span className={bar.gap ? "text-shoal" : "font-mono"}>{writeChange(bar)}</span>
            )}
            {bar.change ? (
              <span className="font-mono whitespace-nowrap text-ink-soft">
                {formatMargin(bar.toDb)}
              </span>
            ) : null}
          </li>
        ))}
      </ol>
    </>
  );
}

function whereOf(bar: WaterfallBar): string {
  if (bar.place === "start") return ", the starting point";
  const accepted = bar.isAccepted ? ", with an accepted mismatch" : "";
  const beside = bar.place === "beside" ? ", not in the product" : "";
  return ` against step ${bar.basePosition}${beside}${accepted}`;
}
