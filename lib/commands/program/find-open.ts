import { and, eq, isNull } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import { builds, programs } from "@/db/schema";
import type { Context } from "@/lib/auth/context";
import { CommandError } from "../result";

/** The program, locked for the rest of the transaction; refuses when it is archived. */
export async function lockOpenProgram(ctx: Context, tx: Transaction, programId: string) {
  const [program] = await tx
    .select()
    .from(programs)
    .where(
      and(eq(programs.teamId, ctx.teamId), eq(programs.id, programId), isNull(programs.archivedAt)),
    )
    .for("update");
  if (!program) {
    throw new CommandError("not-found", "This program does not exist or is archived.");
  }
  return program;
}

/** The build, archived or not, locked together with its program, which must not be archived. */
export async function lockBuild(ctx: Context, tx: Transaction, buildId: string) {
  const [found] = await tx
    .select({ programId: builds.programId })
    .from(builds)
    .where(and(eq(builds.teamId, ctx.teamId), eq(builds.id, buildId)));
  if (!found) throw new CommandError("not-found", "This build does not exist.");
  // Always the program first, as adding a build does: two orders of locking could wait in a ring.
  await lockOpenProgram(ctx, tx, found.programId);
  const [build] = await tx
    .select()
    .from(builds)
    .where(and(eq(builds.teamId, ctx.teamId), eq(builds.id, buildId)))
    .for("update");
  if (!build) throw new CommandError("not-found", "This build does not exist.");
  return build;
}

/** The build, locked; refuses when it or its program is archived. */
export async function lockOpenBuild(ctx: Context, tx: Transaction, buildId: string) {
  const build = await lockBuild(ctx, tx, buildId);
  if (build.archivedAt) {
    throw new CommandError("conflict", "This build is archived: restore it first.");
  }
  return build;
}
