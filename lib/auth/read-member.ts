import { and, eq, isNull } from "drizzle-orm";
import type { Database } from "@/db/client";
import { inTeam } from "@/db/client";
import { members, teams, users } from "@/db/schema";
import type { Role } from "./permissions";

export interface Member {
  userId: string;
  teamId: string;
  teamName: string;
  name: string;
  email: string;
  role: Role;
}

/** Read at every request, so that a changed role or a deactivation counts at once. */
export async function readMember(
  db: Database,
  teamId: string,
  userId: string,
): Promise<Member | null> {
  const rows = await inTeam(db, teamId, (tx) =>
    tx
      .select({
        userId: users.id,
        teamId: teams.id,
        teamName: teams.name,
        name: users.name,
        email: users.email,
        role: members.role,
      })
      .from(members)
      .innerJoin(users, eq(users.id, members.userId))
      .innerJoin(teams, eq(teams.id, members.teamId))
      .where(
        and(eq(members.teamId, teamId), eq(members.userId, userId), isNull(members.deactivatedAt)),
      ),
  );
  return rows[0] ?? null;
}
