import { timestamp, uuid } from "drizzle-orm/pg-core";
import { teams } from "./team";

/** The tenant of a row; present on every table of team data. */
export const teamId = () =>
  uuid("team_id")
    .notNull()
    .references(() => teams.id);

export const createdAt = () =>
  timestamp("created_at", { withTimezone: true }).notNull().defaultNow();
