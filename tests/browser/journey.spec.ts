import { execFileSync } from "node:child_process";
import type { Page } from "@playwright/test";
import { expect, test } from "@playwright/test";
import { expectAccessible } from "./accessibility";
import { addTransducer, importRadiated } from "./bench-work";
import { openAs } from "./role-page";
import { signIn } from "./sign-in";
import { makeSweepCsv } from "./sweep-csv";
import { uniqueName } from "./unique-name";

/*
 * The margins by hand. Limit: CISPR 32 class B at 3 m, 40 dBµV/m from 30 to 230 MHz.
 * 160 MHz lies halfway in log f between rows of both tables: cable between 40 MHz 1 dB and 640 MHz
 * 3 dB = 2 dB, antenna between 80 MHz 8 dB/m and 320 MHz 12 dB/m = 10 dB/m.
 * Step 0: 20.8 dBµV + 2 + 10 = 32.8 dBµV/m, margin 40 − 32.8 = +7.2 dB. Step 1 reads 6 dB lower.
 * The line at 640 MHz stays: 13 + 3 + 16 = 32 dBµV/m under 47, margin +15.0 dB.
 */
const ANTENNA = "Frequency [MHz]\tFactor [dB/m]\n30\t11\n80\t8\n320\t12\n1280\t20\n";
const CABLE = "Frequency [MHz]\tLoss [dB]\n30\t0.8\n40\t1\n640\t3\n1280\t4\n";
const MASK = "CISPR 32 class B, 3 m";
const DEFERRAL =
  "Bench pre-compliance data. Only an accredited test lab and the applicable edition of the standard decide.";

const program = uniqueName("Knot");
const bench = uniqueName("Quay bench");
/** Paths that later tests go back to. */
const at = { program: "", build: "", bench: "", ladder: "", sweep: "", report: "", mask: "" };
const idOf = (path: string) => path.split("/").at(-1) ?? "";
/** Drawing the PDF of a report takes its time where much else runs. */
const DRAWING = { timeout: 20_000 };
const pathOf = (page: Page) => new URL(page.url()).pathname;

test.describe.configure({ mode: "serial" });

function sweepFile(name: string, levelDb: number) {
  const lines = [
    { frequencyMhz: 160, levelDb },
    { frequencyMhz: 640, levelDb: 13 },
  ];
  const span = { startMhz: 30, stopMhz: 1000, stepMhz: 0.05, floorDb: -5 };
  const buffer = makeSweepCsv({ note: name, detector: "Quasi-Peak", unit: "dBuV", ...span, lines });
  return { name, mimeType: "text/csv", buffer };
}

test("an engineer makes a program with its mask, a build, and a bench with its signal path", async ({
  page,
}) => {
  await signIn(page, "engineer@saltmarsh.example");
  await page.goto("/programs/new");
  await page.getByLabel("Name", { exact: true }).fill(program);
  await page.getByLabel("Target margin in dB").fill("6");
  await page.getByRole("button", { name: "Create program" }).click();
  await expect(page.getByRole("heading", { name: program })).toBeVisible();
  at.program = pathOf(page);

  await page.goto(`${at.program}/edit`);
  await page.getByLabel("Search masks").fill("CISPR 32 class B");
  await page.getByRole("checkbox", { name: MASK }).check();
  await page.getByRole("button", { name: "Store masks" }).click();
  await expect(page.getByText("Masks stored.")).toBeVisible();
  await page.goto(at.program);
  await page.getByLabel("Build", { exact: true }).fill("K1");
  await page.getByLabel("Built on").fill("2026-11-16");
  await page.getByRole("button", { name: "Add build" }).click();
  await page.getByRole("cell", { name: "K1" }).getByRole("link").click();
  await expect(page.getByRole("heading", { name: `${program} K1` })).toBeVisible();
  at.build = pathOf(page);

  await page.goto("/benches/new");
  await page.getByLabel("Name", { exact: true }).fill(bench);
  await page.getByLabel("Measuring distance in m").fill("3");
  await page.getByLabel("Guard in dB").fill("4");
  await page.getByRole("button", { name: "Create bench" }).click();
  await expect(page).toHaveURL(/\/signal-path$/);
  for (const [name, kind, table] of [
    ["Whip on the quay", "antenna", ANTENNA],
    ["Reed cable", "cable", CABLE],
  ] as const) {
    const group = await addTransducer(page, { name, kind, table });
    await expect(group.getByRole("status")).toContainText("4 rows read");
  }
  await expectAccessible(page);
  await page.getByRole("button", { name: "Save as revision" }).click();
  await expect(page.getByRole("rowheader", { name: "Reed cable" })).toBeVisible();
  at.bench = pathOf(page);

  await page.goto("/masks");
  await page.getByRole("link", { name: MASK }).first().click();
  await expect(page.getByRole("heading", { name: MASK })).toBeVisible();
  at.mask = pathOf(page);
});

