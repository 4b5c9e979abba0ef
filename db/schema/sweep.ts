import {
  boolean,
  customType,
  date,
  doublePrecision,
  foreignKey,
  index,
  integer,
  jsonb,
  pgTable,
  primaryKey,
  text,
  timestamp,
  unique,
  uuid,
} from "drizzle-orm/pg-core";
import type { SweepInstrument } from "@/lib/core/bench/equipment";
import type { LinkSettings } from "@/lib/core/link/link-settings";
import type { MeasurementSettings } from "@/lib/core/sweep/settings";
import { DETECTORS, HOLDS, SWEEP_PURPOSES, TRACE_KINDS } from "@/lib/core/sweep/settings";
import { LEVEL_UNITS } from "@/lib/core/units/level-units";
import { benches, signalPathRevisions } from "./bench";
import { uncertaintyBudgets } from "./bench-quality";
import { createdAt, teamId } from "./columns";
import { storedFiles } from "./file";
import { ladderSteps } from "./ladder";
import { builds } from "./program";
import { teamPolicy, users } from "./team";

const bytea = customType<{ data: Buffer }>({ dataType: () => "bytea" });

/** One measurement as it was taken. Only its place in the line of record and its archiving move. */
export const sweeps = pgTable(
  "sweeps",
  {
    id: uuid("id").primaryKey().defaultRandom(),
    teamId: teamId(),
    buildId: uuid("build_id").notNull(),
    stepId: uuid("step_id"),
    benchId: uuid("bench_id").notNull(),
    signalPathRevisionId: uuid("signal_path_revision_id").notNull(),
    fileId: uuid("file_id").notNull(),
    fileName: text("file_name").notNull(),
    name: text("name").notNull(),
    purpose: text("purpose", { enum: SWEEP_PURPOSES }).notNull(),
    measuredOn: date("measured_on"),
    /** The instrument had applied the factors itself; the signal path passes the levels through. */
    corrected: boolean("corrected").notNull(),
    settings: jsonb("settings").$type<MeasurementSettings>().notNull(),
    link: jsonb("link").$type<LinkSettings>().notNull(),
    guardDb: doublePrecision("guard_db").notNull(),
    /** The bench's instrument on the day of the import; null: the bench names none. */
    instrument: jsonb("instrument").$type<SweepInstrument>(),
    /** The bench's uncertainty budget in force at the import; null: it has none. */
    budgetId: uuid("budget_id"),
    notes: text("notes").notNull().default(""),
    /** Counts for the trend of its build. */
    onRecord: boolean("on_record").notNull(),
    importedBy: uuid("imported_by")
      .notNull()
      .references(() => users.id),
    archivedAt: timestamp("archived_at", { withTimezone: true }),
    createdAt: createdAt(),
  },
  (t) => [
    foreignKey({
      name: "sweeps_build",
      columns: [t.teamId, t.buildId],
      foreignColumns: [builds.teamId, builds.id],
    }),
    foreignKey({
      name: "sweeps_step",
      columns: [t.teamId, t.stepId],
      foreignColumns: [ladderSteps.teamId, ladderSteps.id],
    }),
    foreignKey({
      name: "sweeps_bench",
      columns: [t.teamId, t.benchId],
      foreignColumns: [benches.teamId, benches.id],
    }),
    foreignKey({
      name: "sweeps_signal_path",
      columns: [t.teamId, t.signalPathRevisionId],
      foreignColumns: [signalPathRevisions.teamId, signalPathRevisions.id],
    }),
    foreignKey({
      name: "sweeps_file",
      columns: [t.teamId, t.fileId],
      foreignColumns: [storedFiles.teamId, storedFiles.id],
    }),
    foreignKey({
      name: "sweeps_budget",
      columns: [t.teamId, t.budgetId],
      foreignColumns: [uncertaintyBudgets.teamId, uncertaintyBudgets.id],
    }),
    index("sweeps_by_bench_day").on(t.teamId, t.benchId, t.measuredOn),
    index("sweeps_by_build").on(t.teamId, t.buildId),
    index("sweeps_by_step").on(t.teamId, t.stepId),
    unique("sweeps_tenant").on(t.teamId, t.id),
    teamPolicy("team_id"),
  ],
);

/** The frequency axis of a stored trace; a listed one has its frequencies in blocks. */
export type StoredAxis =
  | { kind: "regular"; startHz: number; stepHz: number; count: number }
  | { kind: "listed"; count: number };

/** What a trace holds, without its levels, which lie in blocks. */
export const traces = pgTable(
  "traces",
  {
    id: uuid("id").primaryKey().defaultRandom(),
    teamId: teamId(),
    sweepId: uuid("sweep_id").notNull(),
    position: integer("position").notNull(),
    name: text("name").notNull(),
    kind: text("kind", { enum: TRACE_KINDS }).notNull(),
    detector: text("detector", { enum: DETECTORS }),
    hold: text("hold", { enum: HOLDS }).notNull(),
    /** Unit of the stored levels, after the signal path. */
    unit: text("unit", { enum: LEVEL_UNITS }).notNull(),
    /** Unit in the file, before the signal path. */
    fileUnit: text("file_unit", { enum: LEVEL_UNITS }).notNull(),
    axis: jsonb("axis").$type<StoredAxis>().notNull(),
    firstHz: doublePrecision("first_hz").notNull(),
    lastHz: doublePrecision("last_hz").notNull(),
    stepHz: doublePrecision("step_hz"),
    /** Points with a level; the rest are not covered. */
    covered: integer("covered").notNull(),
    maxDb: doublePrecision("max_db"),
    /** Highest level in the file's unit, before the signal path; null: not kept at the time. */
    fileMaxDb: doublePrecision("file_max_db"),
    maxAtHz: doublePrecision("max_at_hz"),
    floorDb: doublePrecision("floor_db"),
    /** 10 log10 of the sum of power ratio times step in Hz; see lib/core/sweep/band-power.ts. */
    powerSumDb: doublePrecision("power_sum_db"),
  },
  (t) => [
    foreignKey({
      name: "traces_sweep",
      columns: [t.teamId, t.sweepId],
      foreignColumns: [sweeps.teamId, sweeps.id],
    }),
    unique("traces_position").on(t.teamId, t.sweepId, t.position),
    unique("traces_tenant").on(t.teamId, t.id),
    teamPolicy("team_id"),
  ],
);

export const BLOCK_KINDS = ["level", "frequency", "pyramid"] as const;

/**
 * Bytes of a trace: float32 levels and float64 frequencies of 65,536 points each, and the
 * min/max pyramid, whose `level` counts from 1. Checked by CRC-32 when read.
 */
export const traceBlocks = pgTable(
  "trace_blocks",
  {
    teamId: teamId(),
    traceId: uuid("trace_id").notNull(),
    kind: text("kind", { enum: BLOCK_KINDS }).notNull(),
    level: integer("level").notNull().default(0),
    position: integer("position").notNull(),
    crc32: doublePrecision("crc32").notNull(),
    bytes: bytea("bytes").notNull(),
  },
  (t) => [
    primaryKey({ columns: [t.teamId, t.traceId, t.kind, t.level, t.position] }),
    foreignKey({
      name: "trace_blocks_trace",
      columns: [t.teamId, t.traceId],
      foreignColumns: [traces.teamId, traces.id],
    }),
    teamPolicy("team_id"),
  ],
);
