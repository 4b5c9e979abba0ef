import {
  boolean,
  doublePrecision,
  foreignKey,
  index,
  integer,
  jsonb,
  pgTable,
  primaryKey,
  text,
  unique,
  uuid,
} from "drizzle-orm/pg-core";
import type { AmbientCheck } from "@/lib/core/reading/ambient-check";
import type { Reading } from "@/lib/core/reading/reading";
import { BASES, STANDINGS } from "@/lib/core/reading/reading";
import { createdAt, teamId } from "./columns";
import { maskRevisions, masks } from "./mask";
import { sweeps } from "./sweep";
import { teamPolicy } from "./team";

/** The suspects lie in rows of their own. */
export type StoredReading = Omit<Reading, "suspects">;

/** A sweep held against one mask revision, once per engine version in force. */
export const readings = pgTable(
  "readings",
  {
    id: uuid("id").primaryKey().defaultRandom(),
    teamId: teamId(),
    sweepId: uuid("sweep_id").notNull(),
    maskId: uuid("mask_id").notNull(),
    maskRevisionId: uuid("mask_revision_id").notNull(),
    engineVersion: integer("engine_version").notNull(),
    /** Levels were restated from the sweep's distance to the mask's, because the program asked. */
    restated: boolean("restated").notNull().default(false),
    standing: text("standing", { enum: STANDINGS }).notNull(),
    /** Of the line that the reading is known by; null when the sweep does not reach the mask. */
    marginDb: doublePrecision("margin_db"),
    marginAtHz: doublePrecision("margin_at_hz"),
    lineName: text("line_name"),
    coverage: doublePrecision("coverage").notNull(),
    /** Why the sweep cannot be held against the mask at all. */
    notComparable: text("not_comparable"),
    content: jsonb("content").$type<StoredReading>().notNull(),
    createdAt: createdAt(),
  },
  (t) => [
    foreignKey({
      name: "readings_sweep",
      columns: [t.teamId, t.sweepId],
      foreignColumns: [sweeps.teamId, sweeps.id],
    }),
    foreignKey({
      name: "readings_mask",
      columns: [t.teamId, t.maskId],
      foreignColumns: [masks.teamId, masks.id],
    }),
    foreignKey({
      name: "readings_mask_revision",
      columns: [t.teamId, t.maskRevisionId],
      foreignColumns: [maskRevisions.teamId, maskRevisions.id],
    }),
    unique("readings_once").on(t.teamId, t.sweepId, t.maskRevisionId, t.restated),
    unique("readings_tenant").on(t.teamId, t.id),
    index("readings_by_mask").on(t.teamId, t.maskId),
    teamPolicy("team_id"),
  ],
);

export const suspects = pgTable(
  "suspects",
  {
    teamId: teamId(),
    readingId: uuid("reading_id").notNull(),
    number: integer("number").notNull(),
    frequencyHz: doublePrecision("frequency_hz").notNull(),
    sampleHz: doublePrecision("sample_hz").notNull(),
    levelDb: doublePrecision("level_db").notNull(),
    limitDb: doublePrecision("limit_db"),
    marginDb: doublePrecision("margin_db"),
    prominenceDb: doublePrecision("prominence_db").notNull(),
    lineName: text("line_name"),
    basis: text("basis", { enum: BASES }).notNull(),
    tracePosition: integer("trace_position").notNull(),
  },
  (t) => [
    primaryKey({ columns: [t.teamId, t.readingId, t.number] }),
    foreignKey({
      name: "suspects_reading",
      columns: [t.teamId, t.readingId],
      foreignColumns: [readings.teamId, readings.id],
    }).onDelete("cascade"),
    teamPolicy("team_id"),
  ],
);

/**
 * Several sweeps held against one mask revision together, where that needs their levels. Kept the
 * first time anyone needs it, under a hash of what it was made from, so it never goes stale.
 */
export const combinedReadings = pgTable(
  "combined_readings",
  {
    teamId: teamId(),
    key: text("key").notNull(),
    content: jsonb("content").$type<Reading>().notNull(),
    createdAt: createdAt(),
  },
  (t) => [primaryKey({ columns: [t.teamId, t.key] }), teamPolicy("team_id")],
);

/** An ambient sweep of the same bench and day held beside a reading. */
export const ambientChecks = pgTable(
  "ambient_checks",
  {
    teamId: teamId(),
    readingId: uuid("reading_id").notNull(),
    ambientSweepId: uuid("ambient_sweep_id").notNull(),
    content: jsonb("content").$type<AmbientCheck>().notNull(),
    createdAt: createdAt(),
  },
  (t) => [
    primaryKey({ columns: [t.teamId, t.readingId, t.ambientSweepId] }),
    foreignKey({
      name: "ambient_checks_reading",
      columns: [t.teamId, t.readingId],
      foreignColumns: [readings.teamId, readings.id],
    }).onDelete("cascade"),
    foreignKey({
      name: "ambient_checks_sweep",
      columns: [t.teamId, t.ambientSweepId],
      foreignColumns: [sweeps.teamId, sweeps.id],
    }),
    teamPolicy("team_id"),
  ],
);
