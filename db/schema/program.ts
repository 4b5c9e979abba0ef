import {
  date,
  doublePrecision,
  foreignKey,
  integer,
  pgTable,
  text,
  timestamp,
  unique,
  uuid,
} from "drizzle-orm/pg-core";
import { createdAt, teamId } from "./columns";
import { teamPolicy } from "./team";

export const programs = pgTable(
  "programs",
  {
    id: uuid("id").primaryKey().defaultRandom(),
    teamId: teamId(),
    name: text("name").notNull(),
    description: text("description").notNull().default(""),
    targetMarginDb: doublePrecision("target_margin_db").notNull(),
    archivedAt: timestamp("archived_at", { withTimezone: true }),
    createdAt: createdAt(),
  },
  (t) => [
    unique("programs_name").on(t.teamId, t.name),
    unique("programs_tenant").on(t.teamId, t.id),
    teamPolicy("team_id"),
  ],
);

export const milestones = pgTable(
  "milestones",
  {
    id: uuid("id").primaryKey().defaultRandom(),
    teamId: teamId(),
    programId: uuid("program_id").notNull(),
    name: text("name").notNull(),
    dueOn: date("due_on").notNull(),
    requiredMarginDb: doublePrecision("required_margin_db"),
  },
  (t) => [
    // Both columns, so that a row can never point into another team.
    foreignKey({
      name: "milestones_program",
      columns: [t.teamId, t.programId],
      foreignColumns: [programs.teamId, programs.id],
    }).onDelete("cascade"),
    teamPolicy("team_id"),
  ],
);

export const builds = pgTable(
  "builds",
  {
    id: uuid("id").primaryKey().defaultRandom(),
    teamId: teamId(),
    programId: uuid("program_id").notNull(),
    name: text("name").notNull(),
    sequence: integer("sequence").notNull(),
    builtOn: date("built_on"),
    notes: text("notes").notNull().default(""),
    archivedAt: timestamp("archived_at", { withTimezone: true }),
    createdAt: createdAt(),
  },
  (t) => [
    foreignKey({
      name: "builds_program",
      columns: [t.teamId, t.programId],
      foreignColumns: [programs.teamId, programs.id],
    }),
    unique("builds_sequence").on(t.teamId, t.programId, t.sequence),
    unique("builds_name").on(t.teamId, t.programId, t.name),
    unique("builds_tenant").on(t.teamId, t.id),
    teamPolicy("team_id"),
  ],
);

/** Known oscillators, bit rates and converters of a build. */
export const clocks = pgTable(
  "clocks",
  {
    id: uuid("id").primaryKey().defaultRandom(),
    teamId: teamId(),
    buildId: uuid("build_id").notNull(),
    name: text("name").notNull(),
    frequencyHz: doublePrecision("frequency_hz").notNull(),
    tolerancePpm: doublePrecision("tolerance_ppm"),
  },
  (t) => [
    foreignKey({
      name: "clocks_build",
      columns: [t.teamId, t.buildId],
      foreignColumns: [builds.teamId, builds.id],
    }).onDelete("cascade"),
    unique("clocks_name").on(t.teamId, t.buildId, t.name),
    teamPolicy("team_id"),
  ],
);
