import { and, eq } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import { inTeam } from "@/db/client";
import { traces } from "@/db/schema";
import type { Context } from "@/lib/auth/context";
import { requirePermission } from "@/lib/commands/run";
import { frequencyAt, pointCount } from "@/lib/core/sweep/axis";
import type { PyramidLevel } from "@/lib/core/sweep/pyramid";
import { bottomLevel, PYRAMID_FACTOR } from "@/lib/core/sweep/pyramid";
import type { TraceView } from "@/lib/core/sweep/trace-view";
import type { ViewRequest } from "@/lib/core/sweep/view-trace";
import { pyramidLevelFor, samplesInView, viewTrace } from "@/lib/core/sweep/view-trace";
import { BLOCK_POINTS, decodeLevels, decodePyramid } from "@/lib/formats/trace-blocks";
import { isId } from "../is-id";
import { loadAxis, selectBlocks } from "./load-trace";

/** The entries that a view needs, from the trace itself or from a level of its pyramid. */
async function loadEntries(
  tx: Transaction,
  place: { teamId: string; traceId: string },
  range: { start: number; end: number },
  levelIndex: number,
): Promise<{ level: PyramidLevel; firstEntry: number }> {
  if (levelIndex > 0) {
    const [block] = await selectBlocks(tx, place, { kind: "pyramid", level: levelIndex });
    if (!block) throw new Error("A trace lacks a level of its pyramid.");
    return { level: decodePyramid(block, PYRAMID_FACTOR ** levelIndex), firstEntry: 0 };
  }
  const from = Math.floor(range.start / BLOCK_POINTS);
  const to = Math.floor(Math.max(range.start, range.end - 1) / BLOCK_POINTS);
  const blocks = await selectBlocks(tx, place, { kind: "level", from, to });
  const firstEntry = from * BLOCK_POINTS;
  return { level: bottomLevel(decodeLevels(blocks), firstEntry), firstEntry };
}

/** The columns of a view of one stored trace, inside a unit of work of its team. */
export async function viewStoredTrace(
  tx: Transaction,
  teamId: string,
  row: Pick<typeof traces.$inferSelect, "id" | "axis" | "unit">,
  request: ViewRequest,
): Promise<TraceView> {
  const place = { teamId, traceId: row.id };
  const axis = await loadAxis(tx, place, row.axis);
  const range = samplesInView(axis, request);
  const levelIndex =
    pointCount(axis) === 0 ? 0 : pyramidLevelFor(Math.max(1, range.end - range.start));
  const { level, firstEntry } = await loadEntries(tx, place, range, levelIndex);
  return viewTrace({ axis, unit: row.unit }, level, firstEntry, request, (i) =>
    frequencyAt(axis, i),
  );
}

/** A part of a trace as a chart draws it; null when the team has no such trace. */
export async function readTraceView(
  ctx: Context,
  sweepId: string,
  position: number,
  request: ViewRequest,
): Promise<TraceView | null> {
  requirePermission(ctx, "sweep.read");
  if (!isId(sweepId)) return null;
  return inTeam(ctx.db, ctx.teamId, async (tx) => {
    const [row] = await tx
      .select({ id: traces.id, axis: traces.axis, unit: traces.unit })
      .from(traces)
      .where(
        and(
          eq(traces.teamId, ctx.teamId),
          eq(traces.sweepId, sweepId),
          eq(traces.position, position),
        ),
      );
    return row ? viewStoredTrace(tx, ctx.teamId, row, request) : null;
  });
}
