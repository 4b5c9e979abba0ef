import {
  date,
  foreignKey,
  jsonb,
  pgTable,
  text,
  timestamp,
  unique,
  uuid,
} from "drizzle-orm/pg-core";
import { EQUIPMENT_KINDS } from "@/lib/core/bench/equipment";
import type { FactorPoint } from "@/lib/core/bench/signal-path";
import { createdAt, teamId } from "./columns";
import { storedFiles } from "./file";
import { teamPolicy, users } from "./team";

/** Instruments and transducers, each with a history of calibrations. */
export const equipment = pgTable(
  "equipment",
  {
    id: uuid("id").primaryKey().defaultRandom(),
    teamId: teamId(),
    kind: text("kind", { enum: EQUIPMENT_KINDS }).notNull(),
    name: text("name").notNull(),
    /** The team's own inventory or serial number. */
    inventoryNumber: text("inventory_number").notNull().default(""),
    notes: text("notes").notNull().default(""),
    archivedAt: timestamp("archived_at", { withTimezone: true }),
    createdAt: createdAt(),
  },
  (t) => [
    unique("equipment_name").on(t.teamId, t.name),
    unique("equipment_tenant").on(t.teamId, t.id),
    teamPolicy("team_id"),
  ],
);

/** Rows are only ever added; one entered by mistake is withdrawn and stays visible. */
export const calibrations = pgTable(
  "calibrations",
  {
    id: uuid("id").primaryKey().defaultRandom(),
    teamId: teamId(),
    equipmentId: uuid("equipment_id").notNull(),
    calibratedOn: date("calibrated_on").notNull(),
    dueOn: date("due_on"),
    laboratory: text("laboratory").notNull().default(""),
    certificateNumber: text("certificate_number").notNull().default(""),
    /** The certificate itself. */
    fileId: uuid("file_id"),
    fileName: text("file_name"),
    /** Factors that came with the calibration of a transducer; null without. */
    factors: jsonb("factors").$type<FactorPoint[]>(),
    recordedBy: uuid("recorded_by")
      .notNull()
      .references(() => users.id),
    withdrawnAt: timestamp("withdrawn_at", { withTimezone: true }),
    createdAt: createdAt(),
  },
  (t) => [
    foreignKey({
      name: "calibrations_equipment",
      columns: [t.teamId, t.equipmentId],
      foreignColumns: [equipment.teamId, equipment.id],
    }),
    foreignKey({
      name: "calibrations_file",
      columns: [t.teamId, t.fileId],
      foreignColumns: [storedFiles.teamId, storedFiles.id],
    }),
    unique("calibrations_tenant").on(t.teamId, t.id),
    teamPolicy("team_id"),
  ],
);
