import AxeBuilder from "@axe-core/playwright";
import type { Page } from "@playwright/test";
import { expect } from "@playwright/test";

/** No serious violation of WCAG 2.2 AA on the page as it stands. */
export async function expectAccessible(page: Page): Promise<void> {
  await expectNothingSerious(new AxeBuilder({ page }));
}

/** Enough contrast on the page: all that changes between the day and the night chart. */
export async function expectContrast(page: Page): Promise<void> {
  await expectNothingSerious(new AxeBuilder({ page }).withRules(["color-contrast"]));
}

async function expectNothingSerious(builder: AxeBuilder): Promise<void> {
  // The rows of a long table are alike: its first dozen stands for the hundreds that may follow.
  const { violations } = await builder.exclude("tbody tr:nth-child(n+13)").analyze();
  const serious = violations.filter((v) => v.impact === "serious" || v.impact === "critical");
  expect(serious.map((v) => `${v.id}: ${v.nodes.map((n) => n.html).join(" ")}`)).toEqual([]);
}
