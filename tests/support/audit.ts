import type { TestDatabase } from "./database";

export interface AuditRow {
  actor_id: string | null;
  action: string;
  subject_id: string;
}

export async function auditRows(database: TestDatabase, teamId: string): Promise<AuditRow[]> {
  const found = await database.owner.query<AuditRow>(
    "select actor_id, action, subject_id from audit_events where team_id = $1 order by at",
    [teamId],
  );
  return found.rows;
}

/** Makes every audit insert of the app fail while `work` runs: what it changed must be undone. */
export async function withoutAudit(database: TestDatabase, work: () => Promise<void>) {
  await database.owner.query("revoke insert on audit_events from neap_app");
  try {
    await work();
  } finally {
    await database.owner.query("grant insert on audit_events to neap_app");
  }
}
