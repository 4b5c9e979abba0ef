import { Paragraph, SectionTitle } from "../parts/blocks";
import { StandingLabel } from "../parts/standing-label";
import { Table } from "../parts/table";
import type { ReportContent } from "../report-content";
import { Uncertainty } from "./uncertainty";

/** How a margin becomes a standing, and what is known of the uncertainty. */
export function DecisionRule({ snapshot }: { snapshot: ReportContent }) {
  return (
    <>
      <SectionTitle>Decision rule and uncertainty</SectionTitle>
      <Paragraph>
        Margin is limit minus level in dB: a positive margin lies under the mask. The guard is the
        margin that the bench keeps free for its uncertainty. Where segments of a mask meet or
        overlap, the lower limit applies.
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
      <Uncertainty content={snapshot} />
    </>
  );
}
