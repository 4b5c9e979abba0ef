import {
  foreignKey,
  integer,
  jsonb,
  pgTable,
  primaryKey,
  text,
  timestamp,
  unique,
  uuid,
} from "drizzle-orm/pg-core";
import type { ReportSnapshot } from "@/lib/reports/report-snapshot";
import { PAPERS } from "@/lib/reports/paper";
import { createdAt, teamId } from "./columns";
import { storedFiles } from "./file";
import { ladders } from "./ladder";
import { builds } from "./program";
import { sweeps } from "./sweep";
import { teamPolicy, users } from "./team";

export const REPORT_STATES = ["draft", "issued", "approved", "withdrawn"] as const;
export type ReportState = (typeof REPORT_STATES)[number];

/** A draft is edited; from its issue on the snapshot, the number and the hash never change. */
export const reports = pgTable(
  "reports",
  {
    id: uuid("id").primaryKey().defaultRandom(),
    teamId: teamId(),
    buildId: uuid("build_id").notNull(),
    ladderId: uuid("ladder_id"),
    replacesId: uuid("replaces_id"),
    title: text("title").notNull(),
    summary: text("summary").notNull().default(""),
    paper: text("paper", { enum: PAPERS }).notNull(),
    state: text("state", { enum: REPORT_STATES }).notNull(),
    /** Counts up in the team; given when the report is issued. */
    number: integer("number"),
    snapshot: jsonb("snapshot").$type<ReportSnapshot>(),
    sha256: text("sha256"),
    /** The PDF of the present state; the earlier ones stay in storage. */
    fileId: uuid("file_id"),
    createdBy: uuid("created_by")
      .notNull()
      .references(() => users.id),
    issuedBy: uuid("issued_by").references(() => users.id),
    issuedAt: timestamp("issued_at", { withTimezone: true }),
    approvedBy: uuid("approved_by").references(() => users.id),
    approvedAt: timestamp("approved_at", { withTimezone: true }),
    withdrawnBy: uuid("withdrawn_by").references(() => users.id),
    withdrawnAt: timestamp("withdrawn_at", { withTimezone: true }),
    withdrawnReason: text("withdrawn_reason"),
    createdAt: createdAt(),
  },
  (t) => [
    foreignKey({
      name: "reports_build",
      columns: [t.teamId, t.buildId],
      foreignColumns: [builds.teamId, builds.id],
    }),
    foreignKey({
      name: "reports_ladder",
      columns: [t.teamId, t.ladderId],
      foreignColumns: [ladders.teamId, ladders.id],
    }),
    foreignKey({
      name: "reports_file",
      columns: [t.teamId, t.fileId],
      foreignColumns: [storedFiles.teamId, storedFiles.id],
    }),
    foreignKey({
      name: "reports_replaces",
      columns: [t.teamId, t.replacesId],
      foreignColumns: [t.teamId, t.id],
    }),
    unique("reports_number").on(t.teamId, t.number),
    unique("reports_tenant").on(t.teamId, t.id),
    teamPolicy("team_id"),
  ],
);

/** The sweeps that a report speaks of. */
export const reportSweeps = pgTable(
  "report_sweeps",
  {
    teamId: teamId(),
    reportId: uuid("report_id").notNull(),
    sweepId: uuid("sweep_id").notNull(),
    position: integer("position").notNull(),
  },
  (t) => [
    primaryKey({ columns: [t.teamId, t.reportId, t.sweepId] }),
    foreignKey({
      name: "report_sweeps_report",
      columns: [t.teamId, t.reportId],
      foreignColumns: [reports.teamId, reports.id],
    }).onDelete("cascade"),
    foreignKey({
      name: "report_sweeps_sweep",
      columns: [t.teamId, t.sweepId],
      foreignColumns: [sweeps.teamId, sweeps.id],
    }),
    teamPolicy("team_id"),
  ],
);
