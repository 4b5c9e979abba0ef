import { readNumber } from "@/components/ui/read-number";
import { validateMask } from "@/lib/core/mask/validate-mask";
import type { MaskDraft, SegmentDraft } from "./mask-draft";
import { maskOfDraft, readCellFrequency } from "./mask-draft";

/** `blank` problems are only said once somebody tried to save: nobody has typed there yet. */
export interface DraftProblem {
  path: string;
  text: string;
  blank: boolean;
}

function cellProblems(segment: SegmentDraft, at: string, unit: string): DraftProblem[] {
  const problems: DraftProblem[] = [];
  for (const [key, path, name] of [
    ["start", "startHz", "start"],
    ["stop", "stopHz", "end"],
  ] as const) {
    const text = segment[key];
    if (text.trim() === "")
      problems.push({ path: `${at}.${path}`, text: `Give the ${name} frequency.`, blank: true });
    else if (Number.isNaN(readCellFrequency(text, unit)))
      problems.push({
        path: `${at}.${path}`,
        text: `"${text}" is no frequency: write it as "30 MHz", without a comma between thousands.`,
        blank: false,
      });
  }
  for (const [key, name] of [
    ["startDb", "start"],
    ["stopDb", "end"],
  ] as const) {
    const text = segment[key];
    if (text.trim() === "")
      problems.push({ path: `${at}.${key}`, text: `Give the limit at the ${name}.`, blank: true });
    else if (!Number.isFinite(readNumber(text)))
      problems.push({ path: `${at}.${key}`, text: `"${text}" is no level in dB.`, blank: false });
  }
  return problems;
}

function openChoices(draft: MaskDraft): DraftProblem[] {
  const open: [string, boolean, string][] = [
    ["title", draft.title.trim() === "", "Give it a title."],
    ["port", draft.port === "", "Choose what the limit is for."],
    ["unit", draft.unit === "", "Choose the unit of the limit."],
    ...draft.lines.map((line, i): [string, boolean, string] => [
      `lines.${i}.detector`,
      line.detector === "",
      "Choose the line's detector.",
    ]),
  ];
  return open.flatMap(([path, isOpen, text]) => (isOpen ? [{ path, text, blank: true }] : []));
}

/** Everything that keeps the draft from being saved, each at its field or its row. */
export function draftProblems(draft: MaskDraft): DraftProblem[] {
  const cells = draft.lines.flatMap((line, i) =>
    line.segments.flatMap((segment, k) =>
      cellProblems(segment, `lines.${i}.segments.${k}`, draft.frequencyUnit),
    ),
  );
  // A row with a cell that cannot be read has said so already.
  const unread = new Set(cells.map(({ path }) => path.replace(/\.\w+$/, "")));
  const rules = validateMask(maskOfDraft(draft, { unit: "dBuV/m", port: "other" }))
    .filter(({ path }) => !unread.has(path))
    .map(({ path, text }) => ({
      path,
      text,
      blank: /^lines\.\d+\.name$/.test(path) && /^Name/.test(text),
    }));
  return [...openChoices(draft), ...cells, ...rules];
}

/** The first problem said at a path. */
export function problemAt(problems: readonly DraftProblem[], path: string): string | undefined {
  return problems.find((problem) => problem.path === path)?.text;
}

/** All problems of one row, in the order of its cells. */
export function problemsOfRow(problems: readonly DraftProblem[], row: string): DraftProblem[] {
  return problems.filter(({ path }) => path === row || path.startsWith(`${row}.`));
}
