import { sql } from "drizzle-orm";
import type { Database } from "@/db/client";

/** Also what NextAuth carries to the sign-in form as the error's name. */
const TOO_MANY_TRIES = "too-many-tries";

/** Thrown instead of an answer, so that a throttled try is never mistaken for a wrong password. */
export class TooManyTriesError extends Error {
  constructor() {
    super(TOO_MANY_TRIES);
    this.name = "TooManyTriesError";
  }
}

/**
 * Books one try to prove a password; the count is held in PostgreSQL, for every app process alike.
 * The returned function is called when the password was right and forgets the tries of this origin.
 */
export async function bookTry(
  db: Database,
  email: string,
  origin: string,
): Promise<() => Promise<void>> {
  const found = await db.execute<{ id: string | null }>(
    sql`select begin_sign_in(${email}, ${origin}) as id`,
  );
  const id = found.rows[0]?.id;
  if (!id) throw new TooManyTriesError();
  return async () => {
    await db.execute(sql`select prove_sign_in(${id})`);
  };
}

/**
 * Where a try comes from, as the nearest proxy saw it: the last address of X-Forwarded-For, since
 * whoever asks can write the earlier ones. Next.js fills it from the socket when there is no proxy.
 */
export function readOrigin(forwardedFor: unknown): string {
  const last = typeof forwardedFor === "string" ? forwardedFor.split(",").at(-1)?.trim() : "";
  return last || "unknown";
}
