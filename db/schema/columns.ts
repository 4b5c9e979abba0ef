import { sql } from "drizzle-orm";
import { timestamp, uuid } from "drizzle-orm/pg-core";
import { teams } from "./team";

/** The tenant of a row; present on every table of team data. */
export const teamId = () =>
  uuid("team_id")
    .notNull()
    .references(() => teams.id);

/** The moment of the row itself, so that rows of one transaction keep their order. */
export const createdAt = () =>
  timestamp("created_at", { withTimezone: true })
    .notNull()
    .default(sql`clock_timestamp()`);
