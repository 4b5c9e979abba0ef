import { count } from "drizzle-orm";
import { openDatabase } from "@/db/client";
import { builds, members, programs, teams, users } from "@/db/schema";
import { hashPassword } from "@/lib/auth/password";
import { DEMO_TEAMS } from "./demo-teams";

const DEMO_PASSWORD = "neap-demo";

const url = process.env.NEAP_OWNER_DATABASE_URL;
if (!url) throw new Error("NEAP_OWNER_DATABASE_URL is not set; `npm start` sets it.");
if (process.env.NEAP_DEMO === "0") throw new Error("NEAP_DEMO=0 forbids demo data.");

const { db, pool } = openDatabase(url);
await db.transaction(async (tx) => {
  const [existing] = await tx.select({ teams: count() }).from(teams);
  // Demo data only ever goes into an empty database.
  if (existing && existing.teams > 0) return;
  for (const demo of DEMO_TEAMS) {
    const [team] = await tx.insert(teams).values({ name: demo.name }).returning();
    if (!team) throw new Error("The demo team was not stored.");
    for (const person of demo.people) {
      const [user] = await tx
        .insert(users)
        .values({
          name: person.name,
          email: `${person.role}@${demo.domain}`,
          passwordHash: await hashPassword(DEMO_PASSWORD),
        })
        .returning();
      if (!user) throw new Error("A demo account was not stored.");
      await tx.insert(members).values({ teamId: team.id, userId: user.id, role: person.role });
    }
    for (const { builds: demoBuilds, ...values } of demo.programs) {
      const [program] = await tx
        .insert(programs)
        .values({ teamId: team.id, ...values })
        .returning();
      if (!program) throw new Error("A demo program was not stored.");
      await tx.insert(builds).values(
        demoBuilds.map((build, index) => ({
          teamId: team.id,
          programId: program.id,
          sequence: index + 1,
          ...build,
        })),
      );
    }
  }
});
await pool.end();
