import { and, eq, inArray } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import { masks } from "@/db/schema";
import type { Context } from "@/lib/auth/context";
import { createBuild } from "@/lib/commands/program/create-build";
import { createProgram } from "@/lib/commands/program/create-program";
import { setClocks } from "@/lib/commands/program/set-clocks";
import { setDistanceRestating } from "@/lib/commands/program/set-distance-restating";
import { setMilestones } from "@/lib/commands/program/set-milestones";
import { setProgramMasks } from "@/lib/commands/program/set-program-masks";
import { onDay } from "./demo-day";
import type { DemoTeam } from "./demo-teams";

/** Makes a team's programs with their masks, milestones and builds; resolves to builds by name. */
export async function seedPrograms(
  tx: Transaction,
  ctx: Context,
  demo: DemoTeam,
): Promise<Map<string, string>> {
  const buildIds = new Map<string, string>();
  for (const { masks: keys, restated, milestones, builds, ...values } of demo.programs) {
    const { programId } = await createProgram(ctx, values);
    await setMilestones(ctx, {
      programId,
      milestones: milestones.map((one) => ({ ...one, dueOn: onDay(one.dueOn) })),
    });
    if (keys.length > 0) {
      const found = await tx
        .select({ id: masks.id, key: masks.key })
        .from(masks)
        .where(and(eq(masks.teamId, ctx.teamId), inArray(masks.key, keys)));
      if (found.length < keys.length)
        throw new Error(`${values.name} names a mask that is not there.`);
      await setProgramMasks(ctx, { programId, maskIds: found.map((mask) => mask.id) });
      for (const { id: maskId, key } of found)
        if (restated?.includes(key))
          await setDistanceRestating(ctx, { programId, maskId, restate: true });
    }
    for (const { clocks, ...build } of builds) {
      const { buildId } = await createBuild(ctx, {
        programId,
        ...build,
        builtOn: onDay(build.builtOn),
      });
      buildIds.set(build.name, buildId);
      if (clocks.length > 0) await setClocks(ctx, { buildId, clocks });
    }
  }
  return buildIds;
}
