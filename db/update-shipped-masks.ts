import { asc } from "drizzle-orm";
import { addShippedMasks } from "@/lib/commands/mask/add-shipped-masks";
import { readShippedMasks } from "@/lib/formats/shipped-masks";
import type { Database } from "./client";
import { teams } from "./schema";

/** Brings the shipped masks of every team up to date; a team at a time, each in a transaction. */
export async function updateShippedMasks(owner: Database): Promise<void> {
  const all = await owner.select({ id: teams.id }).from(teams).orderBy(asc(teams.id));
  if (all.length === 0) return;
  const shipped = await readShippedMasks();
  for (const team of all) await owner.transaction((tx) => addShippedMasks(tx, team.id, shipped));
}
