/** For the audit trail: only what an edit changed, as it was and as it is now. */
export function changedFields<T extends Record<string, unknown>>(
  before: Record<keyof T, unknown>,
  after: T,
): { from: Record<string, unknown>; to: Record<string, unknown> } {
  const keys = Object.keys(after).filter((key) => before[key] !== after[key]);
  return {
    from: Object.fromEntries(keys.map((key) => [key, before[key]])),
    to: Object.fromEntries(keys.map((key) => [key, after[key]])),
  };
}
