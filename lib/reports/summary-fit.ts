/** How much of each part the summary page shows, so that it stays one page. */
export interface SummaryFit {
  chartHeightPt: number;
  /** Mask lines, doubts and ladder steps that are listed; the rest is counted. */
  rows: number;
  doubts: number;
  steps: number;
  /** Longest text, in signs, of the issuer's summary and of one delta's sentence. */
  summaryLength: number;
  sentenceLength: number;
}

const CONTENTS: readonly Omit<SummaryFit, "chartHeightPt">[] = [
  { rows: 6, doubts: 4, steps: 6, summaryLength: 360, sentenceLength: 230 },
  { rows: 6, doubts: 3, steps: 6, summaryLength: 240, sentenceLength: 170 },
  { rows: 5, doubts: 2, steps: 4, summaryLength: 160, sentenceLength: 130 },
  { rows: 3, doubts: 2, steps: 3, summaryLength: 100, sentenceLength: 110 },
];

const CHART_HEIGHTS_PT = [240, 220, 200, 184, 170, 156, 142] as const;
const LOWEST_CHART_PT = 130;
const LAST_RESORT: SummaryFit = {
  chartHeightPt: 104,
  rows: 3,
  doubts: 1,
  steps: 2,
  summaryLength: 80,
  sentenceLength: 90,
};

/** The roomiest summary that stays on one page; the tightest when none does. */
export async function chooseFit(
  staysOnePage: (fit: SummaryFit) => Promise<boolean>,
): Promise<SummaryFit> {
  for (const content of CONTENTS) {
    const lowest = { ...content, chartHeightPt: LOWEST_CHART_PT };
    if (!(await staysOnePage(lowest))) continue;
    for (const chartHeightPt of CHART_HEIGHTS_PT) {
      const fit = { ...content, chartHeightPt };
      if (await staysOnePage(fit)) return fit;
    }
    return lowest;
  }
  return LAST_RESORT;
}
