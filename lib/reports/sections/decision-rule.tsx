import { Label, Paragraph, SectionTitle } from "../parts/blocks";
import { StandingLabel } from "../parts/standing-label";
import { Table } from "../parts/table";
import type { ReportSnapshot } from "../report-snapshot";
import { stateValue } from "../report-text";

/** How a margin becomes a standing, and what is known of the uncertainty. */
export function DecisionRule({ snapshot }: { snapshot: ReportSnapshot }) {
  const benches = new Map(
    snapshot.sweeps.map(({ bench }) => [`${bench.name} ${bench.guardDb}`, bench]),
  );
  return (
    <>
      <SectionTitle>Decision rule and uncertainty</SectionTitle>
      <Paragraph>
        Margin is limit minus level in dB: a positive margin lies under the mask. The guard is the
        margin that the bench keeps free. Where segments of a mask meet or overlap, the lower limit
        applies.
      </Paragraph>
      <Table
        columns={[
          { title: "Standing", share: 1 },
          { title: "When", share: 4.4, longest: 60 },
        ]}
        rows={[
          [
            <StandingLabel key="s" standing="clear" />,
            "The whole line was swept and its lowest margin is at or above the guard (margin ≥ guard).",
          ],
          [
            <StandingLabel key="s" standing="inside-guard" />,
            "The whole line was swept and its lowest margin is 0 dB or more, but below the guard.",
          ],
          [
            <StandingLabel key="s" standing="over" />,
            "A trace taken with the line’s own detector reads above the line (margin < 0 dB).",
          ],
          [
            <StandingLabel key="s" standing="undecided" />,
            "Part of the line was not swept, or no trace can decide, or only a looser detector reads above it: peak ≥ quasi-peak ≥ RMS-average ≥ average, so it is an upper bound.",
          ],
        ]}
      />
      <Label>Guard and uncertainty of each bench</Label>
      <Table
        columns={[
          { title: "Bench", share: 2, longest: 30 },
          { title: "Guard", share: 1, kind: "number" },
          { title: "Uncertainty", share: 3 },
        ]}
        rows={[...benches.values()].map((bench) => [
          bench.name,
          stateValue(bench.guardDb, "dB"),
          "No uncertainty budget stated for this bench.",
        ])}
      />
    </>
  );
}
