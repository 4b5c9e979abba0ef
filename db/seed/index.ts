import { join } from "node:path";
import { count } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import { openDatabase } from "@/db/client";
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
import { seedBenches } from "./seed-benches";
import { seedPrograms } from "./seed-programs";
import { seedReports } from "./seed-reports";
import { seedSweeps } from "./seed-sweeps";

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

const url = process.env.NEAP_OWNER_DATABASE_URL;
const dataDir = process.env.NEAP_DATA_DIR;
if (!url || !dataDir) {
  throw new Error("NEAP_OWNER_DATABASE_URL and NEAP_DATA_DIR are not set; `npm start` sets them.");
}
if (process.env.NEAP_DEMO === "0") throw new Error("NEAP_DEMO=0 forbids demo data.");

const { db, pool } = openDatabase(url);
// One transaction: an interrupted start leaves no half demo behind.
await db.transaction(async (tx) => {
  const [existing] = await tx.select({ teams: count() }).from(teams);
  // Demo data only ever goes into an empty database.
  if (existing && existing.teams > 0) return;
  console.log("Making the demo data …");
  for (const demo of DEMO_TEAMS) {
    const contexts = await seedTeam(tx, demo, dataDir);
    const engineer = contexts.get("engineer");
    const manager = contexts.get("manager");
    const maker = engineer ?? contexts.get("admin");
    if (!maker) throw new Error("A demo team has nobody who may make its programs.");
    const buildIds = await seedPrograms(tx, maker, demo);
    if (!engineer || !manager) continue;
    const benchIds = await seedBenches(engineer);
    const ladders = await seedSweeps(engineer, buildIds, benchIds);
    await seedReports(engineer, manager, ladders);
  }
});
await pool.end();
