type Raw = Record<string, string | string[] | undefined>;

const one = (value: string | string[] | undefined) =>
  (Array.isArray(value) ? value[0] : value) || undefined;

/** The URL state of the audit trail; an empty value is no filter. */
export function readAuditParams(raw: Raw) {
  return { before: one(raw.before), action: one(raw.action), actorId: one(raw.person) };
}

/** The address of the page that starts after the given event, or anew, with the same filter. */
export function auditAddress(
  before: string | null,
  filter: { action: string | undefined; actorId: string | undefined },
): string {
  const params = new URLSearchParams();
  if (filter.action) params.set("action", filter.action);
  if (filter.actorId) params.set("person", filter.actorId);
  if (before) params.set("before", before);
  const query = params.toString();
  return query ? `/team/audit?${query}` : "/team/audit";
}
