import {
  boolean,
  date,
  doublePrecision,
  foreignKey,
  index,
  integer,
  jsonb,
  pgTable,
  text,
  timestamp,
  unique,
  uuid,
} from "drizzle-orm/pg-core";
import type { BenchCheckContent } from "@/lib/core/bench/bench-check";
import type { UncertaintyBudget } from "@/lib/core/bench/uncertainty-budget";
import { benches, signalPathRevisions } from "./bench";
import { createdAt, teamId } from "./columns";
import { storedFiles } from "./file";
import { teamPolicy, users } from "./team";

/** Rows are only ever added: a sweep names the budget that was in force when it was imported. */
export const uncertaintyBudgets = pgTable(
  "uncertainty_budgets",
  {
    id: uuid("id").primaryKey().defaultRandom(),
    teamId: teamId(),
    benchId: uuid("bench_id").notNull(),
    revision: integer("revision").notNull(),
    content: jsonb("content").$type<UncertaintyBudget>().notNull(),
    createdBy: uuid("created_by")
      .notNull()
      .references(() => users.id),
    createdAt: createdAt(),
  },
  (t) => [
    foreignKey({
      name: "uncertainty_budgets_bench",
      columns: [t.teamId, t.benchId],
      foreignColumns: [benches.teamId, benches.id],
    }),
    unique("uncertainty_budgets_number").on(t.teamId, t.benchId, t.revision),
    unique("uncertainty_budgets_tenant").on(t.teamId, t.id),
    teamPolicy("team_id"),
  ],
);

/** A sweep of a known source, held against the bench's reference sweep of the same source. */
export const benchChecks = pgTable(
  "bench_checks",
  {
    id: uuid("id").primaryKey().defaultRandom(),
    teamId: teamId(),
    benchId: uuid("bench_id").notNull(),
    signalPathRevisionId: uuid("signal_path_revision_id").notNull(),
    fileId: uuid("file_id").notNull(),
    fileName: text("file_name").notNull(),
    /** The known source, for instance a comb. */
    source: text("source").notNull(),
    measuredOn: date("measured_on").notNull(),
    /** The sweep that later checks of the same source are compared with. */
    isReference: boolean("is_reference").notNull(),
    referenceId: uuid("reference_id"),
    content: jsonb("content").$type<BenchCheckContent>().notNull(),
    /** Mean and largest drift over the lines in dB; null in a reference. */
    driftMeanDb: doublePrecision("drift_mean_db"),
    driftWorstDb: doublePrecision("drift_worst_db"),
    notes: text("notes").notNull().default(""),
    checkedBy: uuid("checked_by")
      .notNull()
      .references(() => users.id),
    archivedAt: timestamp("archived_at", { withTimezone: true }),
    createdAt: createdAt(),
  },
  (t) => [
    foreignKey({
      name: "bench_checks_bench",
      columns: [t.teamId, t.benchId],
      foreignColumns: [benches.teamId, benches.id],
    }),
    foreignKey({
      name: "bench_checks_signal_path",
      columns: [t.teamId, t.signalPathRevisionId],
      foreignColumns: [signalPathRevisions.teamId, signalPathRevisions.id],
    }),
    foreignKey({
      name: "bench_checks_file",
      columns: [t.teamId, t.fileId],
      foreignColumns: [storedFiles.teamId, storedFiles.id],
    }),
    foreignKey({
      name: "bench_checks_reference",
      columns: [t.teamId, t.referenceId],
      foreignColumns: [t.teamId, t.id],
    }),
    index("bench_checks_by_day").on(t.teamId, t.benchId, t.measuredOn),
    unique("bench_checks_tenant").on(t.teamId, t.id),
    teamPolicy("team_id"),
  ],
);
