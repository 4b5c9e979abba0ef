import { sql } from "drizzle-orm";
import { appDatabase } from "@/db/client";

/** Whether the first run is over. */
export async function hasAnyTeam(): Promise<boolean> {
  const found = await appDatabase().execute<{ any: boolean }>(sql`select has_any_team() as any`);
  return found.rows[0]?.any === true;
}
