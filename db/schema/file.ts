import { integer, pgTable, text, unique, uuid } from "drizzle-orm/pg-core";
import { createdAt, teamId } from "./columns";
import { teamPolicy } from "./team";

/** Bytes in object storage, once per content and team. The name belongs to whoever uses them. */
export const storedFiles = pgTable(
  "stored_files",
  {
    id: uuid("id").primaryKey().defaultRandom(),
    teamId: teamId(),
    sha256: text("sha256").notNull(),
    sizeBytes: integer("size_bytes").notNull(),
    mediaType: text("media_type").notNull(),
    createdAt: createdAt(),
  },
  (t) => [
    unique("stored_files_content").on(t.teamId, t.sha256),
    unique("stored_files_tenant").on(t.teamId, t.id),
    teamPolicy("team_id"),
  ],
);
