import type { Locator, Page } from "@playwright/test";
import { expect, test } from "@playwright/test";
import { signIn } from "./sign-in";

const MOST_BYTES = 60_000;

/** Opens the last sweep on the record of the demo's G3 and gives its chart, drawn. */
async function openChart(page: Page): Promise<Locator> {
  await signIn(page, "engineer@saltmarsh.example");
  await page.getByRole("link", { name: "Gannet", exact: true }).click();
  await page.getByRole("cell", { name: "G3" }).getByRole("link").click();
  await page.getByRole("link", { name: "see the worst one" }).click();
  await expect(page.getByRole("region", { name: "Suspects" }).last()).toBeVisible();
  return drawn(page);
}

async function drawn(page: Page): Promise<Locator> {
  const chart = page.getByRole("group", { name: /Plus and minus zoom/ });
  await expect(chart.locator('path[stroke="var(--deep)"]').first()).toBeAttached();
  return chart;
}

/** What the address says is in view, in Hz; null when it says nothing. */
function viewOf(page: Page): { from: number; to: number } | null {
  const params = new URL(page.url()).searchParams;
  const [from, to] = [params.get("from"), params.get("to")];
  return from === null || to === null ? null : { from: Number(from), to: Number(to) };
}

/** Addresses of all parts of traces that the page asks for from now on. */
function watchTraces(page: Page): URL[] {
  const asked: URL[] = [];
  page.on("request", (request) => {
    const address = new URL(request.url());
    if (/^\/api\/v1\/sweeps\/[^/]+\/traces\//.test(address.pathname)) asked.push(address);
  });
  return asked;
}

/** The buoy that is lit: the one with a ring around it. */
const litBuoy = (chart: Locator) => chart.locator('g:has(> circle[fill="none"]) > text');

test("keys zoom, the address says what is in view, a reload keeps it and 0 leaves it", async ({
  page,
}) => {
  const asked = watchTraces(page);
  const chart = await openChart(page);
  const whole = (name: string) => Number(asked[0]?.searchParams.get(name));
  expect(viewOf(page)).toBeNull();
  await chart.focus();
  await page.keyboard.press("+");
  await expect(page).toHaveURL(/from=\d+&to=\d+/);
  const once = viewOf(page);
  await page.keyboard.press("+");
  await expect.poll(() => viewOf(page)).not.toEqual(once);
  const twice = viewOf(page);
  expect(twice?.from).toBeGreaterThan(once?.from ?? Number.NaN);
  expect(twice?.to).toBeLessThan(once?.to ?? Number.NaN);
  // Each press halves the width on the log axis, around its middle.
  const width = (view: { from: number; to: number } | null) =>
    Math.log((view?.to ?? Number.NaN) / (view?.from ?? Number.NaN));
  expect(width(twice)).toBeCloseTo(width(once) / 2, 3);
  const all = { from: whole("fromHz"), to: whole("toHz") };
  expect(width(once)).toBeCloseTo(width(all) / 2, 3);

  await page.keyboard.press("ArrowRight");
  await expect.poll(() => viewOf(page)?.from).toBeGreaterThan(twice?.from ?? Number.NaN);
  const moved = viewOf(page);
  expect(width(moved)).toBeCloseTo(width(twice), 3);

  const reread = page.waitForResponse((answer) =>
    answer.url().includes(`fromHz=${moved?.from}&toHz=${moved?.to}`),
  );
  await page.reload();
  expect((await reread).status()).toBe(200);
  await drawn(page);
  expect(viewOf(page)).toEqual(moved);
  await expect(page.getByRole("button", { name: "Show all frequencies" })).toBeEnabled();

  await (await drawn(page)).focus();
  await page.keyboard.press("0");
  await expect.poll(() => viewOf(page)).toBeNull();
  await expect(page.getByRole("button", { name: "Show all frequencies" })).toBeDisabled();
  expect(asked.length).toBeGreaterThan(3);
  for (const { href } of asked) {
    const answer = await page.request.get(href);
    expect((await answer.body()).length, href).toBeLessThanOrEqual(MOST_BYTES);
  }
});

test("a drag zooms to what was dragged over, and a double-click shows all again", async ({
  page,
}) => {
  const chart = await openChart(page);
  const box = await chart.boundingBox();
  if (!box) throw new Error("The chart has no place on the page.");
  const y = box.y + box.height / 3;
  await page.mouse.move(box.x + box.width * 0.6, y);
  await page.mouse.down();
  await page.mouse.move(box.x + box.width * 0.5, y, { steps: 4 });
  await page.mouse.move(box.x + box.width * 0.4, y, { steps: 4 });
  await page.mouse.up();
  await expect(page).toHaveURL(/from=\d+&to=\d+/);
  const first = viewOf(page);
  // A fifth of the width: dragged from right to left it is the same span.
  expect(first?.to).toBeGreaterThan(first?.from ?? Number.NaN);
  await page.mouse.move(box.x + box.width * 0.3, y);
  await page.mouse.down();
  await page.mouse.move(box.x + box.width * 0.7, y, { steps: 4 });
  await page.mouse.up();
  await expect.poll(() => viewOf(page)).not.toEqual(first);
  const second = viewOf(page);
  expect(second?.from).toBeGreaterThan(first?.from ?? Number.NaN);
  expect(second?.to).toBeLessThan(first?.to ?? Number.NaN);
  await page.mouse.dblclick(box.x + box.width / 2, y);
  await expect.poll(() => viewOf(page)).toBeNull();
});

test("pointing at a suspect marks its buoy, and pointing at a buoy marks its suspect", async ({
  page,
}) => {
  const chart = await openChart(page);
  const rows = page.getByRole("region", { name: "Suspects" }).locator("tbody tr");
  await expect(litBuoy(chart)).toHaveCount(0);
  for (const place of [0, 1]) {
    const row = rows.nth(place);
    await row.hover();
    await expect(litBuoy(chart)).toHaveText((await row.locator("td").first().innerText()).trim());
  }
  await page.getByRole("heading", { level: 1 }).hover();
  await expect(litBuoy(chart)).toHaveCount(0);

  const number = (await rows.first().locator("td").first().innerText()).trim();
  const buoy = chart.locator("svg text").filter({ hasText: new RegExp(`^${number}$`) });
  const box = await buoy.first().boundingBox();
  if (!box) throw new Error("The worst suspect has no buoy.");
  await page.mouse.move(box.x + box.width / 2, box.y + box.height / 2);
  await expect(litBuoy(chart)).toHaveText(number);
  await expect(rows.first()).toHaveClass(/bg-water-1/);
});
