import { asc } from "drizzle-orm";
import { addShippedMasks } from "@/lib/commands/mask/add-shipped-masks";
import { readShippedMasks } from "@/lib/formats/shipped-masks";
import { openDatabase } from "./client";
import { teams } from "./schema";

/** Brings the shipped masks of every team up to date; a team at a time, each in a transaction. */
export async function updateShippedMasks(ownerUrl: string): Promise<void> {
  const { db, pool } = openDatabase(ownerUrl);
  try {
    const all = await db.select({ id: teams.id }).from(teams).orderBy(asc(teams.id));
    if (all.length === 0) return;
    const shipped = await readShippedMasks();
    for (const team of all) await db.transaction((tx) => addShippedMasks(tx, team.id, shipped));
  } finally {
    await pool.end();
  }
}
