import { sql } from "drizzle-orm";
import type { Database } from "@/db/client";
import { verifyAgainstNobody, verifyPassword } from "./password";

export interface SignedIn {
  userId: string;
  teamId: string;
  name: string;
  email: string;
}

interface SignInRow extends Record<string, unknown> {
  user_id: string;
  team_id: string;
  name: string;
  email: string;
  password_hash: string;
}

/** The active member with this address and password, or null without saying which was wrong. */
export async function signIn(
  db: Database,
  email: string,
  password: string,
): Promise<SignedIn | null> {
  const found = await db.execute<SignInRow>(sql`select * from find_sign_in(${email})`);
  const row = found.rows[0];
  if (!row) {
    await verifyAgainstNobody(password);
    return null;
  }
  if (!(await verifyPassword(row.password_hash, password))) return null;
  return { userId: row.user_id, teamId: row.team_id, name: row.name, email: row.email };
}
