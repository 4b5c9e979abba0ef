/** How a calibration stands on a day: it still holds on its due date. */
export type DueState = "overdue" | "due-soon" | "in-date" | "undated";

/** Long enough to send a piece of equipment away and have it back; common practice, no source. */
export const DUE_SOON_DAYS = 30;

/** `day` moved by whole days; both ISO dates. */
export function addDays(day: string, days: number): string {
  return new Date(Date.parse(`${day}T00:00:00Z`) + days * 86_400_000).toISOString().slice(0, 10);
}

/** State of a due date (ISO; null: nobody stated one) on a day (ISO). */
export function dueState(dueOn: string | null, day: string): DueState {
  if (dueOn === null) return "undated";
  if (dueOn < day) return "overdue";
  return dueOn <= addDays(day, DUE_SOON_DAYS) ? "due-soon" : "in-date";
}
