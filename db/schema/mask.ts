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
import type { Mask } from "@/lib/core/mask/mask";
import { createdAt, teamId } from "./columns";
import { programs } from "./program";
import { teamPolicy } from "./team";

export const MASK_ORIGINS = ["shipped", "team"] as const;

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

/** The masks that a program must fit under. */
export const programMasks = pgTable(
  "program_masks",
  {
    teamId: teamId(),
    programId: uuid("program_id").notNull(),
    maskId: uuid("mask_id").notNull(),
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
