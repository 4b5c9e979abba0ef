import { sql } from "drizzle-orm";
import type { Database } from "@/db/client";
import { verifyAgainstNobody, verifyPassword } from "./password";
import { bookTry } from "./throttle";

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

/** Longer ones are no address, and PostgreSQL stores no text with a NUL. */
const MAX_EMAIL_LENGTH = 320;

/**
 * The active member with this address and password, or null without saying which was wrong.
 * Throws TooManyTriesError when the address had its share of wrong passwords, known or not.
 */
export async function signIn(
  db: Database,
  email: string,
  password: string,
  origin = "unknown",
): Promise<SignedIn | null> {
  if (email.length > MAX_EMAIL_LENGTH || email.includes("\0")) {
    return verifyAgainstNobody(password).then(() => null);
  }
  const proveRight = await bookTry(db, email, origin);
  const found = await db.execute<SignInRow>(sql`select * from find_sign_in(${email})`);
  const row = found.rows[0];
  if (!row) {
    await verifyAgainstNobody(password);
    return null;
  }
  if (!(await verifyPassword(row.password_hash, password))) return null;
  await proveRight();
  return { userId: row.user_id, teamId: row.team_id, name: row.name, email: row.email };
}
