/** The day it is, as an ISO date in UTC: due dates are days, not moments. */
export function today(): string {
  return new Date().toISOString().slice(0, 10);
}
