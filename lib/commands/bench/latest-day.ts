import { sql } from "drizzle-orm";
import type { Transaction } from "@/db/client";

/**
 * The latest day (ISO) that it is anywhere on Earth, by the database's clock: what lies after it
 * is in the future for everybody, and a date typed on the far side of the date line is not refused.
 */
export async function latestDay(tx: Transaction): Promise<string> {
  const { rows } = await tx.execute<{ day: string }>(
    sql`select to_char((now() at time zone 'utc') + interval '14 hours', 'YYYY-MM-DD') as day`,
  );
  const day = rows[0]?.day;
  if (!day) throw new Error("The database told no date.");
  return day;
}
