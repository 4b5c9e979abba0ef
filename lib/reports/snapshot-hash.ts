import { createHash } from "node:crypto";
import type { ReportSnapshot } from "./report-snapshot";

function sortKeys(value: unknown): unknown {
  if (Array.isArray(value)) return value.map(sortKeys);
  if (typeof value !== "object" || value === null) return value;
  const entries = Object.entries(value).sort(([a], [b]) => (a < b ? -1 : 1));
  return Object.fromEntries(entries.map(([key, inner]) => [key, sortKeys(inner)]));
}

/**
 * SHA-256 (hex) of the snapshot as JSON with its keys sorted and no white space, so that it is the
 * same after the database has stored the snapshot in an order of its own.
 */
export function hashSnapshot(snapshot: ReportSnapshot): string {
  // Through JSON once, so that values it changes (−0, undefined) hash as they will be stored.
  const stored: unknown = JSON.parse(JSON.stringify(snapshot));
  return createHash("sha256")
    .update(JSON.stringify(sortKeys(stored)), "utf8")
    .digest("hex");
}
