import { describe, expect, test } from "vitest";
import { hashSnapshot } from "@/lib/reports/snapshot-hash";
import type { ReportSnapshot } from "@/lib/reports/report-snapshot";
import { sampleSnapshot } from "../support/report-snapshot";

function reverseKeys(value: unknown): unknown {
  if (Array.isArray(value)) return value.map(reverseKeys);
  if (typeof value !== "object" || value === null) return value;
  return Object.fromEntries(
    Object.entries(value)
      .reverse()
      .map(([key, inner]) => [key, reverseKeys(inner)]),
  );
}

/** Small, so that each of its values can be changed in turn. */
const small = sampleSnapshot({ sweeps: [] });

function changedAt(path: readonly (string | number)[]): ReportSnapshot {
  const copy = structuredClone(small);
  let at = copy as unknown as Record<string | number, unknown>;
  for (const key of path.slice(0, -1)) at = at[key] as Record<string | number, unknown>;
  const last = path.at(-1) ?? "";
  const value = at[last];
  at[last] = typeof value === "number" ? value + 1 : typeof value === "boolean" ? !value : "other";
  return copy;
}

function leaves(value: unknown, path: (string | number)[] = []): (string | number)[][] {
  if (typeof value !== "object" || value === null) return [path];
  return Object.entries(value).flatMap(([key, inner]) => leaves(inner, [...path, key]));
}

describe("hash of a snapshot", () => {
  test("is 64 hexadecimal digits of SHA-256 over sorted keys without white space", () => {
    const tiny = { b: [1, { d: "é", c: null }], a: -0 } as unknown as ReportSnapshot;
    // printf '{"a":0,"b":[1,{"c":null,"d":"é"}]}' | sha256sum
    expect(hashSnapshot(tiny)).toBe(
      "c24971b09d91da9e93137f6bf9661d1abe1d3cf0e73b3be9713a23eb4b3e26fb",
    );
  });

  test("does not depend on the order of keys", () => {
    const whole = sampleSnapshot();
    expect(hashSnapshot(reverseKeys(whole) as ReportSnapshot)).toBe(hashSnapshot(whole));
  });

  test("is the same after the snapshot was stored as JSON", () => {
    const whole = sampleSnapshot();
    const stored = JSON.parse(JSON.stringify(whole)) as ReportSnapshot;
    expect(hashSnapshot(stored)).toBe(hashSnapshot(whole));
  });

  test("changes with any single value", () => {
    const paths = leaves(small).filter((path) => path.length > 0);
    expect(paths.length).toBeGreaterThan(40);
    const hashes = paths.map((path) => hashSnapshot(changedAt(path)));
    expect(hashes.filter((hash) => hash === hashSnapshot(small))).toEqual([]);
  });

  test("changes with the order of a list", () => {
    const whole = sampleSnapshot();
    const swapped = { ...whole, sweeps: [...whole.sweeps].reverse() };
    expect(hashSnapshot(swapped)).not.toBe(hashSnapshot(whole));
  });
});
