import { randomUUID } from "node:crypto";
import { Client } from "pg";
import type { Database } from "@/db/client";
import { openDatabase } from "@/db/client";
import type { Context } from "@/lib/auth/context";
import type { Role } from "@/lib/auth/permissions";
import { bossQueue } from "@/lib/adapters/jobs/boss-queue";
import { memoryFiles } from "./files";

export interface TestDatabase {
  /** As the app: bound by row-level security. */
  app: Database;
  /** As the owner: sees every team; for arranging and for looking behind the policies. */
  owner: Client;
  /** Where a worker connects, as the app, and who prepares the database, as the owner. */
  appUrl: string;
  ownerUrl: string;
  close: () => Promise<void>;
}

function need(name: string): string {
  const value = process.env[name];
  if (!value) throw new Error(`${name} is not set: no database for the tests.`);
  return value;
}

/** A database of its own for one test file, copied from the migrated template. */
export async function openTestDatabase(): Promise<TestDatabase> {
  const ownerUrl = need("NEAP_TEST_OWNER_URL");
  const name = `neap_test_${randomUUID().replaceAll("-", "")}`;
  const admin = new Client({ connectionString: ownerUrl });
  await admin.connect();
  await admin.query(`create database ${name} template neap_template`);
  const at = (user: string, password: string) => {
    const url = new URL(ownerUrl);
    url.pathname = `/${name}`;
    url.username = user;
    url.password = password;
    return url.toString();
  };
  const ownerAddress = new URL(ownerUrl);
  const ownerOwnUrl = at(ownerAddress.username, ownerAddress.password);
  const owner = new Client({ connectionString: ownerOwnUrl });
  await owner.connect();
  const appUrl = at("neap_app", need("NEAP_TEST_APP_PASSWORD"));
  const { db, pool } = openDatabase(appUrl);
  return {
    app: db,
    owner,
    appUrl,
    ownerUrl: ownerOwnUrl,
    close: async () => {
      await pool.end();
      await owner.end();
      await admin.query(`drop database ${name} with (force)`);
      await admin.end();
    },
  };
}

/** A team with one member of the given role, made by the owner; returns that member's context. */
export async function makeMember(
  database: TestDatabase,
  role: Role,
  teamId?: string,
): Promise<Context> {
  const { owner } = database;
  const team =
    teamId ??
    (
      await owner.query("insert into teams (name) values ($1) returning id", [
        `Team ${randomUUID()}`,
      ])
    ).rows[0].id;
  const user = await owner.query(
    "insert into users (email, name, password_hash) values ($1, $2, 'none') returning id",
    [`${randomUUID()}@saltmarsh.example`, `A ${role}`],
  );
  await owner.query("insert into members (team_id, user_id, role) values ($1, $2, $3)", [
    team,
    user.rows[0].id,
    role,
  ]);
  const place = { db: database.app, files: memoryFiles(), jobs: bossQueue };
  return { ...place, teamId: team, userId: user.rows[0].id, role };
}
