import type { FactorPoint } from "@/lib/core/bench/signal-path";
import { formatFrequency } from "@/lib/core/units/format";

/** What a factor table covers; outside it nothing is assumed. */
export function factorSpan(factors: readonly FactorPoint[]): string {
  const first = factors[0];
  const last = factors.at(-1);
  if (!first || !last) return "nothing";
  return `${formatFrequency(first.frequencyHz)} to ${formatFrequency(last.frequencyHz)}`;
}
