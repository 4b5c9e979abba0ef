import { foreignKey, integer, pgTable, text, timestamp, unique, uuid } from "drizzle-orm/pg-core";
import { STEP_STATES } from "@/lib/core/delta/ladder-order";
import { createdAt, teamId } from "./columns";
import { builds } from "./program";
import { teamPolicy } from "./team";

/** An ordered series of mitigation steps on a build. */
export const ladders = pgTable(
  "ladders",
  {
    id: uuid("id").primaryKey().defaultRandom(),
    teamId: teamId(),
    buildId: uuid("build_id").notNull(),
    name: text("name").notNull(),
    notes: text("notes").notNull().default(""),
    archivedAt: timestamp("archived_at", { withTimezone: true }),
    createdAt: createdAt(),
  },
  (t) => [
    foreignKey({
      name: "ladders_build",
      columns: [t.teamId, t.buildId],
      foreignColumns: [builds.teamId, builds.id],
    }),
    unique("ladders_name").on(t.teamId, t.buildId, t.name),
    unique("ladders_tenant").on(t.teamId, t.id),
    teamPolicy("team_id"),
  ],
);

/** Position 0 is the starting point; every later step changes something. */
export const ladderSteps = pgTable(
  "ladder_steps",
  {
    id: uuid("id").primaryKey().defaultRandom(),
    teamId: teamId(),
    ladderId: uuid("ladder_id").notNull(),
    position: integer("position").notNull(),
    name: text("name").notNull(),
    description: text("description").notNull().default(""),
    /** The step that this one starts from; null: the last kept one before it. */
    branchOfId: uuid("branch_of_id"),
    state: text("state", { enum: STEP_STATES }).notNull().default("kept"),
    createdAt: createdAt(),
  },
  (t) => [
    foreignKey({
      name: "ladder_steps_branch_of",
      columns: [t.teamId, t.branchOfId],
      foreignColumns: [t.teamId, t.id],
    }),
    foreignKey({
      name: "ladder_steps_ladder",
      columns: [t.teamId, t.ladderId],
      foreignColumns: [ladders.teamId, ladders.id],
    }),
    unique("ladder_steps_position").on(t.teamId, t.ladderId, t.position),
    unique("ladder_steps_tenant").on(t.teamId, t.id),
    teamPolicy("team_id"),
  ],
);
