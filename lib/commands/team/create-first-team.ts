import { sql } from "drizzle-orm";
import { appDatabase, inTeam, type Database } from "@/db/client";
import { hashPassword } from "@/lib/auth/password";
import { readShippedMasks } from "@/lib/formats/shipped-masks";
import { addShippedMasks } from "../mask/add-shipped-masks";
import { CommandError } from "../result";
import { parseInput } from "../run";
import { createFirstTeamSchema } from "./schemas";

/**
 * The one command without a member behind it: on an empty database it makes the first team and
 * its admin. The database function refuses as soon as any team exists, and writes the audit row.
 */
export async function createFirstTeam(
  input: unknown,
  db: Database = appDatabase(),
): Promise<{ teamId: string }> {
  const values = parseInput(createFirstTeamSchema, input);
  const hash = await hashPassword(values.password);
  const made = await db.execute<{ id: string | null }>(
    sql`select create_first_team(${values.teamName}, ${values.name}, ${values.email}, ${hash}) as id`,
  );
  const teamId = made.rows[0]?.id;
  if (!teamId) throw new CommandError("conflict", "This Neap has a team already: sign in.");
  const shipped = await readShippedMasks();
  await inTeam(db, teamId, (tx) => addShippedMasks(tx, teamId, shipped));
  return { teamId };
}
