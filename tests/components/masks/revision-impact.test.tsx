import { QueryClient, QueryClientProvider } from "@tanstack/react-query";
import type { ComponentProps } from "react";
import { renderToStaticMarkup } from "react-dom/server";
import { describe, expect, test, vi } from "vitest";
import { RecomputationProgress } from "@/components/masks/recomputation-progress";
import { RevisionImpact } from "@/components/masks/revision-impact";
import type { Impact } from "@/components/masks/revision-impact-words";
import { describeRest, describeStandings } from "@/components/masks/revision-impact-words";

vi.mock("next/navigation", () => ({ useRouter: () => ({ push: vi.fn(), refresh: vi.fn() }) }));

const NONE: Impact["summary"] = {
  standings: 0,
  onRecord: 0,
  becomeOver: 0,
  becomeUndecided: 0,
  becomeUnheld: 0,
  becomeHeld: 0,
  largestChangeDb: null,
};

const CHANGED: Impact["changed"][number] = {
  sweepId: "s1",
  name: "Gannet B3, vertical",
  programName: "Gannet",
  buildName: "B3",
  onRecord: true,
  before: { standing: "clear", marginDb: 4.7 },
  after: { standing: "over", marginDb: -1.3 },
  changeDb: -6,
};

function impactOf(summary: Partial<Impact["summary"]>, change: Partial<Impact> = {}): Impact {
  return {
    revision: 4,
    inForceRevision: 3,
    looked: 26,
    more: 0,
    summary: { ...NONE, ...summary },
    changed: [CHANGED],
    ...change,
  };
}

describe("what a revision changes, in words", () => {
  test("counts the sweeps whose standing changes and says into what", () => {
    expect(describeStandings(impactOf({ standings: 3, becomeOver: 1 }))).toBe(
      "3 of 26 sweeps change their standing; 1 becomes over.",
    );
    expect(describeStandings(impactOf({ standings: 1, becomeUndecided: 1 }, { looked: 1 }))).toBe(
      "1 of 1 sweep changes its standing; 1 becomes undecided.",
    );
    const many = {
      standings: 9,
      becomeOver: 2,
      becomeUndecided: 3,
      becomeUnheld: 2,
      becomeHeld: 1,
    };
    expect(describeStandings(impactOf(many))).toBe(
      "9 of 26 sweeps change their standing; 2 become over, 3 become undecided, 2 are no longer reached, 1 is newly reached.",
    );
  });

  test("tells no change of standing from no change at all", () => {
    expect(describeStandings(impactOf({ largestChangeDb: -1 }))).toBe(
      "None of 26 sweeps changes its standing.",
    );
    expect(describeStandings(impactOf({}, { changed: [] }))).toBe(
      "None of 26 sweeps changes its standing and none its margin.",
    );
  });

  test("names the line of record, the largest change, what was left out and what is compared", () => {
    const impact = impactOf(
      { standings: 2, onRecord: 1, largestChangeDb: -6 },
      { more: 40, inForceRevision: 2 },
    );
    expect(describeRest(impact)).toEqual([
      "1 of them is on the line of record.",
      "The largest change of margin is \u22126.0 dB.",
      "Only the newest sweeps were looked at; 40 sweeps more are read once the revision is saved.",
      "Compared with revision 2, which is in force; revision 4 would take the place of revision 3, whose sweeps are still being read.",
    ]);
    expect(describeRest(impactOf({}))).toEqual([]);
  });
});

describe("the dialog before a revision is saved", () => {
  const render = (impact: Impact) =>
    renderToStaticMarkup(
      <RevisionImpact
        impact={impact}
        save={() => Promise.resolve({ ok: true as const })}
        onKeep={() => undefined}
      />,
    );

  test("shows each sweep that changes as it stands now and then, and both ways out", () => {
    const html = render(impactOf({ standings: 1, onRecord: 1, becomeOver: 1 }));
    for (const text of ["Gannet B3, vertical", "+4.7 dB", "\u22121.3 dB", "\u22126.0 dB"]) {
      expect(html).toContain(text);
    }
    expect(html).toContain("on the line of record");
    expect(html).toContain("Save revision 4");
    expect(html).toContain("Keep editing");
  });

  test("says of a sweep that is not held against the mask that it is not reached", () => {
    const html = render(
      impactOf(
        { standings: 1, becomeUnheld: 1 },
        { changed: [{ ...CHANGED, after: null, changeDb: null }] },
      ),
    );
    expect(html).toContain("not reached");
  });
});

type ProgressState = ComponentProps<typeof RecomputationProgress>["initial"];

describe("the progress of a revision", () => {
  const state: ProgressState = {
    revision: 4,
    isInForce: false,
    total: 26,
    done: 12,
    problem: null,
  };
  const render = (change: Partial<ProgressState>, mayTry = true) =>
    renderToStaticMarkup(
      <QueryClientProvider client={new QueryClient()}>
        <RecomputationProgress
          maskId="m"
          initial={{ ...state, ...change }}
          inForceRevision={3}
          tryAgain={mayTry ? () => Promise.resolve({ ok: true as const }) : undefined}
        />
      </QueryClientProvider>,
    );

  test("says how many sweeps are read and which revision counts meanwhile", () => {
    const html = render({});
    expect(html.replaceAll(/<[^>]+>/g, "")).toContain("12 of 26 sweeps read.");
    expect(html).toContain("Revision 4 is being put in force.");
    expect(html).toContain("revision 3 counts everywhere");
    expect(html).toMatch(/<progress[^>]*max="26"[^>]*value="12"/);
    expect(html).not.toContain("Try again");
  });

  test("shows what went wrong, and offers another try to those who may", () => {
    const problem = 'The sweep "Tern" could not be read; the log of the worker says why.';
    expect(render({ problem })).toContain("Try again");
    expect(render({ problem }, false)).toContain("could not be read");
    expect(render({ problem }, false)).not.toContain("Try again");
  });

  test("is silent about a mask whose newest revision is in force", () => {
    expect(render({ isInForce: true, done: 26 }).replaceAll(/<[^>]+>/g, "")).toBe("");
  });
});
