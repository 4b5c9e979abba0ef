import { renderToStaticMarkup } from "react-dom/server";
import { describe, expect, test } from "vitest";
import { readSuspectFilter } from "@/app/(team)/suspects/search-params";
import { joinSuspects } from "@/components/suspects/filter-suspects";
import { describeNoteChange } from "@/components/suspects/note-words";
import { SightingsTable } from "@/components/suspects/sightings-table";
import { SuspectHeadline } from "@/components/suspects/suspect-headline";
import { SuspectTableFilterBar } from "@/components/suspects/suspect-table-filter";
import { SuspectTable } from "@/components/sweeps/suspect-table";
import { describeAction } from "@/components/team/describe-event";

const BEST = {
  sweepId: "s",
  sweepName: "G2 vertical",
  maskId: "m",
  maskTitle: "Loft limit",
  lineName: "Peak",
  frequencyHz: 110e6,
  levelDb: 52,
  unit: "dBuV/m" as const,
  marginDb: -2,
  standing: "over" as const,
  basis: "like-for-like" as const,
  detector: "peak" as const,
};
const build = (buildName: string, kind: "seen" | "not-seen" | "not-swept") => ({
  buildId: buildName,
  buildName,
  kind,
  best: kind === "seen" ? BEST : null,
  sightings: kind === "seen" ? [BEST] : [],
  sweptBy: kind === "not-swept" ? [] : [{ sweepId: "s", sweepName: "long sweep" }],
});
const text = (html: string) => html.replace(/<[^>]+>/g, " ").replace(/\s+/g, " ");

describe("the headline of a suspect", () => {
  const tell = (
    builds: ReturnType<typeof build>[],
    newest: number | null,
    change: Parameters<typeof SuspectHeadline>[0]["change"] = null,
  ) =>
    text(
      renderToStaticMarkup(
        <SuspectHeadline
          newest={newest === null ? null : (builds[newest] ?? null)}
          builds={builds}
          change={change}
        />,
      ),
    );

  test("gives the margin now, and the builds that nobody swept since", () => {
    const told = tell([build("G1", "seen"), build("G2", "not-swept")], 0);
    expect(told).toContain("\u22122.0 dB over G1, Peak line of Loft limit, at 52.0 dBµV/m.");
    expect(told).toContain("Not swept there since: G2.");
    expect(told).toContain("Seen in one build so far.");
  });

  test("says not seen, with the last build that saw it", () => {
    const told = tell([build("G1", "seen"), build("G2", "not-seen")], 1);
    expect(told).toContain("not seen In G2 it was swept");
    expect(told).toContain("Last seen in G1 at \u22122.0 dB");
  });

  test("says so when nothing on record tells", () => {
    expect(tell([build("G1", "not-swept")], null)).toContain("No sweep on the line of record");
    expect(tell([build("G1", "not-seen")], 0)).toContain("nor in any build");
  });

  test("gives the change with its cautions, or the reason why there is none", () => {
    const both = [build("G1", "seen"), build("G2", "seen")];
    const from = { fromBuild: "G1", toBuild: "G2" };
    const moved = { ...from, marginDb: 8, levelDb: -8, reasons: [], cautions: ["A caution."] };
    const told = tell(both, 1, moved);
    expect(told).toContain("Since G1 the margin moved +8.0 dB and the level \u22128.0 dB");
    expect(told).toContain("A caution.");
    const unlike = { ...from, marginDb: null, levelDb: null, reasons: ["RBW"], cautions: [] };
    expect(tell(both, 1, unlike)).toContain("not the same measurement: RBW.");
  });
});

describe("sightings", () => {
  test("tell the newest first, with a word for not seen and not swept", () => {
    const builds = [build("G1", "seen"), build("G2", "not-seen"), build("G3", "not-swept")];
    const told = text(renderToStaticMarkup(<SightingsTable builds={builds} programId="p" />));
    expect(told).toMatch(/G3 Not swept.*G2 Not seen in long sweep.*G1 G2 vertical 110\.0 MHz/);
    expect(told).toContain("like for like, peak");
  });
});

