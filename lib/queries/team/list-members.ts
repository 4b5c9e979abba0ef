import { asc, eq } from "drizzle-orm";
import { inTeam } from "@/db/client";
import { members, users } from "@/db/schema";
import type { Context } from "@/lib/auth/context";
import type { Role } from "@/lib/auth/permissions";
import { requirePermission } from "@/lib/commands/run";

export interface MemberRow {
  userId: string;
  name: string;
  email: string;
  role: Role;
  deactivatedAt: Date | null;
}

export async function listMembers(ctx: Context): Promise<MemberRow[]> {
  requirePermission(ctx, "people.read");
  return inTeam(ctx.db, ctx.teamId, (tx) =>
    tx
      .select({
        userId: users.id,
        name: users.name,
        email: users.email,
        role: members.role,
        deactivatedAt: members.deactivatedAt,
      })
      .from(members)
      .innerJoin(users, eq(users.id, members.userId))
      .where(eq(members.teamId, ctx.teamId))
      .orderBy(asc(users.name)),
  );
}
