import type { BudgetLine, UncertaintyBudget } from "@/lib/core/bench/uncertainty-budget";

const line = (
  name: string,
  value: number,
  distribution: BudgetLine["distribution"],
  observations: number | null = null,
): BudgetLine => ({
  name,
  value,
  distribution,
  sensitivity: 1,
  degreesOfFreedom: null,
  observations,
});

/** Every value is invented; the lines are those that such a budget commonly has. */
export const BUDGET_BELOW_1_GHZ: Omit<UncertaintyBudget, "version"> = {
  title: "Radiated, 30 MHz to 1 GHz, 3 m (demo: every value is invented)",
  lines: [
    line("Receiver, sine-wave level", 1, "normal"),
    line("Receiver, pulse response", 1.5, "rectangular"),
    line("Antenna factor", 1.5, "normal"),
    line("Antenna factor over height and direction", 1, "rectangular"),
    line("Cable loss", 0.4, "normal"),
    line("Mismatch, antenna to receiver", 0.95, "u-shaped"),
    line("Site, semi-open hall", 8, "triangular"),
    line("Distance and table", 0.5, "rectangular"),
    line("Repeatability, ten set-ups", 0.6, "type-a", 10),
  ],
  reference: "oats-sac-30m-1g",
};

export const BUDGET_ABOVE_1_GHZ: Omit<UncertaintyBudget, "version"> = {
  title: "Radiated, 1 to 6 GHz, 3 m (demo: every value is invented)",
  lines: [
    line("Analyzer, sine-wave level", 1.4, "normal"),
    line("Antenna factor", 1.2, "normal"),
    line("Directivity and aim", 1.5, "rectangular"),
    line("Preamplifier gain", 0.8, "normal"),
    line("Cable loss", 0.5, "normal"),
    line("Mismatch, antenna to preamplifier", 1.2, "u-shaped"),
    line("Mismatch, preamplifier to analyzer", 0.9, "u-shaped"),
    line("Site", 3, "triangular"),
    line("Repeatability, six set-ups", 0.7, "type-a", 6),
  ],
  reference: "field-1g-6g",
};
