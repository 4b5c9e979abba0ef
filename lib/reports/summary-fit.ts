/** How much of each part the summary page shows, so that it stays one page. */
export interface SummaryFit {
  chartHeightPt: number;
  /** Mask lines and ladder steps that are listed; the rest is counted. */
  rows: number;
  /** Doubts that stand by themselves; the rest is named in a row. */
  doubts: number;
  steps: number;
  /** Longest text, in signs, of one doubt, the issuer's summary and one delta's sentence. */
  doubtLength: number;
  /** Whether each suspect names its sweep. */
  suspectSweeps: boolean;
  summaryLength: number;
  sentenceLength: number;
}

const CONTENTS: readonly Omit<SummaryFit, "chartHeightPt">[] = [
  {
    rows: 6,
    doubts: 5,
    doubtLength: 120,
    suspectSweeps: true,
    steps: 6,
    summaryLength: 360,
    sentenceLength: 230,
  },
  {
    rows: 6,
    doubts: 4,
    doubtLength: 80,
    suspectSweeps: true,
    steps: 6,
    summaryLength: 240,
    sentenceLength: 170,
  },
  {
    rows: 5,
    doubts: 5,
    doubtLength: 0,
    suspectSweeps: true,
    steps: 4,
    summaryLength: 160,
    sentenceLength: 130,
  },
  {
    rows: 3,
    doubts: 3,
    doubtLength: 0,
    suspectSweeps: false,
    steps: 3,
    summaryLength: 100,
    sentenceLength: 110,
  },
  {
    rows: 3,
    doubts: 2,
    doubtLength: 0,
    suspectSweeps: false,
    steps: 2,
    summaryLength: 80,
    sentenceLength: 90,
  },
];

const LOWEST_CHART_PT = 130;
const HIGHEST_CHART_PT = 250;
const LAST_RESORT: SummaryFit = {
  chartHeightPt: 104,
  rows: 3,
  doubts: 0,
  doubtLength: 0,
  suspectSweeps: false,
  steps: 1,
  summaryLength: 80,
  sentenceLength: 90,
};

/** The fullest summary that stays on one page, with the highest chart (±4 pt) that leaves. */
export async function chooseFit(
  staysOnePage: (fit: SummaryFit) => Promise<boolean>,
): Promise<SummaryFit> {
  for (const content of CONTENTS) {
    let [low, high] = [LOWEST_CHART_PT, HIGHEST_CHART_PT];
    if (!(await staysOnePage({ ...content, chartHeightPt: low }))) continue;
    while (high - low > 8) {
      const middle = (low + high) / 2;
      if (await staysOnePage({ ...content, chartHeightPt: middle })) low = middle;
      else high = middle;
    }
    return { ...content, chartHeightPt: low };
  }
  return LAST_RESORT;
}
