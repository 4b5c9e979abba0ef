import { cache } from "react";
import { getServerSession } from "next-auth";
import { redirect } from "next/navigation";
import { appDatabase } from "@/db/client";
import type { Context } from "./context";
import { folderStore } from "@/lib/adapters/folder-store";
import { bossQueue } from "@/lib/adapters/jobs/boss-queue";
import { authOptions } from "./options";
import type { Member } from "./read-member";
import { readMember } from "./read-member";

export interface CurrentMember {
  member: Member;
  ctx: Context;
}

/** Who asks, or null; read once per request. */
export const findCurrentMember = cache(async (): Promise<CurrentMember | null> => {
  const session = await getServerSession(authOptions);
  if (!session) return null;
  const db = appDatabase();
  const member = await readMember(db, session.teamId, session.userId);
  if (!member) return null;
  return {
    member,
    ctx: {
      db,
      files: folderStore(),
      jobs: bossQueue,
      teamId: member.teamId,
      userId: member.userId,
      role: member.role,
    },
  };
});

/** For pages: sends whoever is not signed in to the sign-in page. */
export async function currentMember(): Promise<CurrentMember> {
  const found = await findCurrentMember();
  if (!found) redirect("/sign-in");
  return found;
}

export async function currentContext(): Promise<Context> {
  return (await currentMember()).ctx;
}
