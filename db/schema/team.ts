import { sql } from "drizzle-orm";
import {
  index,
  jsonb,
  pgPolicy,
  pgRole,
  pgTable,
  primaryKey,
  text,
  timestamp,
  uuid,
} from "drizzle-orm/pg-core";
import { ROLES } from "@/lib/auth/permissions";

/** The role the app connects as. It owns nothing, so row-level security binds it. */
export const appRole = pgRole("neap_app").existing();

/** After a commit the setting is '' rather than NULL, hence nullif. */
const currentTeam = sql`nullif(current_setting('neap.team_id', true), '')::uuid`;

/** Every table of team data carries exactly this policy. */
export const teamPolicy = (column: string) =>
  pgPolicy("team_only", {
    for: "all",
    to: appRole,
    using: sql`${sql.identifier(column)} = ${currentTeam}`,
    withCheck: sql`${sql.identifier(column)} = ${currentTeam}`,
  });

const createdAt = () => timestamp("created_at", { withTimezone: true }).notNull().defaultNow();

export const teams = pgTable(
  "teams",
  {
    id: uuid("id").primaryKey().defaultRandom(),
    name: text("name").notNull(),
    createdAt: createdAt(),
  },
  () => [teamPolicy("id")],
);

/** Sign-in identities. Read across teams only by the security-definer functions. */
export const users = pgTable(
  "users",
  {
    id: uuid("id").primaryKey().defaultRandom(),
    email: text("email").notNull().unique(),
    name: text("name").notNull(),
    passwordHash: text("password_hash").notNull(),
    createdAt: createdAt(),
  },
  () => [
    pgPolicy("same_team", {
      for: "select",
      to: appRole,
      using: sql`exists (select 1 from members m where m.user_id = users.id and m.team_id = ${currentTeam})`,
    }),
  ],
);

export const members = pgTable(
  "members",
  {
    teamId: uuid("team_id")
      .notNull()
      .references(() => teams.id),
    userId: uuid("user_id")
      .notNull()
      .references(() => users.id),
    role: text("role", { enum: ROLES }).notNull(),
    deactivatedAt: timestamp("deactivated_at", { withTimezone: true }),
    createdAt: createdAt(),
  },
  (t) => [primaryKey({ columns: [t.teamId, t.userId] }), teamPolicy("team_id")],
);

/** One row per change, written in the transaction of the change itself. Never updated. */
export const auditEvents = pgTable(
  "audit_events",
  {
    id: uuid("id").primaryKey().defaultRandom(),
    teamId: uuid("team_id")
      .notNull()
      .references(() => teams.id),
    actorId: uuid("actor_id").references(() => users.id),
    at: timestamp("at", { withTimezone: true }).notNull().defaultNow(),
    action: text("action").notNull(),
    subjectType: text("subject_type").notNull(),
    subjectId: text("subject_id").notNull(),
    detail: jsonb("detail").notNull().default({}),
  },
  (t) => [index("audit_events_by_time").on(t.teamId, t.at), teamPolicy("team_id")],
);

/**
 * Tries to sign in that were not (yet) proven right. They come before a team is known, so the rows
 * carry none, and the app's role has no grant here: the security-definer functions are the only way
 * in. Address and origin are kept as digests, since people type passwords into the wrong field.
 */
export const signInAttempts = pgTable(
  "sign_in_attempts",
  {
    id: uuid("id").primaryKey().defaultRandom(),
    addressDigest: text("address_digest").notNull(),
    originDigest: text("origin_digest").notNull(),
    at: timestamp("at", { withTimezone: true }).notNull().defaultNow(),
  },
  (t) => [
    index("sign_in_attempts_by_address").on(t.addressDigest, t.at),
    index("sign_in_attempts_by_time").on(t.at),
  ],
).enableRLS();
