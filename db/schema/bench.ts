import {
  doublePrecision,
  foreignKey,
  integer,
  jsonb,
  pgTable,
  text,
  timestamp,
  unique,
  uuid,
} from "drizzle-orm/pg-core";
import type { SignalPath } from "@/lib/core/bench/signal-path";
import { GUARD_RULES } from "@/lib/core/bench/uncertainty-budget";
import { createdAt, teamId } from "./columns";
import { equipment } from "./equipment";
import { teamPolicy } from "./team";

export const benches = pgTable(
  "benches",
  {
    id: uuid("id").primaryKey().defaultRandom(),
    teamId: teamId(),
    name: text("name").notNull(),
    site: text("site").notNull().default(""),
    instrument: text("instrument").notNull().default(""),
    distanceM: doublePrecision("distance_m"),
    /** The instrument as a piece of equipment with its calibrations; `instrument` is its words. */
    instrumentId: uuid("instrument_id"),
    /** In force now: stated, or computed from the budget in force by the guard rule. */
    guardDb: doublePrecision("guard_db").notNull().default(0),
    guardRule: text("guard_rule", { enum: GUARD_RULES }).notNull().default("stated"),
    /** Drift of a bench check beyond which its day is in doubt. */
    checkToleranceDb: doublePrecision("check_tolerance_db").notNull().default(2),
    notes: text("notes").notNull().default(""),
    archivedAt: timestamp("archived_at", { withTimezone: true }),
    createdAt: createdAt(),
  },
  (t) => [
    foreignKey({
      name: "benches_instrument",
      columns: [t.teamId, t.instrumentId],
      foreignColumns: [equipment.teamId, equipment.id],
    }),
    unique("benches_name").on(t.teamId, t.name),
    unique("benches_tenant").on(t.teamId, t.id),
    teamPolicy("team_id"),
  ],
);

/** Rows are only ever added: a sweep keeps the revision it was taken with. */
export const signalPathRevisions = pgTable(
  "signal_path_revisions",
  {
    id: uuid("id").primaryKey().defaultRandom(),
    teamId: teamId(),
    benchId: uuid("bench_id").notNull(),
    revision: integer("revision").notNull(),
    content: jsonb("content").$type<SignalPath>().notNull(),
    createdAt: createdAt(),
  },
  (t) => [
    foreignKey({
      name: "signal_path_revisions_bench",
      columns: [t.teamId, t.benchId],
      foreignColumns: [benches.teamId, benches.id],
    }),
    unique("signal_path_revisions_number").on(t.teamId, t.benchId, t.revision),
    unique("signal_path_revisions_tenant").on(t.teamId, t.id),
    teamPolicy("team_id"),
  ],
);
