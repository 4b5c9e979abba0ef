import {
  foreignKey,
  index,
  jsonb,
  pgTable,
  text,
  timestamp,
  unique,
  uuid,
} from "drizzle-orm/pg-core";
import type { Mismatch } from "@/lib/core/delta/delta";
import { createdAt, teamId } from "./columns";
import { sweeps } from "./sweep";
import { teamPolicy, users } from "./team";

/**
 * An engineer's written reason for comparing two sweeps although something differs. Only the
 * mismatches named here are accepted; another one that shows up later still forbids the delta.
 */
export const acceptedMismatches = pgTable(
  "accepted_mismatches",
  {
    id: uuid("id").primaryKey().defaultRandom(),
    teamId: teamId(),
    beforeSweepId: uuid("before_sweep_id").notNull(),
    afterSweepId: uuid("after_sweep_id").notNull(),
    fields: jsonb("fields").$type<Mismatch["field"][]>().notNull(),
    reason: text("reason").notNull(),
    acceptedBy: uuid("accepted_by")
      .notNull()
      .references(() => users.id),
    withdrawnBy: uuid("withdrawn_by").references(() => users.id),
    withdrawnAt: timestamp("withdrawn_at", { withTimezone: true }),
    createdAt: createdAt(),
  },
  (t) => [
    foreignKey({
      name: "accepted_mismatches_before",
      columns: [t.teamId, t.beforeSweepId],
      foreignColumns: [sweeps.teamId, sweeps.id],
    }),
    foreignKey({
      name: "accepted_mismatches_after",
      columns: [t.teamId, t.afterSweepId],
      foreignColumns: [sweeps.teamId, sweeps.id],
    }),
    index("accepted_mismatches_by_pair").on(t.teamId, t.beforeSweepId, t.afterSweepId),
    unique("accepted_mismatches_tenant").on(t.teamId, t.id),
    teamPolicy("team_id"),
  ],
);
