import type { Context } from "@/lib/auth/context";
import { createBuild } from "@/lib/commands/program/create-build";
import { createProgram } from "@/lib/commands/program/create-program";
import type { TestDatabase } from "../../support/database";

/** A program with one build, made by the given member. */
export async function makeProgram(ctx: Context, name = "Plover") {
  const { programId } = await createProgram(ctx, { name, description: "", targetMarginDb: 4 });
  const build = { programId, name: `${name} 1`, builtOn: "2026-05-04", notes: "" };
  return { programId, ...(await createBuild(ctx, build)) };
}

/** A mask of the team with revisions of the given titles, the newest last; made by the owner. */
export async function makeMask(
  database: TestDatabase,
  teamId: string,
  key: string,
  titles = [key],
): Promise<string> {
  const { owner } = database;
  const made = await owner.query(
    "insert into masks (team_id, key, origin) values ($1, $2, 'team') returning id",
    [teamId, key],
  );
  const maskId: string = made.rows[0].id;
  for (const [index, title] of titles.entries()) {
    const content = { title, document: "Bench note 4", clause: "2", edition: "1" };
    await owner.query(
      "insert into mask_revisions (team_id, mask_id, revision, content) values ($1, $2, $3, $4)",
      [teamId, maskId, index + 1, JSON.stringify({ ...content, provenance: "team" })],
    );
  }
  return maskId;
}
