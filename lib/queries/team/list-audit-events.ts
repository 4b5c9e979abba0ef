import { and, asc, desc, eq, inArray, sql } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import { inTeam } from "@/db/client";
import { auditEvents, builds, programs, users } from "@/db/schema";
import type { Context } from "@/lib/auth/context";
import { requirePermission } from "@/lib/commands/run";

const PAGE_SIZE = 50;
const UUID = /^[0-9a-f]{8}(-[0-9a-f]{4}){3}-[0-9a-f]{12}$/i;

export interface AuditEvent {
  id: string;
  at: Date;
  /** null: the person is not known any more, or the system itself acted. */
  actor: string | null;
  action: string;
  subjectType: string;
  subjectId: string;
  /** What the subject is called today, where it has a name. */
  subjectName: string | null;
  detail: unknown;
}

export interface AuditPage {
  events: AuditEvent[];
  /** The last event of the page when older ones follow: the next page's `before`. */
  nextBefore: string | null;
  /** When the page was read, for telling how long ago an event was. */
  readAt: Date;
}

export interface AuditFilter {
  before?: string | undefined;
  action?: string | undefined;
  actorId?: string | undefined;
}

/** Names of the subjects as they are called today, by id. */
async function readSubjectNames(
  tx: Transaction,
  events: { subjectType: string; subjectId: string }[],
): Promise<Map<string, string>> {
  const idsOf = (type: string) =>
    events
      .filter((event) => event.subjectType === type && UUID.test(event.subjectId))
      .map((event) => event.subjectId);
  const found = [
    ...(await tx
      .select({ id: programs.id, name: programs.name })
      .from(programs)
      .where(inArray(programs.id, idsOf("program")))),
    ...(await tx
      .select({ id: builds.id, name: builds.name })
      .from(builds)
      .where(inArray(builds.id, idsOf("build")))),
    ...(await tx
      .select({ id: users.id, name: users.name })
      .from(users)
      .where(inArray(users.id, idsOf("member")))),
  ];
  return new Map(found.map((row) => [row.id, row.name]));
}

/** One page of the audit trail, newest first; a filter that names nothing known finds nothing. */
export async function listAuditEvents(ctx: Context, filter: AuditFilter): Promise<AuditPage> {
  requirePermission(ctx, "audit.read");
  const { before, action, actorId } = filter;
  const readAt = new Date();
  if ([before, actorId].some((id) => id !== undefined && !UUID.test(id))) {
    return { events: [], nextBefore: null, readAt };
  }
  return inTeam(ctx.db, ctx.teamId, async (tx) => {
    // The mark is an event, not a time: a time would lose its microseconds on the way through a URL.
    const older = sql`(${auditEvents.at}, ${auditEvents.id}) < (
      select mark.at, mark.id from audit_events mark
      where mark.team_id = ${ctx.teamId} and mark.id = ${before ?? null})`;
    const rows = await tx
      .select({
        id: auditEvents.id,
        at: auditEvents.at,
        actor: users.name,
        action: auditEvents.action,
        subjectType: auditEvents.subjectType,
        subjectId: auditEvents.subjectId,
        detail: auditEvents.detail,
      })
      .from(auditEvents)
      .leftJoin(users, eq(users.id, auditEvents.actorId))
      .where(
        and(
          eq(auditEvents.teamId, ctx.teamId),
          before ? older : undefined,
          action ? eq(auditEvents.action, action) : undefined,
          actorId ? eq(auditEvents.actorId, actorId) : undefined,
        ),
      )
      .orderBy(desc(auditEvents.at), desc(auditEvents.id))
      .limit(PAGE_SIZE + 1);
    const shown = rows.slice(0, PAGE_SIZE);
    const names = await readSubjectNames(tx, shown);
    return {
      events: shown.map((row) => ({ ...row, subjectName: names.get(row.subjectId) ?? null })),
      nextBefore: rows.length > PAGE_SIZE ? (shown.at(-1)?.id ?? null) : null,
      readAt,
    };
  });
}

export interface AuditChoices {
  actions: string[];
  people: { id: string; name: string }[];
}

/** What the trail can be filtered by: every action and person that occurs in it. */
export async function listAuditChoices(ctx: Context): Promise<AuditChoices> {
  requirePermission(ctx, "audit.read");
  return inTeam(ctx.db, ctx.teamId, async (tx) => {
    const actions = await tx
      .selectDistinct({ action: auditEvents.action })
      .from(auditEvents)
      .where(eq(auditEvents.teamId, ctx.teamId))
      .orderBy(asc(auditEvents.action));
    const people = await tx
      .selectDistinct({ id: users.id, name: users.name })
      .from(auditEvents)
      .innerJoin(users, eq(users.id, auditEvents.actorId))
      .where(eq(auditEvents.teamId, ctx.teamId))
      .orderBy(asc(users.name));
    return { actions: actions.map((row) => row.action), people };
  });
}
