import { fileURLToPath } from "node:url";
import { drizzle } from "drizzle-orm/node-postgres";
import { migrate } from "drizzle-orm/node-postgres/migrator";
import { Client } from "pg";
import { prepareQueues } from "@/lib/adapters/jobs/prepare-queues";
import { openDatabase } from "./client";
import { refreshReadings } from "./refresh-readings";
import { updateShippedMasks } from "./update-shipped-masks";

/** Creates the app's role when missing, sets its password, applies what is new in `drizzle/` and makes the job queues. */
async function migrateDatabase(ownerUrl: string, appPassword: string): Promise<void> {
  const client = new Client({ connectionString: ownerUrl });
  await client.connect();
  try {
    // Two starts against one database wait for each other instead of colliding.
    await client.query("select pg_advisory_lock(7316001)");
    const role = await client.query("select 1 from pg_roles where rolname = 'neap_app'");
    const verb = role.rowCount ? "alter" : "create";
    await client.query(`${verb} role neap_app login password ${client.escapeLiteral(appPassword)}`);
    await migrate(drizzle(client), {
      migrationsFolder: fileURLToPath(new URL("../drizzle", import.meta.url)),
    });
    await prepareQueues(ownerUrl);
  } finally {
    await client.end();
  }
}

const ownerUrl = process.env.NEAP_OWNER_DATABASE_URL;
const appPassword = process.env.NEAP_APP_PASSWORD;
if (!ownerUrl || !appPassword) {
  console.error("NEAP_OWNER_DATABASE_URL and NEAP_APP_PASSWORD must be set; `npm start` does it.");
  process.exitCode = 1;
} else {
  await migrateDatabase(ownerUrl, appPassword);
  const { db, pool } = openDatabase(ownerUrl);
  try {
    await updateShippedMasks(db);
    await refreshReadings(db);
  } finally {
    await pool.end();
  }
}
