import { describe, expect, test } from "vitest";
import { describeAction, describeDetail, nameSubject } from "@/components/team/describe-event";
import { exactTime, timeAgo } from "@/components/team/time-ago";

describe("an audit event in words", () => {
  test.each([
    ["program.create", "created program"],
    ["program.set-masks", "set the masks of program"],
    ["ladder.archive", "archived ladder"],
    ["lab-result.add", "added lab result"],
    ["sweep.link-trace", "sweep: link trace"],
    ["import", "import"],
  ])("%s reads %j", (action, text) => {
    expect(describeAction(action)).toBe(text);
  });

  test("tells what changed as it was and as it became", () => {
    const detail = {
      name: "Gannet",
      from: { targetMarginDb: 4, notes: "" },
      to: { targetMarginDb: 6, notes: "x" },
    };
    expect(describeDetail(detail)).toEqual([
      { label: "name", text: "Gannet" },
      { label: "targetMarginDb", text: "4 → 6" },
      { label: "notes", text: "not stated → x" },
    ]);
  });

  test("tells whole lists before and after, and single values", () => {
    expect(describeDetail({ from: [], to: [{ name: "Lab", dueOn: "2027-01-01" }] })).toEqual([
      { label: "before", text: "none" },
      { label: "after", text: "name Lab, dueOn 2027-01-01" },
    ]);
    expect(describeDetail({ from: "engineer", to: "admin" })).toEqual([
      { label: "before", text: "engineer" },
      { label: "after", text: "admin" },
    ]);
    expect(describeDetail({})).toEqual([]);
    expect(describeDetail(null)).toEqual([]);
    expect(describeDetail("odd")).toEqual([{ label: "detail", text: "odd" }]);
  });

  test("names the subject as it is called today, else as it was written down, else by its id", () => {
    const event = { subjectName: null, subjectId: "0123456789ab", detail: {} };
    expect(nameSubject({ ...event, subjectName: "Tern", detail: { name: "old" } })).toBe("Tern");
    expect(nameSubject({ ...event, detail: { title: "Bench note" } })).toBe("Bench note");
    expect(nameSubject(event)).toBe("01234567");
  });
});

describe("the time of an event", () => {
  const now = new Date("2026-12-01T12:00:00Z");
  test.each([
    ["2026-12-01T11:59:30Z", "just now"],
    ["2026-12-01T12:00:05Z", "just now"],
    ["2026-12-01T11:58:59Z", "1 minute ago"],
    ["2026-12-01T09:01:00Z", "2 hours ago"],
    ["2026-11-30T12:00:00Z", "yesterday"],
    ["2026-11-10T12:00:00Z", "21 days ago"],
    ["2025-10-01T12:00:00Z", "last year"],
  ])("%s reads %j at noon of the first of December", (at, text) => {
    expect(timeAgo(new Date(at), now)).toBe(text);
  });

  test("is exact to the second in UTC", () => {
    expect(exactTime(new Date("2026-03-31T14:05:09.876Z"))).toBe("2026-03-31 14:05:09 UTC");
  });
});
