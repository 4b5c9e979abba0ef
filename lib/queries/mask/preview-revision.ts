import { and, desc, eq } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import { inTeam } from "@/db/client";
import { maskRevisions, masks } from "@/db/schema";
import type { Context } from "@/lib/auth/context";
import { readMaskInput } from "@/lib/commands/mask/read-mask-input";
import { countSweeps } from "@/lib/commands/mask/recompute-mask-scope";
import { revisionContent } from "@/lib/commands/mask/revision-content";
import { reviseMaskSchema } from "@/lib/commands/mask/schemas";
import { CommandError } from "@/lib/commands/result";
import { parseInput, requirePermission } from "@/lib/commands/run";
import type { Mask } from "@/lib/core/mask/mask";
import { reachesMask } from "@/lib/core/reading/combine-readings";
import { decidingPoint } from "@/lib/core/reading/deciding-point";
import type { Reading } from "@/lib/core/reading/reading";
import { readSweep } from "@/lib/core/reading/read-sweep";
import type { Trace } from "@/lib/core/sweep/trace";
import { loadTraces } from "../sweep/load-trace";
import type { SweepToPreview } from "./preview-sweeps";
import { listSweepsToPreview } from "./preview-sweeps";
import type { Held, ImpactSummary, SweepImpact } from "./preview-summary";
import { changedSweeps, summarizeImpact } from "./preview-summary";

/** A preview answers within seconds, so it looks at the newest sweeps and says how many it left. */
const MAX_SWEEPS = 200;
const MAX_POINTS = 20_000_000;

export interface RevisionPreview {
  /** The number the revision would get, and the one in force, against which is compared. */
  revision: number;
  inForceRevision: number;
  /** Sweeps looked at, the newest, and how many more there are. */
  looked: number;
  more: number;
  summary: ImpactSummary;
  /** Those whose standing or margin changes. */
  changed: SweepImpact[];
}

async function findRevisions(tx: Transaction, teamId: string, maskId: string) {
  const rows = await tx
    .select({
      key: masks.key,
      origin: masks.origin,
      archivedAt: masks.archivedAt,
      id: maskRevisions.id,
      revision: maskRevisions.revision,
      content: maskRevisions.content,
      inForceAt: maskRevisions.inForceAt,
    })
    .from(masks)
    .innerJoin(
      maskRevisions,
      and(eq(maskRevisions.teamId, masks.teamId), eq(maskRevisions.maskId, masks.id)),
    )
    .where(and(eq(masks.teamId, teamId), eq(masks.id, maskId)))
    .orderBy(desc(maskRevisions.revision));
  const [newest] = rows;
  const inForce = rows.find((row) => row.inForceAt !== null);
  if (!newest || !inForce) throw new CommandError("not-found", "This mask does not exist.");
  return { newest, inForce };
}

/** As lists show it: a sweep that only touches a mask is not held against it. */
function heldOf(reading: Pick<Reading, "lines" | "standing" | "notComparable">): Held | null {
  const deciding = decidingPoint(reading);
  if (reading.notComparable !== null || !deciding || !reachesMask(reading)) return null;
  return { standing: reading.standing, marginDb: deciding.point.marginDb };
}

function readUnder(mask: Mask, sweep: SweepToPreview, traces: Trace[]): Reading {
  const { settings, guardDb, path, restateDistance } = sweep;
  const { impedanceOhm } = path;
  return readSweep({ traces, settings, guardDb, impedanceOhm, restateDistance, mask });
}

/**
 * Holds a mask as it was typed against the sweeps that are here, beside the revision in force.
 * Refuses what saving it would refuse; stores nothing.
 */
export async function previewRevision(ctx: Context, input: unknown): Promise<RevisionPreview> {
  requirePermission(ctx, "mask.write");
  const values = parseInput(reviseMaskSchema, input);
  const typed = readMaskInput(values.mask);
  const { maskId, basedOnRevision } = values;
  const { teamId } = ctx;
  return inTeam(ctx.db, teamId, async (tx) => {
    const { newest, inForce } = await findRevisions(tx, teamId, maskId);
    const content = revisionContent({ mask: newest, current: newest }, typed, basedOnRevision);
    const { total } = await countSweeps(tx, { teamId, maskId, maskRevisionId: inForce.id });
    const found = await listSweepsToPreview(
      tx,
      teamId,
      { maskId, inForceId: inForce.id },
      MAX_SWEEPS,
    );
    const impacts: SweepImpact[] = [];
    let points = 0;
    for (const sweep of found) {
      points += sweep.points;
      if (impacts.length > 0 && points > MAX_POINTS) break;
      const traces = await loadTraces(tx, teamId, sweep.sweepId);
      const before = heldOf(sweep.reading ?? readUnder(inForce.content, sweep, traces));
      const after = heldOf(readUnder(content, sweep, traces));
      const { sweepId, name, programName, buildName, onRecord } = sweep;
      const changeDb = before && after ? after.marginDb - before.marginDb : null;
      impacts.push({ sweepId, name, programName, buildName, onRecord, before, after, changeDb });
    }
    return {
      revision: newest.revision + 1,
      inForceRevision: inForce.revision,
      looked: impacts.length,
      more: Math.max(0, total - impacts.length),
      summary: summarizeImpact(impacts),
      changed: changedSweeps(impacts),
    };
  });
}
