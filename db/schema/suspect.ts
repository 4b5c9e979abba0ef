import {
  doublePrecision,
  foreignKey,
  index,
  integer,
  jsonb,
  pgTable,
  text,
  unique,
  uuid,
} from "drizzle-orm/pg-core";
import { SUSPECT_STATES } from "@/lib/core/reading/suspect-state";
import { createdAt, teamId } from "./columns";
import { programs } from "./program";
import { teamPolicy, users } from "./team";

/** A suspect that a program follows over its builds. Where it was seen is found by frequency. */
export const followedSuspects = pgTable(
  "followed_suspects",
  {
    id: uuid("id").primaryKey().defaultRandom(),
    teamId: teamId(),
    programId: uuid("program_id").notNull(),
    /** Counts up within the program. */
    number: integer("number").notNull(),
    frequencyHz: doublePrecision("frequency_hz").notNull(),
    /** A suspect this near or nearer is taken for the same one. */
    toleranceHz: doublePrecision("tolerance_hz").notNull(),
    /** Likely source in the team's own words. */
    source: text("source").notNull().default(""),
    ownerId: uuid("owner_id").references(() => users.id),
    state: text("state", { enum: SUSPECT_STATES }).notNull().default("open"),
    createdBy: uuid("created_by")
      .notNull()
      .references(() => users.id),
    createdAt: createdAt(),
  },
  (t) => [
    foreignKey({
      name: "followed_suspects_program",
      columns: [t.teamId, t.programId],
      foreignColumns: [programs.teamId, programs.id],
    }),
    unique("followed_suspects_number").on(t.teamId, t.programId, t.number),
    unique("followed_suspects_tenant").on(t.teamId, t.id),
    index("followed_suspects_by_frequency").on(t.teamId, t.programId, t.frequencyHz),
    teamPolicy("team_id"),
  ],
);

/** What was said about a followed suspect and what changed about it, in order; only ever added. */
export const suspectNotes = pgTable(
  "suspect_notes",
  {
    id: uuid("id").primaryKey().defaultRandom(),
    teamId: teamId(),
    suspectId: uuid("suspect_id").notNull(),
    authorId: uuid("author_id")
      .notNull()
      .references(() => users.id),
    text: text("text").notNull().default(""),
    /** Fields that changed with this note, each from and to; null for a mere remark. */
    change: jsonb("change").$type<Record<string, { from: string | null; to: string | null }>>(),
    createdAt: createdAt(),
  },
  (t) => [
    foreignKey({
      name: "suspect_notes_suspect",
      columns: [t.teamId, t.suspectId],
      foreignColumns: [followedSuspects.teamId, followedSuspects.id],
    }),
    index("suspect_notes_by_suspect").on(t.teamId, t.suspectId, t.createdAt),
    unique("suspect_notes_tenant").on(t.teamId, t.id),
    teamPolicy("team_id"),
  ],
);
