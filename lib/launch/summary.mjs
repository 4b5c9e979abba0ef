import { addCounts, closingLine } from "./counts.mjs";

/** Prints a line per step and the closing line; resolves to the exit status. */
export function summarize(outcomes) {
  console.log("");
  for (const { name, counts } of outcomes) {
    console.log(`${counts.failed ? "FAILED " : "ok     "} ${name}: ${closingLine(counts)}`);
  }
  const sum = addCounts(outcomes.map((outcome) => outcome.counts));
  console.log(closingLine(sum));
  return sum.failed === 0 && sum.passed > 0 ? 0 : 1;
}
