import { createHash } from "node:crypto";
import { and, eq } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import { storedFiles } from "@/db/schema";
import type { Context } from "@/lib/auth/context";

export const sha256Of = (bytes: Uint8Array) => createHash("sha256").update(bytes).digest("hex");

/** Where the bytes of a team's file lie. */
export const fileKey = (teamId: string, sha256: string) =>
  `${teamId}/${sha256.slice(0, 2)}/${sha256}`;

/**
 * Keeps bytes once per content. They are put before the row, so that a row never points to
 * nothing; bytes whose transaction failed lie under their hash and are found again.
 */
export async function storeFile(
  tx: Transaction,
  ctx: Context,
  bytes: Uint8Array,
  mediaType: string,
): Promise<{ fileId: string; sha256: string }> {
  const sha256 = sha256Of(bytes);
  await ctx.files.put(fileKey(ctx.teamId, sha256), bytes);
  await tx
    .insert(storedFiles)
    .values({ teamId: ctx.teamId, sha256, sizeBytes: bytes.length, mediaType })
    .onConflictDoNothing();
  const [row] = await tx
    .select({ id: storedFiles.id })
    .from(storedFiles)
    .where(and(eq(storedFiles.teamId, ctx.teamId), eq(storedFiles.sha256, sha256)));
  if (!row) throw new Error("The file was not stored.");
  return { fileId: row.id, sha256 };
}
