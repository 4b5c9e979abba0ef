import { expect, test } from "vitest";
import type { Standing } from "@/lib/core/reading/reading";
import { worstOf } from "@/lib/queries/sweep/worst-of";

const reading = (standing: Standing, marginDb: number | null) => ({ standing, marginDb });

test.each<[string, [Standing, number | null][], [Standing, number | null] | null]>([
  ["nothing", [], null],
  [
    "the lower of two that are clear",
    [
      ["clear", 7],
      ["clear", 3],
    ],
    ["clear", 3],
  ],
  [
    "inside guard before clear",
    [
      ["clear", 7],
      ["inside-guard", 1],
    ],
    ["inside-guard", 1],
  ],
  [
    "a narrow sweep does not hide a lower margin",
    [
      ["undecided", 10],
      ["clear", 3],
    ],
    ["undecided", 3],
  ],
  [
    "a bound over the limit is undecided",
    [
      ["undecided", -5],
      ["clear", 3],
    ],
    ["undecided", -5],
  ],
  [
    "over counts by what is over",
    [
      ["over", -1],
      ["undecided", -8],
    ],
    ["over", -1],
  ],
  [
    "the furthest over of all",
    [
      ["over", -1],
      ["over", -4],
      ["clear", 9],
    ],
    ["over", -4],
  ],
  [
    "one without a margin lends its standing",
    [
      ["undecided", null],
      ["clear", 3],
    ],
    ["undecided", 3],
  ],
  ["no margin at all", [["undecided", null]], ["undecided", null]],
])("%s", (_what, given, expected) => {
  const worst = worstOf(given.map(([standing, marginDb]) => reading(standing, marginDb)));
  expect(worst).toEqual(expected && reading(...expected));
});
