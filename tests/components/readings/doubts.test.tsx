import { renderToStaticMarkup } from "react-dom/server";
import { describe, expect, test } from "vitest";
import { countDoubts, filterByDoubt } from "@/components/builds/doubt-counts";
import { DoubtFilter } from "@/components/builds/doubt-filter";
import { DOUBT_LABELS } from "@/components/readings/doubt-labels";
import { DoubtList } from "@/components/readings/doubt-list";
import type { Doubt, DoubtCode } from "@/lib/core/reading/reading";

const doubt = (code: DoubtCode, valueDb: number | null = null): Doubt => ({
  code,
  text: `The sentence of ${code}.`,
  valueDb,
});

describe("DoubtList", () => {
  test("parts what weakens a reading from what could not be checked", () => {
    const html = renderToStaticMarkup(
      <DoubtList
        doubts={[doubt("rbw-unstated"), doubt("step-coarse", 12.04), doubt("overload-unchecked")]}
      />,
    );
    const [weakening, unchecked] = html.split("What could not be checked");
    expect(weakening).toContain("What weakens the reading");
    expect(weakening).toContain("Step too coarse");
    expect(weakening).toContain("12.0 dB");
    expect(weakening).toContain("The sentence of step-coarse.");
    expect(weakening).not.toContain("RBW not stated");
    expect(unchecked).toContain("RBW not stated");
    expect(unchecked).toContain("Overload not checked");
    expect(unchecked).not.toContain(" dB<");
  });

  test("leaves an empty group out and says when there is no doubt", () => {
    const html = renderToStaticMarkup(<DoubtList doubts={[doubt("near-field")]} />);
    expect(html).not.toContain("What could not be checked");
    expect(renderToStaticMarkup(<DoubtList doubts={[]} />)).toContain("None that Neap can see");
  });
});

describe("the filter by doubt", () => {
  const sweeps: { name: string; doubts: DoubtCode[] }[] = [
    { name: "Both", doubts: ["step-coarse", "ambient-near"] },
    { name: "One", doubts: ["ambient-near"] },
    { name: "None", doubts: [] },
  ];

  test("counts sweeps and keeps those that have the doubt", () => {
    expect(countDoubts(sweeps)).toEqual([
      { code: "step-coarse", sweeps: 1 },
      { code: "ambient-near", sweeps: 2 },
    ]);
    const names = (code: DoubtCode | null) => filterByDoubt(sweeps, code).map((s) => s.name);
    expect(names("ambient-near")).toEqual(["Both", "One"]);
    expect(names("near-field")).toEqual([]);
    expect(names(null)).toEqual(["Both", "One", "None"]);
  });

  test("links to each doubt that there is, marks the chosen one, and is left out without any", () => {
    const show = (own: typeof sweeps, chosen: DoubtCode | null) =>
      renderToStaticMarkup(
        <DoubtFilter href="/here" counts={countDoubts(own)} chosen={chosen} total={own.length} />,
      );
    const html = show(sweeps, "ambient-near");
    expect(html).toContain('href="/here?doubt=step-coarse"');
    expect(html).toMatch(/aria-current="true"[^>]*href="\/here\?doubt=ambient-near"/);
    expect(html).toContain(DOUBT_LABELS["ambient-near"]);
    expect(show(sweeps.slice(2), null)).toBe("");
    // A filter that matches nothing can still be taken off.
    expect(show(sweeps.slice(2), "near-field")).toContain('href="/here"');
  });
});
