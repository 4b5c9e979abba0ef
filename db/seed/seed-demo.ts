import { join } from "node:path";
import { count } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import { members, teams, users } from "@/db/schema";
import { folderStore } from "@/lib/adapters/folder-store";
import { bossQueue } from "@/lib/adapters/jobs/boss-queue";
import type { Context } from "@/lib/auth/context";
import { hashPassword } from "@/lib/auth/password";
import type { Role } from "@/lib/auth/permissions";
import { addShippedMasks } from "@/lib/commands/mask/add-shipped-masks";
import { readShippedMasks } from "@/lib/formats/shipped-masks";
import type { DemoTeam } from "./demo-teams";
import { DEMO_TEAMS } from "./demo-teams";
import { seedBenches } from "./bench/seed-benches";
import { seedChecks } from "./bench/seed-checks";
import { seedEquipment } from "./bench/seed-equipment";
import { seedMasks } from "./seed-masks";
import { seedPrograms } from "./seed-programs";
import { seedReports } from "./seed-reports";
import { seedSuspects } from "./seed-suspects";
import { seedLadders } from "./sweeps/seed-ladders";
import { seedSingles } from "./sweeps/seed-singles";

const DEMO_PASSWORD = "neap-demo";

/** A team with its people; resolves to the context of each role. */
async function seedTeam(
  tx: Transaction,
  demo: DemoTeam,
  dataDir: string,
): Promise<Map<Role, Context>> {
  const files = folderStore(join(dataDir, "files"));
  const [team] = await tx.insert(teams).values({ name: demo.name }).returning();
  if (!team) throw new Error("The demo team was not stored.");
  const contexts = new Map<Role, Context>();
  for (const { name, role } of demo.people) {
    const email = `${role}@${demo.domain}`;
    const passwordHash = await hashPassword(DEMO_PASSWORD);
    const [user] = await tx.insert(users).values({ name, email, passwordHash }).returning();
    if (!user) throw new Error("A demo account was not stored.");
    await tx.insert(members).values({ teamId: team.id, userId: user.id, role });
    const place = { db: tx, files, jobs: bossQueue };
    contexts.set(role, { ...place, teamId: team.id, userId: user.id, role });
  }
  await addShippedMasks(tx, team.id, await readShippedMasks());
  return contexts;
}

/**
 * Makes the demo data; resolves to the contexts of the first team by role, or to null when there is
 * a team already: demo data only ever goes into an empty database.
 */
export async function seedDemo(
  tx: Transaction,
  dataDir: string,
  { withReports = true } = {},
): Promise<Map<Role, Context> | null> {
  const [existing] = await tx.select({ teams: count() }).from(teams);
  if (existing && existing.teams > 0) return null;
  console.log("Making the demo data …");
  let first: Map<Role, Context> | null = null;
  for (const demo of DEMO_TEAMS) {
    const contexts = await seedTeam(tx, demo, dataDir);
    first ??= contexts;
    const engineer = contexts.get("engineer");
    const manager = contexts.get("manager");
    const maker = engineer ?? contexts.get("admin");
    if (!maker) throw new Error("A demo team has nobody who may make its programs.");
    if (engineer) await seedMasks(tx, engineer);
    const buildIds = await seedPrograms(tx, maker, demo);
    if (!engineer || !manager) continue;
    const benches = await seedBenches(engineer, await seedEquipment(engineer));
    const places = { buildIds, benches, sweepIds: new Map<string, string>() };
    const ladders = await seedLadders(engineer, places);
    await seedSingles(engineer, places);
    await seedChecks(engineer, benches.benchIds);
    await seedSuspects(contexts, engineer, places.sweepIds);
    // Their PDFs take the most time of all, and nothing else is told by them.
    if (withReports) await seedReports(engineer, manager, ladders);
  }
  return first;
}
