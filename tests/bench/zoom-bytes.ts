import { inTeam } from "@/db/client";
import { storeTrace } from "@/lib/commands/sweep/store-trace";
import { firstHz, lastHz } from "@/lib/core/sweep/axis";
import type { FrequencyAxis } from "@/lib/core/sweep/trace";
import { readTraceView } from "@/lib/queries/sweep/read-trace-view";
import { traceViewSchema } from "@/lib/queries/sweep/schemas";
import { randomFrom } from "../support/traces";
import { inventAwkwardTrace, inventFile } from "./invented-sweep";
import { milliseconds, minAndMedian, quotients } from "./measure";
import type { Place } from "./place";
import type { Figure } from "./report";

const COLUMNS = 1500;
const LIMIT_BYTES = 60 * 1024;
const VIEWS = 40;
const TRACES: { kind: FrequencyAxis["kind"]; count: number }[] = [
  { kind: "regular", count: 10_000 },
  { kind: "listed", count: 10_000 },
  { kind: "regular", count: 100_000 },
  { kind: "listed", count: 100_000 },
  { kind: "regular", count: 1_000_000 },
  { kind: "listed", count: 1_000_000 },
  { kind: "regular", count: 10_000_000 },
];

/** The whole trace, then parts of it of every width, by turns on either scale. */
function* viewsOf(fromHz: number, toHz: number) {
  const random = randomFrom(7);
  for (let i = 0; i < VIEWS; i += 1) {
    const width = i < 2 ? 1 : 10 ** (-5 * random());
    const from = fromHz + (toHz - fromHz) * (1 - width) * random();
    const scale = i % 2 === 0 ? ("log" as const) : ("linear" as const);
    yield { fromHz: from, toHz: from + (toHz - fromHz) * width, scale };
  }
}

/** Answers to a chart that zooms: their size, and their time beside reading the answer as JSON. */
export async function measureZoom({ ctx, importFile }: Place): Promise<Figure[]> {
  const { sweepId } = await importFile(inventFile(1000, 500));
  const figures: Figure[] = [];
  for (const [i, { kind, count }] of TRACES.entries()) {
    const trace = inventAwkwardTrace(kind, count);
    const position = i + 1;
    const place = {
      teamId: ctx.teamId,
      sweepId,
      position,
      fileUnit: trace.unit,
      fileMaxDb: null,
      rbwHz: null,
    };
    await inTeam(ctx.db, ctx.teamId, (tx) => storeTrace(tx, place, trace));
    const answered: number[] = [];
    const parsed: number[] = [];
    let largest = { bytes: 0, columns: 0 };
    for (const part of viewsOf(firstHz(trace.axis), lastHz(trace.axis))) {
      const request = traceViewSchema.parse({ ...part, position, columns: COLUMNS });
      const from = performance.now();
      const view = await readTraceView(ctx, sweepId, position, request);
      const text = JSON.stringify(view);
      const between = performance.now();
      JSON.parse(text);
      answered.push(between - from);
      parsed.push(performance.now() - between);
      const bytes = Buffer.byteLength(text);
      if (bytes > largest.bytes) largest = { bytes, columns: view?.hz.length ?? 0 };
    }
    figures.push({
      name: `Largest zoom answer, ${count} points, ${kind}`,
      measured: `${(largest.bytes / 1024).toFixed(1)} kB`,
      limit: {
        text: `≤ ${LIMIT_BYTES / 1024} kB`,
        isHeld: largest.bytes > 0 && largest.bytes <= LIMIT_BYTES,
      },
      beside: `${largest.columns} columns; ${milliseconds(answered)}, ÷ JSON.parse ${minAndMedian(quotients(answered, parsed), 0)}`,
    });
  }
  return figures;
}
