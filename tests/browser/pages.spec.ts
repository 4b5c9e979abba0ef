import type { Page } from "@playwright/test";
import { expect, test } from "@playwright/test";
import { expectAccessible, expectContrast } from "./accessibility";
import { layFiles } from "./bench-work";
import { signIn } from "./sign-in";
import { makeSweepCsv } from "./sweep-csv";

/** Errors that the page itself raised or logged, each with the address it was on. */
function watchErrors(page: Page): string[] {
  const errors: string[] = [];
  page.on("pageerror", (error) => errors.push(`${page.url()}: ${error.message}`));
  page.on("console", (message) => {
    if (message.type() === "error") errors.push(`${page.url()}: ${message.text()}`);
  });
  return errors;
}

/** Waits until every chart on the page is drawn or says that it is empty. */
async function waitForCharts(page: Page) {
  for (const figure of await page.locator("figure").all())
    await expect(figure.locator("svg, p").first()).toBeAttached();
  await expect(page.getByText(/^Reading (the|more of the) trace$/)).toHaveCount(0);
}

/** Holds the page that is open against what every page owes, by day and by night. */
async function inspect(page: Page) {
  await waitForCharts(page);
  await page.emulateMedia({ colorScheme: "light" });
  await expectAccessible(page);
  await page.emulateMedia({ colorScheme: "dark" });
  await expectContrast(page);
  const overhang = await page.evaluate(
    () => document.documentElement.scrollWidth - document.documentElement.clientWidth,
  );
  expect(overhang, `${page.url()} scrolls sideways`).toBe(0);
}

async function inspectAll(page: Page, paths: readonly string[]) {
  for (const path of paths) {
    await test.step(path, async () => {
      const answer = await page.goto(path);
      expect(answer?.status(), path).toBe(200);
      await expect(page.getByRole("heading", { level: 1 })).toBeVisible();
      await inspect(page);
    });
  }
}

/** Path behind the first link of that name on the page, or in a part of it. */
async function linkTo(page: Page, name: string | RegExp, region?: string): Promise<string> {
  const place = region ? page.getByRole("region", { name: region }) : page.getByRole("main");
  return (await place.getByRole("link", { name }).first().getAttribute("href")) ?? "";
}

test.describe.configure({ timeout: 150_000 });

test("the night chart is another one than the day chart", async ({ page }) => {
  const paper = () => page.evaluate(() => getComputedStyle(document.body).backgroundColor);
  await page.emulateMedia({ colorScheme: "light" });
  await page.goto("/sign-in");
  await expect(page.getByRole("heading", { level: 1 })).toBeVisible();
  const day = await paper();
  await inspect(page);
  expect(await paper()).not.toBe(day);
});

test("programs, builds and sweeps are accessible, whole and quiet", async ({ page }) => {
  const errors = watchErrors(page);
  await signIn(page, "engineer@saltmarsh.example");
  const program = await linkTo(page, "Gannet");
  await page.goto(program);
  const build = await linkTo(page, "G3");
  await page.goto(build);
  const sweep = await linkTo(page, /./, "Sweeps");
  const place = `/sweeps/import?build=${build.split("/").at(-1)}`;
  await inspectAll(page, ["/", "/programs", "/programs/archived", "/programs/new"]);
  await inspectAll(page, [program, `${program}/edit`, build, `${build}/edit`, sweep, place]);
  const span = { startMhz: 30, stopMhz: 40, stepMhz: 0.05, floorDb: 4 };
  const lines = [{ frequencyMhz: 33, levelDb: 25 }];
  const buffer = makeSweepCsv({
    note: "preview",
    detector: "Quasi-Peak",
    unit: "dBuV",
    ...span,
    lines,
  });
  await layFiles(page, { name: "previewed.csv", mimeType: "text/csv", buffer });
  await expect(page.getByRole("article").getByRole("status")).toHaveText("ready");
  await inspect(page);
  expect(errors).toEqual([]);
});

test("ladders, reports and the account are accessible, whole and quiet", async ({ page }) => {
  const errors = watchErrors(page);
  await signIn(page, "engineer@saltmarsh.example");
  await page.goto(await linkTo(page, "Tern"));
  await page.goto(await linkTo(page, "T1"));
  const ladder = await linkTo(page, /./, "Ladders");
  const fresh = await linkTo(page, "New report");
  await page.goto("/reports");
  const draft = await linkTo(page, "Tern T1, first bench look");
  const approved = await linkTo(page, "Gannet G2, bench summary");
  await inspectAll(page, [ladder, `${ladder}/edit`]);
  await inspectAll(page, ["/reports", approved, draft, `${draft}/edit`, fresh, "/account"]);
  expect(errors).toEqual([]);
});

test("masks and benches are accessible, whole and quiet", async ({ page }) => {
  const errors = watchErrors(page);
  await signIn(page, "engineer@saltmarsh.example");
  await page.goto("/masks");
  const mask = await linkTo(page, "CISPR 32 class B, 3 m");
  await page.goto("/benches");
  const bench = await linkTo(page, /./, "Benches");
  await inspectAll(page, ["/masks", mask, "/masks/new", "/masks/import"]);
  await inspectAll(page, ["/benches", "/benches/new", bench]);
  await inspectAll(page, [`${bench}/edit`, `${bench}/signal-path`]);
  expect(errors).toEqual([]);
});

test("equipment, budgets, checks and suspects are accessible, whole and quiet", async ({
  page,
}) => {
  const errors = watchErrors(page);
  await signIn(page, "engineer@saltmarsh.example");
  await page.goto("/masks");
  const mask = await linkTo(page, "CISPR 32 class B, 3 m");
  await page.goto("/benches");
  const bench = await linkTo(page, /./, "Benches");
  await inspectAll(page, ["/suspects", "/benches/equipment", "/benches/equipment/new"]);
  await inspectAll(page, [`${bench}/budget`, `${bench}/checks/new`, `${mask}/confirm`]);
  expect(errors).toEqual([]);
});

test("the pages of an admin are accessible, whole and quiet", async ({ page }) => {
  const errors = watchErrors(page);
  await signIn(page, "admin@saltmarsh.example");
  await inspectAll(page, ["/team", "/team/audit"]);
  expect(errors).toEqual([]);
});
