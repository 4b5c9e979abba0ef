import { renderToStaticMarkup } from "react-dom/server";
import { describe, expect, test } from "vitest";
import type { LibraryMask } from "@/components/masks/filter-masks";
import { filterMasks, groupByPort } from "@/components/masks/filter-masks";
import { draftMask } from "@/components/masks/mask-draft";
import { MaskLibrary } from "@/components/masks/mask-library";
import { MaskLineFields } from "@/components/masks/mask-line-fields";
import { MaskLines } from "@/components/masks/mask-lines";
import { draftProblems } from "@/components/masks/mask-problems";
import { masksHref, readMaskFilter } from "@/app/(team)/masks/search-params";
import { CROSSING, MASK } from "../../commands/mask/arrange";

const mask = (change: Partial<LibraryMask>): LibraryMask => ({
  id: change.key ?? "id",
  key: "wheelhouse",
  title: "Wheelhouse limit",
  port: "radiated",
  document: "House rule 7",
  clause: "2",
  edition: "",
  provenance: "team",
  distanceM: 3,
  detectors: ["quasi-peak"],
  revision: 1,
  origin: "team",
  archived: false,
  confirmation: null,
  pendingRevision: null,
  ...change,
});
const NONE = { port: null, text: "", provenance: null, archived: false };

describe("the library", () => {
  const masks = [
    mask({ key: "a" }),
    mask({ key: "b", port: "mains", provenance: "from memory", title: "Shore supply limit" }),
    mask({ key: "c", archived: true }),
  ];

  test("finds every word anywhere in a mask, and hides what is archived until asked", () => {
    const keys = (filter: Partial<typeof NONE>) =>
      filterMasks(masks, { ...NONE, ...filter }).map((m) => m.key);
    expect(keys({})).toEqual(["a", "b"]);
    expect(keys({ text: "LIMIT rule" })).toEqual(["a", "b"]);
    expect(keys({ text: "shore quasi" })).toEqual(["b"]);
    expect(keys({ text: "nothing like it" })).toEqual([]);
    expect(filterMasks(masks, { ...NONE, port: "mains" }).map((m) => m.key)).toEqual(["b"]);
    expect(filterMasks(masks, { ...NONE, archived: true })).toHaveLength(3);
    expect(groupByPort(masks).map((group) => group.port)).toEqual(["radiated", "mains"]);
  });

  test("keeps its filter in the address, and takes nothing from there that it does not know", () => {
    const filter = {
      port: "mains",
      text: "a b",
      provenance: "from memory",
      archived: true,
    } as const;
    const params = Object.fromEntries(new URL(masksHref(filter), "http://neap").searchParams);
    expect(readMaskFilter(params)).toEqual(filter);
    expect(readMaskFilter({ port: "sea", text: ["x"], provenance: "hearsay" })).toEqual(NONE);
    expect(masksHref(NONE)).toBe("/masks");
  });

  test("says from memory in words and in the shoal tint, and only where it is so", () => {
    const html = renderToStaticMarkup(<MaskLibrary masks={masks.slice(1, 2)} />);
    expect(html).toMatch(/text-shoal[^>]*>from memory, not confirmed</);
    expect(html).toMatch(/<td[^>]*>not stated</);
    expect(renderToStaticMarkup(<MaskLibrary masks={masks.slice(0, 1)} />)).not.toContain("shoal");
  });
});

test("the library says who confirmed a mask, against what, and what is being put in force", () => {
  const html = renderToStaticMarkup(
    <MaskLibrary
      masks={[
        mask({
          confirmation: { by: "Ida Rask", at: new Date("2026-11-30T22:00:00Z"), copy: "Copy 4711" },
          pendingRevision: 3,
        }),
      ]}
    />,
  );
  expect(html).toContain("Confirmed by Ida Rask on 2026-11-30 against: Copy 4711");
  expect(html).toContain("confirmed by Ida Rask, 2026-11-30");
  expect(html).toContain("revision 3 is being put in force");
  expect(html).not.toContain("shoal");
});

test("a mask's lines show every digit of a band's edge", () => {
  const line = {
    ...MASK.lines[0]!,
    segments: [{ ...MASK.lines[0]!.segments[0]!, stopHz: 148_351_648 }],
  };
  const html = renderToStaticMarkup(<MaskLines mask={{ ...MASK, lines: [line] }} />);
  expect(html).toContain("148.351648 MHz");
  expect(html).toContain("40.0");
});

test("every cell of the editor's table is labelled, and a crossing row says so where it is", () => {
  let id = 0;
  const draft = draftMask(CROSSING, () => (id += 1));
  const nothing = () => undefined;
  const html = renderToStaticMarkup(
    <MaskLineFields
      line={draft.lines[0]!}
      place={0}
      frequencyUnit="MHz"
      unit="dBuV/m"
      problems={draftProblems(draft)}
      changes={{
        patch: nothing,
        patchSegment: nothing,
        addSegment: nothing,
        duplicateSegment: nothing,
        removeSegment: nothing,
        insertSegments: nothing,
        remove: nothing,
      }}
    />,
  );
  const cells = html.match(/<input[^>]*name="lines\.0\.segments\.[^>]*>/g) ?? [];
  expect(cells).toHaveLength(8);
  for (const cell of cells) expect(cell).toMatch(/aria-label="[^"]+ of Quasi-peak"/);
  const marked = cells.filter((cell) => cell.includes('aria-invalid="true"'));
  expect(marked).toHaveLength(4);
  const describedBy = /aria-describedby="([^"]+)"/.exec(marked[0] ?? "")?.[1];
  expect(describedBy).toBeTruthy();
  expect(html).toMatch(new RegExp(`id="${describedBy}"[^>]*>This segment crosses segment 1`));
});
