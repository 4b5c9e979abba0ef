import { sql } from "drizzle-orm";
import {
  boolean,
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
import type { Mask } from "@/lib/core/mask/mask";
import { createdAt, teamId } from "./columns";
import { programs } from "./program";
import { teamPolicy, users } from "./team";

export const MASK_ORIGINS = ["shipped", "team"] as const;

/** How a revision came to be: shipped with Neap, written by the team, or confirmed by it. */
export const REVISION_SOURCES = ["shipped", "team", "confirmation"] as const;

export const masks = pgTable(
  "masks",
  {
    id: uuid("id").primaryKey().defaultRandom(),
    teamId: teamId(),
    key: text("key").notNull(),
    origin: text("origin", { enum: MASK_ORIGINS }).notNull(),
    archivedAt: timestamp("archived_at", { withTimezone: true }),
    createdAt: createdAt(),
  },
  (t) => [
    unique("masks_key").on(t.teamId, t.key),
    unique("masks_tenant").on(t.teamId, t.id),
    teamPolicy("team_id"),
  ],
);

/** Rows are only ever added: a reading names the revision it was made with. */
export const maskRevisions = pgTable(
  "mask_revisions",
  {
    id: uuid("id").primaryKey().defaultRandom(),
    teamId: teamId(),
    maskId: uuid("mask_id").notNull(),
    revision: integer("revision").notNull(),
    content: jsonb("content").$type<Mask>().notNull(),
    source: text("source", { enum: REVISION_SOURCES }).notNull().default("team"),
    /** Who confirmed the limits, when, and against which copy; null unless this is a confirmation. */
    confirmedBy: uuid("confirmed_by").references(() => users.id),
    confirmedAt: timestamp("confirmed_at", { withTimezone: true }),
    confirmedCopy: text("confirmed_copy"),
    /** null while the readings of existing sweeps are still being made; then the one before counts. */
    inForceAt: timestamp("in_force_at", { withTimezone: true }).default(sql`clock_timestamp()`),
    createdAt: createdAt(),
  },
  (t) => [
    foreignKey({
      name: "mask_revisions_mask",
      columns: [t.teamId, t.maskId],
      foreignColumns: [masks.teamId, masks.id],
    }),
    unique("mask_revisions_number").on(t.teamId, t.maskId, t.revision),
    unique("mask_revisions_tenant").on(t.teamId, t.id),
    teamPolicy("team_id"),
  ],
);

/** How far the readings of a new revision have been made; the job behind it counts up. */
export const maskRecomputations = pgTable(
  "mask_recomputations",
  {
    teamId: teamId(),
    maskRevisionId: uuid("mask_revision_id").notNull(),
    total: integer("total").notNull(),
    done: integer("done").notNull().default(0),
    finishedAt: timestamp("finished_at", { withTimezone: true }),
    /** What kept the last try from finishing; null when nothing did. */
    problem: text("problem"),
    createdAt: createdAt(),
  },
  (t) => [
    primaryKey({ columns: [t.teamId, t.maskRevisionId] }),
    foreignKey({
      name: "mask_recomputations_revision",
      columns: [t.teamId, t.maskRevisionId],
      foreignColumns: [maskRevisions.teamId, maskRevisions.id],
    }),
    teamPolicy("team_id"),
  ],
);

/** The masks that a program must fit under. */
export const programMasks = pgTable(
  "program_masks",
  {
    teamId: teamId(),
    programId: uuid("program_id").notNull(),
    maskId: uuid("mask_id").notNull(),
    /** Asked for by a person: sweeps taken at another distance are restated to the mask's. */
    restateDistance: boolean("restate_distance").notNull().default(false),
  },
  (t) => [
    primaryKey({ columns: [t.teamId, t.programId, t.maskId] }),
    foreignKey({
      name: "program_masks_program",
      columns: [t.teamId, t.programId],
      foreignColumns: [programs.teamId, programs.id],
    }).onDelete("cascade"),
    foreignKey({
      name: "program_masks_mask",
      columns: [t.teamId, t.maskId],
      foreignColumns: [masks.teamId, masks.id],
    }),
    teamPolicy("team_id"),
  ],
);