test("the file of step 0 shows the margin worked out by hand, on import and on the sweep's page", async ({
  page,
}) => {
  await signIn(page, "engineer@saltmarsh.example");
  await page.goto(at.build);
  await page.getByLabel("Ladder", { exact: true }).fill("Cable ladder");
  await page.getByLabel("Step 0, the starting point").fill("nothing fitted");
  await page.getByRole("button", { name: "Start ladder" }).click();
  await expect(page.getByRole("heading", { name: "Cable ladder" })).toBeVisible();
  at.ladder = pathOf(page);
  await page.getByRole("link", { name: "Import sweeps" }).click();
  const card = await importRadiated(page, bench, sweepFile(`${program} step 0.csv`, 20.8));
  await expect(card.getByText("+7.2 dB", { exact: true })).toBeVisible();
  await expect(card.getByText("clear", { exact: true })).toBeVisible();
  await expect(card.getByText(MASK)).toBeVisible();
  await expectAccessible(page);

  await card.getByRole("link").click();
  await expect(page.getByRole("heading", { name: `${program} step 0`, level: 1 })).toBeVisible();
  at.sweep = pathOf(page);
  const main = page.getByRole("main");
  await expect(main.getByText("+7.2 dB", { exact: true }).first()).toBeVisible();
  await expect(main.getByText(`Quasi-peak line of ${MASK} at 160.0 MHz.`)).toBeVisible();
  await expect(main.getByText("Revision 1.")).toBeVisible();
  const suspects = page.getByRole("region", { name: "Suspects" }).getByRole("row");
  await expect(suspects).toHaveCount(3);
  await expect(suspects.nth(1)).toContainText(/160\.00 MHz32\.840\.0\+7\.2 dB/);
  await expect(suspects.nth(2)).toContainText(/640\.00 MHz32\.047\.0\+15\.0 dB/);
  await expectAccessible(page);
});

test("the ladder shows the 6 dB that step 1 bought, and step 1 goes on the line of record", async ({
  page,
}) => {
  await signIn(page, "engineer@saltmarsh.example");
  await page.goto(at.ladder);
  await page.getByLabel("What changes").fill("ferrite on the reed cable");
  await page.getByRole("button", { name: "Add step" }).click();
  const rung = page.getByRole("listitem").filter({ hasText: "Step 1: ferrite" });
  await rung.getByRole("link", { name: "Import sweeps" }).click();
  await importRadiated(page, bench, sweepFile(`${program} step 1.csv`, 14.8));

  await page.goto(at.ladder);
  await expect(page.getByText("+6.0 dB", { exact: true }).first()).toBeVisible();
  await expect(page.getByText(`from +7.2 dB to +13.2 dB.`)).toBeVisible();
  await rung.getByText("All numbers").first().click();
  const delta = rung.getByRole("row").filter({ hasText: MASK });
  await expect(delta).toContainText("+7.2 dB+13.2 dB");
  await expect(delta.getByRole("cell").last()).toHaveText("+6.0 dB");
  const record = rung.getByRole("button", { name: "Put on the line of record" });
  await record.click();
  await expect(record).toHaveCount(0);
  await expect(rung.getByText("on the line of record")).toBeVisible();
  await expectAccessible(page);
  await page.goto(at.build);
  await expect(page.getByText("over one sweep on the line of record")).toBeVisible();
  await expect(page.getByText("+13.2 dB", { exact: true }).first()).toBeVisible();
});