describe("notes in words", () => {
  test.each([
    [{ state: { from: null, to: "open" } }, "began to follow it"],
    [{ state: { from: "open", to: "treated" } }, "moved it from open to treated"],
    [{ owner: { from: null, to: "Ada" } }, "gave it to Ada"],
    [{ owner: { from: "Ada", to: null } }, "took it from Ada"],
    [{ source: { from: null, to: "panel" } }, "wrote the likely source “panel”"],
    [
      { toleranceHz: { from: "240000", to: "300000" } },
      "set the tolerance to 300.0 kHz, before that 240.0 kHz",
    ],
  ])("%j", (change, words) => {
    expect(describeNoteChange(change)).toEqual([words]);
  });

  test("no change, no words; audit words for every act", () => {
    expect(describeNoteChange(null)).toEqual([]);
    for (const act of ["follow", "edit", "assign", "set-state", "add-note"]) {
      expect(describeAction(`suspect.${act}`)).not.toContain(":");
    }
  });
});

describe("the filter in the address", () => {
  test("takes what it understands and says at the field what it does not", () => {
    const { filter, errors } = readSuspectFilter({
      program: "p",
      state: "open",
      owner: "nobody",
      from: "30 MHz",
      to: "300",
    });
    expect(filter).toEqual({ state: "open", owner: "nobody", fromHz: 30e6, toHz: null });
    expect(errors.to).toContain("with its unit");
    expect(readSuspectFilter({ state: "gone", from: ["1", "2"] }).filter).toEqual({
      state: null,
      owner: null,
      fromHz: null,
      toHz: null,
    });
  });
});

describe("the table of a sweep", () => {
  const suspect = { ...BEST, number: 3, sampleHz: 110e6, limitDb: 50, prominenceDb: 9 };
  const all = joinSuspects(
    [{ ...suspect, traceIndex: 0, partIndex: 0 }],
    [{ number: 3, ambientDb: 51, isLikelyAmbient: true, withoutAmbientDb: 45.1 }],
  );
  const table = (change: Partial<Parameters<typeof SuspectTable>[0]> = {}) =>
    renderToStaticMarkup(
      <SuspectTable
        all={all}
        shown={all}
        filter={{ text: "", hidesAmbient: false }}
        onFilter={() => undefined}
        stepHz={60e3}
        unit="dBuV/m"
        exportName="x"
        highlighted={null}
        onHighlight={() => undefined}
        hasAmbient={false}
        hasFollowed={false}
        {...change}
      />,
    );

  test("says likely ambient in words and calls the rest an estimate", () => {
    const told = text(table({ hasAmbient: true }));
    expect(told).toContain("likely ambient");
    expect(told).toContain("Without ambient (estimate), dBµV/m");
    expect(told).toContain("45.1");
    expect(told).toContain("changes no margin");
    expect(text(table())).not.toContain("Without ambient");
  });

  test("offers to follow only to whom may", () => {
    const follow = () => Promise.resolve({ ok: true as const });
    expect(table({ hasFollowed: true, follow, followNear: follow })).toContain("Follow suspect 3");
    const read = text(table({ hasFollowed: true }));
    expect(read).toContain("not followed");
    expect(read).not.toContain("Follow all");
  });

  test("counts what it hides, with the lowest margin among it", () => {
    const told = text(
      renderToStaticMarkup(
        <SuspectTableFilterBar
          filter={{ text: "", hidesAmbient: true }}
          onFilter={() => undefined}
          all={all}
          shown={[]}
        />,
      ),
    );
    expect(told).toContain(
      "0 of 1 shown. Hidden as likely ambient: 1, the lowest at \u22122.0 dB.",
    );
  });
});
