const SHOWN_PROBLEMS = 5;

/** What is wrong with a factor table, line by line, short enough to stand at its field. */
export function tableMessage(problems: readonly { line: number; text: string }[]): string {
  const shown = problems
    .slice(0, SHOWN_PROBLEMS)
    .map(({ line, text }) => (/^Line \d/.test(text) ? text : `Line ${line}: ${text}`));
  const more = problems.length - shown.length;
  return [...shown, ...(more > 0 ? [`And ${more} more.`] : [])].join(" ");
}