test("the engineer issues the report and finds no way to approve it", async ({ page }) => {
  await signIn(page, "engineer@saltmarsh.example");
  await page.goto(at.build);
  await page.getByRole("link", { name: "New report" }).click();
  await page.getByLabel("Title").fill(`${program}, bench summary`);
  await page.getByRole("button", { name: "Save draft" }).click();
  await expect(page.getByText("A draft: nothing is fixed yet.")).toBeVisible();
  at.report = pathOf(page);
  await page.getByRole("button", { name: "Issue", exact: true }).click();
  await page.getByRole("dialog").getByRole("button", { name: "Issue", exact: true }).click();
  await expect(page.getByText("Somebody else has to approve it.")).toBeVisible(DRAWING);
  await expect(page.getByRole("button", { name: "Approve" })).toHaveCount(0);
  await expectAccessible(page);
});

test("an admin who issued a report cannot approve it either", async ({ page }) => {
  await signIn(page, "admin@saltmarsh.example");
  await page.goto(at.report);
  await expect(page.getByText("not yet approved")).toBeVisible();
  await expect(page.getByRole("button", { name: "Approve" })).toHaveCount(0);
  await page.goto(`/reports/new?build=${idOf(at.build)}`);
  await page.getByRole("button", { name: "Save draft" }).click();
  await page.getByRole("button", { name: "Issue", exact: true }).click();
  await page.getByRole("dialog").getByRole("button", { name: "Issue", exact: true }).click();
  await expect(page.getByText("Somebody else has to approve it.")).toBeVisible(DRAWING);
  await expect(page.getByRole("button", { name: "Approve" })).toHaveCount(0);
});

test("a manager approves the report, finds the build in the trend, and may not import or edit benches and masks", async ({
  page,
}) => {
  await signIn(page, "manager@saltmarsh.example");
  await page.goto(at.report);
  await page.getByRole("button", { name: "Approve" }).click();
  await expect(page.getByText("approved by Ines Tideway")).toBeVisible(DRAWING);
  await expectAccessible(page);
  await page.goto(at.program);
  await expect(page.getByText("+13.2 dB", { exact: true }).first()).toBeVisible();
  await expect(page.getByText("The target of +6.0 dB is met on the bench.")).toBeVisible();
  await expect(page.getByRole("link", { name: /K1.*\+13\.2 dB/ })).toBeVisible();
  await expectAccessible(page);
  await page.goto("/");
  const line = page.getByRole("listitem").filter({ hasText: program });
  await expect(line.getByRole("link", { name: "+13.2 dB" })).toBeVisible();
  await expect(line).toContainText("target +6.0 dB met");

  for (const [path, refusal] of [
    [`/sweeps/import?build=${idOf(at.build)}`, "may read sweeps, not import them"],
    [`${at.bench}/edit`, "may read benches, not change them"],
    [`${at.bench}/signal-path`, "may read benches, not change them"],
    [`${at.mask}/edit`, "may read masks, not change them"],
    [`/reports/new?build=${idOf(at.build)}`, "may read reports, not write them"],
  ] as const) {
    await page.goto(path);
    await expect(page.getByText(refusal), path).toBeVisible();
    await expect(page.getByRole("main").getByRole("button"), path).toHaveCount(0);
  }
});

