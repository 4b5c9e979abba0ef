import { describe, expect, it } from "vitest";
import { onDay } from "@/db/seed/demo-day";

describe("the days of the demo", () => {
  it("stay as they are told once the story is over", () => {
    expect(onDay("2026-11-30", new Date("2026-12-01T09:00:00Z"))).toBe("2026-11-30");
    expect(onDay("2027-01-18", new Date("2027-06-01T00:00:00Z"))).toBe("2027-01-18");
  });

  it("move back by whole weeks where the clock stands before them", () => {
    const now = new Date("2026-10-15T12:00:00Z");
    expect(onDay("2026-12-01", now)).toBe("2026-10-13");
    const moved = Date.parse("2026-11-30") - Date.parse(onDay("2026-11-30", now));
    expect(moved % (7 * 86_400_000)).toBe(0);
  });
});
