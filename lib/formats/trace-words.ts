import type { Detector, Hold } from "@/lib/core/sweep/settings";

const DETECTOR_WORDS: [Detector, RegExp][] = [
  ["quasi-peak", /^(?:cispr)?(?:quasipeak|quasipk|qpeak|qpk|qp|quasispitze)(?:value)?$/],
  ["negative-peak", /^(?:(?:neg|negative|min|minimum)(?:peak|pk)|minpeakdetector)$/],
  [
    "peak",
    /^(?:cispr|auto)?(?:pos|posi|positive|max|maximum)?(?:peak|pk|pkpeak|peakmax|spitze)(?:max|value)?$/,
  ],
  ["rms-average", /^(?:cispr)?(?:rms(?:average|avg|av)|crms)|^cisprrms$/],
  ["average", /^(?:cispr|c|emi|lin|linear)?(?:average|avg|av|mittelwert)(?:value)?$/],
  ["sample", /^(?:sample|smpl|samp)$/],
];

/** Words that point to a detector without naming it for certain. */
const DETECTOR_HINTS: [Detector, RegExp][] = [
  ["rms-average", /rms/],
  ["average", /(?:log|video|vid|power|pwr|volt).*(?:av|avg|average)|^(?:mean|average.*)$/],
  ["peak", /autopeak|peak|normal|rosenfell/],
];

function squeeze(text: string): string {
  return text.toLowerCase().replace(/[^\p{L}\p{N}]/gu, "");
}

export interface DetectorFinding {
  detector: Detector | null;
  guess: Detector | null;
}

/** Detector named by a header's value; "auto peak" and plain "RMS" are only hints. */
export function detectorOf(text: string): DetectorFinding {
  const word = squeeze(text).replace(/detector$/, "");
  const isAuto = /^auto/.test(word);
  const found = DETECTOR_WORDS.find(([, pattern]) => pattern.test(word))?.[0] ?? null;
  if (found !== null && !isAuto) return { detector: found, guess: found };
  return {
    detector: null,
    guess: DETECTOR_HINTS.find(([, pattern]) => pattern.test(word))?.[0] ?? null,
  };
}

/** Detector in the name of a column, as in "Trace 1 QP" or "Level (peak)". */
export function detectorInName(name: string): DetectorFinding {
  const words = name.split(/[\s_()[\],:;/]+/).filter((word) => word !== "");
  let hint: DetectorFinding = { detector: null, guess: null };
  for (let size = 3; size >= 1; size -= 1)
    for (let i = 0; i + size <= words.length; i += 1) {
      const text = words.slice(i, i + size).join("");
      const finding = detectorOf(text);
      if (finding.detector !== null) return finding;
      if (hint.guess === null && finding.guess !== null && size === 1) hint = finding;
    }
  return hint;
}

/** Hold named by a header's value or a column's name; null when it says nothing about it. */
export function holdOf(text: string): Hold | null {
  const word = squeeze(text);
  if (/max(?:imum)?hold|holdmax|^maxh$/.test(word)) return "max-hold";
  if (/min(?:imum)?hold|holdmin|^minh$/.test(word)) return "min-hold";
  if (/^(?:trace)?(?:average|avg|averaging|poweraverage)$/.test(word)) return "average";
  if (/clear?\/?w|clrw|clearwrite|^(?:write|live|off|none|normal|actual)$/.test(word))
    return "none";
  return null;
}

/** Numbers in a table that are no levels: left out, and said so. */
export function isOtherQuantity(name: string): boolean {
  return /limit|margin|mask|delta|phase|angle|azimuth|height|factor|correct|transducer|antenna|cable|\btime\b|count|channel|index|number|point|\bno\b|\bnr\b|#|\brbw\b|bandwidth|distance|turntable|latitude|longitude|uncertain/i.test(
    name,
  );
}