test("a liaison downloads the PDF, and its text holds number, margin, mask, revision and deferral", async ({
  page,
}, testInfo) => {
  await signIn(page, "liaison@saltmarsh.example");
  await page.getByRole("link", { name: "Reports" }).click();
  await expectAccessible(page);
  await page.getByRole("link", { name: `${program}, bench summary`, exact: true }).click();
  const heading = page.getByRole("heading", { name: `${program}, bench summary` });
  const number = (await heading.innerText()).split(" ")[0] ?? "";
  expect(number).toMatch(/\d/);
  const arriving = page.waitForEvent("download");
  await page.getByRole("link", { name: "Download PDF" }).click();
  const download = await arriving;
  expect(download.suggestedFilename()).toMatch(/\.pdf$/);
  const file = testInfo.outputPath("report.pdf");
  await download.saveAs(file);
  const text = execFileSync("pdftotext", ["-layout", file, "-"], { encoding: "utf8" });
  // pdftotext ends each page with a form feed.
  const pages = text.split("\f").slice(0, -1);
  expect(pages.length).toBeGreaterThan(1);
  for (const sheet of pages) {
    expect(sheet).toContain(number);
    expect(sheet.replace(/\s+/g, " ")).toContain(DEFERRAL);
  }
  const first = (pages[0] ?? "").replace(/\s+/g, " ");
  // The first row of each table is the worst: its margin, where it lies and what it was held against.
  expect(first).toContain(`${MASK} (revision 1)`);
  expect(first).toMatch(/clear .*\+13\.2 dB .*160\.00 MHz · 26\.8 dB.V\/m/);
  expect(first).toMatch(/1 160\.00 MHz 26\.8 dB.V\/m \+13\.2 dB Quasi-peak, like for like/);
  expect(first).toMatch(/ferrite on the reed cable .*\+6\.0 dB/);
  expect(text).toContain("Ines Tideway");
});

test("a liaison meets a clear refusal on every page that changes something", async ({ page }) => {
  await signIn(page, "liaison@saltmarsh.example");
  for (const [path, refusal] of [
    [`/sweeps/import?build=${idOf(at.build)}`, "may read sweeps, not import them"],
    [`/reports/new?build=${idOf(at.build)}`, "may read reports, not write them"],
    ["/programs/new", "may read programs, not create them"],
    [`${at.program}/edit`, "may read programs, not change them"],
    [`${at.build}/edit`, "may read builds, not change them"],
    [`${at.ladder}/edit`, "may read ladders, not change them"],
    [`${at.bench}/edit`, "may read benches, not change them"],
    ["/benches/new", "may read benches, not change them"],
    [`${at.mask}/edit`, "may read masks, not change them"],
    ["/masks/new", "may read masks, not change them"],
    ["/masks/import", "may read masks, not change them"],
    [`${at.report}/edit`, "may read reports, not write them"],
  ] as const) {
    await page.goto(path);
    await expect(page.getByText(refusal), path).toBeVisible();
    await expect(page.getByRole("main").getByRole("button"), path).toHaveCount(0);
  }
  await expectAccessible(page);
  await page.goto(at.ladder);
  await expect(page.getByRole("button", { name: "Add step" })).toHaveCount(0);
  await page.goto(at.report);
  await expect(page.getByRole("button", { name: "Approve" })).toHaveCount(0);
});

test("another team finds no page and no data, and whoever is signed out gets none", async ({
  page,
  browser,
}) => {
  const data = [
    `/api/v1/sweeps/${idOf(at.sweep)}/traces/0?fromHz=30000000&toHz=1000000000`,
    `/api/v1/sweeps/${idOf(at.sweep)}/file`,
    `/api/v1/reports/${idOf(at.report)}/pdf`,
  ];
  const statuses = (who: Page) =>
    Promise.all(data.map(async (path) => (await who.request.get(path)).status()));
  expect(await statuses(page)).toEqual([401, 401, 401]);
  const owner = await openAs(browser, "liaison@saltmarsh.example");
  expect(await statuses(owner)).toEqual([200, 200, 200]);
  await owner.context().close();

  await signIn(page, "admin@fenwick.example");
  expect(await statuses(page)).toEqual([404, 404, 404]);
  for (const path of [
    ...Object.values(at).filter((path) => path !== at.mask),
    ...[at.program, at.build, at.bench, at.ladder, at.report].map((path) => `${path}/edit`),
    `/sweeps/import?build=${idOf(at.build)}`,
    `/reports/new?build=${idOf(at.build)}`,
    at.mask,
  ]) {
    const answer = await page.goto(path);
    expect(answer?.status(), path).toBe(404);
    await expect(page.getByRole("heading", { name: "Nothing is charted here" })).toBeVisible();
  }
});
