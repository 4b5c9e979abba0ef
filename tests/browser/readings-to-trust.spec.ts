import { readFileSync } from "node:fs";
import type { Page } from "@playwright/test";
import { expect, test } from "@playwright/test";
import { expectAccessible, expectContrast } from "./accessibility";
import { importRadiated } from "./bench-work";
import { signIn } from "./sign-in";
import { makeSweepCsv } from "./sweep-csv";
import { uniqueName } from "./unique-name";
import { importMask, makeBench, makeProgram } from "./workplace";

/*
 * The bounds by hand: 30 dBµV at 160 MHz + cable 2 dB + antenna 10 dB/m = 42 dBµV/m, peak, over the
 * quasi-peak limit of 40; 13 dBµV at 640 MHz + 3 + 16 = 32 dBµV/m, 15 dB under 47.
 */
const names = {
  program: uniqueName("Withy"),
  mask: uniqueName("Weir limit"),
  bench: uniqueName("Weir bench"),
  analyzer: uniqueName("Weir analyzer"),
};
/** Paths that later tests go back to. */
const at = { mask: "", build: "", bench: "", ladder: "", sweep: "" };
const pathOf = (page: Page) => new URL(page.url()).pathname;

test.describe.configure({ mode: "serial" });
test.beforeEach(async ({ page }) => {
  page.setDefaultTimeout(30_000);
  await signIn(page, "engineer@saltmarsh.example");
});

function peakFile(name: string, levelDb: number, rbwKhz = 120) {
  const lines = [
    { frequencyMhz: 160, levelDb },
    { frequencyMhz: 640, levelDb: 13 },
  ];
  const span = { startMhz: 30, stopMhz: 1000, stepMhz: 0.05, floorDb: -5 };
  const said = { note: name, detector: "Peak", unit: "dBuV", rbwKhz };
  return { name, mimeType: "text/csv", buffer: makeSweepCsv({ ...said, ...span, lines }) };
}

test("a mask from memory is confirmed row by row, and nothing is confirmed by leaving rows out", async ({
  page,
}) => {
  at.mask = await importMask(page, names.mask);
  await expect(page.getByText("written down from memory")).toBeVisible();
  await page.getByRole("link", { name: "Confirm", exact: true }).click();
  await page.getByLabel("Which copy you hold").fill("printed, shelf 2");
  await page.getByText("I compared every line with my own copy").click();
  await page.getByRole("checkbox", { name: /30 MHz to 230 MHz agrees/ }).check();
  await page.getByRole("button", { name: "Confirm as revision 2" }).click();
  await expect(page.getByText("the comparison is not complete")).toBeVisible();
  await expect(page.getByLabel("Which copy you hold")).toHaveValue("printed, shelf 2");
  await expectAccessible(page);
  await page.getByRole("checkbox", { name: "Every row of Quasi-peak agrees" }).check();
  await page.getByRole("button", { name: "Confirm as revision 2" }).click();
  await expect(page).toHaveURL(new RegExp(`${at.mask}$`));
  await expect(page.getByText("printed, shelf 2", { exact: true })).toBeVisible();
  await expect(page.getByText("written down from memory")).toHaveCount(0);
});

test("a peak over a quasi-peak limit is undecided, and its re-measure list goes to the bench", async ({
  page,
  context,
}, testInfo) => {
  await context.grantPermissions(["clipboard-read", "clipboard-write"]);
  at.bench = await makeBench(page, names.bench);
  at.build = (await makeProgram(page, names)).build;
  await page.getByLabel("Ladder", { exact: true }).fill("Weir ladder");
  await page.getByLabel("Step 0, the starting point").fill("as built");
  await page.getByRole("button", { name: "Start ladder" }).click();
  await expect(page.getByRole("heading", { name: "Weir ladder" })).toBeVisible();
  at.ladder = pathOf(page);
  await page.getByRole("link", { name: "Import sweeps" }).click();
  const card = await importRadiated(page, names.bench, peakFile(`${names.program} 0.csv`, 30));
  await expect(card.getByText("undecided", { exact: true })).toBeVisible();
  await card.getByRole("link").click();
  await expect(page.getByRole("heading", { name: `${names.program} 0`, level: 1 })).toBeVisible();
  at.sweep = pathOf(page);
  await page.getByRole("button", { name: "Put on the line of record" }).click();
  await expect(page.getByRole("button", { name: "Take off the line of record" })).toBeVisible();

  const list = page.getByRole("region", { name: "Measure again" });
  const row = list.getByRole("row").nth(1);
  await expect(list.getByRole("row")).toHaveCount(2);
  await expect(row).toContainText(/160\.0 MHz.*quasi-peak.*120\.0 kHz/);
  await expect(row).toContainText(/42\.0 dB.V\/m.*40\.0 dB.V\/m/);
  const section = page.locator("section").filter({ has: list });
  await section.getByRole("button", { name: "Copy table" }).click();
  await expect(section.getByRole("button", { name: "Copied" })).toBeVisible();
  const copied = await page.evaluate(() => navigator.clipboard.readText());
  expect(copied.split("\n")[0]).toMatch(
    /^Frequency, Hz\tDetector\tRBW, Hz\tMask line\tPolarization/,
  );
  expect(copied.split("\n")[1]).toMatch(/^160000000\tquasi-peak\t120000\tQuasi-peak\t/);
  const arriving = page.waitForEvent("download");
  await section.getByRole("link", { name: "Save as CSV" }).click();
  const file = testInfo.outputPath("measure-again.csv");
  await (await arriving).saveAs(file);
  expect(readFileSync(file, "utf8")).toContain("160000000,quasi-peak,120000");

  await page.getByRole("link", { name: "Sheet for the bench" }).click();
  await expect(page.getByRole("heading", { name: "Measure again", level: 1 })).toBeVisible();
  await expectAccessible(page);
  await page.emulateMedia({ colorScheme: "dark" });
  await expectContrast(page);
  await page.emulateMedia({ media: "print" });
  await expect(page.getByRole("navigation", { name: "Main" })).toBeHidden();
  await expect(page.getByRole("button", { name: "Print" })).toBeHidden();
  await expect(page.locator("table:visible")).toHaveCount(1);
  await expect(page.getByRole("columnheader", { name: "Measured" })).toBeVisible();
  await expect(page.getByRole("row").nth(1)).toContainText(/160\.0 MHz/);
});

test("the build's own sheet names the same spot, and a suspect is followed from the sweep", async ({
  page,
}) => {
  await page.goto(at.build);
  await expect(page.getByText("undecided", { exact: true }).first()).toBeVisible();
  await page.getByRole("link", { name: "1 spot to measure again" }).click();
  await expect(page.getByRole("heading", { name: "Measure again", level: 1 })).toBeVisible();
  await expect(page.getByRole("row").nth(1)).toContainText(/160\.0 MHz/);
  await expectAccessible(page);

  await page.goto(at.sweep);
  const suspects = page.getByRole("region", { name: "Suspects" });
  await suspects.getByRole("button", { name: "Follow suspect 1" }).click();
  const followed = suspects.getByRole("link", { name: /followed as/ });
  await expect(followed).toBeVisible();
  await followed.click();
  await expect(page).toHaveURL(/\/suspects\/[0-9a-f-]+$/);
  await expect(page.getByRole("heading", { level: 1 })).toContainText("160");
  await expect(page.getByRole("link", { name: `${names.program} 0` }).first()).toBeVisible();
  await expectAccessible(page);
});

test("steps of unlike RBW are compared only with a reason, which then stands there", async ({
  page,
}) => {
  await page.goto(at.ladder);
  await page.getByLabel("What changes").fill("ferrite");
  await page.getByRole("button", { name: "Add step" }).click();
  const rung = page.getByRole("listitem").filter({ hasText: "Step 1: ferrite" });
  await rung.getByRole("link", { name: "Import sweeps" }).click();
  await importRadiated(page, names.bench, peakFile(`${names.program} 1.csv`, 24, 9));
  await page.goto(at.ladder);
  await expect(rung.getByText(/^Not comparable/).first()).toBeVisible();
  await rung.getByRole("button", { name: "Accept with a reason" }).first().click();
  await rung.getByRole("button", { name: "Accept", exact: true }).click();
  const reason = rung.getByLabel("Why they may be compared all the same");
  await expect(reason).toHaveAttribute("aria-invalid", "true");
  await reason.fill("a single line, the same in both filters");
  await expectAccessible(page);
  await rung.getByRole("button", { name: "Accept", exact: true }).click();
  await expect(rung.getByText(/^Compared although something differs/).first()).toBeVisible();
  await expect(rung.getByText("a single line, the same in both filters").first()).toBeVisible();
});

test("a build's sweeps are filtered by doubt", async ({ page }) => {
  await page.goto(at.build);
  const sweeps = page.getByRole("region", { name: "Sweeps" });
  await expect(sweeps.getByRole("row")).toHaveCount(3);
  const filter = page.getByRole("navigation", { name: "Sweeps with doubt" });
  await filter.getByRole("link", { name: /^RBW differs/ }).click();
  await expect(page).toHaveURL(/doubt=rbw-differs/);
  await expect(sweeps.getByRole("row")).toHaveCount(2);
  await expect(sweeps.getByRole("row").nth(1)).toContainText(`${names.program} 1`);
  await expectAccessible(page);
  await filter.getByRole("link", { name: /^Any or none/ }).click();
  await expect(sweeps.getByRole("row")).toHaveCount(3);
});

test("a revision shows what it changes before it is saved, and then comes into force", async ({
  page,
}) => {
  await page.goto(`${at.mask}/edit`);
  for (const end of ["start", "end"])
    await page.getByLabel(`limit at ${end}, segment 1 of Quasi-peak`).fill("43");
  await page.getByRole("button", { name: /^Save/ }).click();
  const dialog = page.getByRole("dialog", { name: "What revision 3 changes" });
  const changed = dialog.getByRole("row").filter({ hasText: `${names.program} 0` });
  await expect(changed).toContainText(/undecided.*−2\.0 dB.*inside guard.*\+1\.0 dB/);
  await expectAccessible(page);
  await dialog.getByRole("button", { name: "Keep editing" }).click();
  await expect(page.getByLabel("limit at start, segment 1 of Quasi-peak")).toHaveValue("43");
  await page.getByRole("button", { name: /^Save/ }).click();
  await dialog.getByRole("button", { name: "Save revision 3" }).click();
  await expect(page).toHaveURL(new RegExp(`${at.mask}$`));
  await expect(page.getByText(/^Revision 3 is being put in force/)).toHaveCount(0, {
    timeout: 30_000,
  });
  await expect(page.getByRole("progressbar")).toHaveCount(0);
  await expectAccessible(page);
  await page.goto(at.sweep);
  await expect(page.getByRole("main").getByText("Revision 3.")).toBeVisible();
  await expect(page.getByText("+1.0 dB", { exact: true }).first()).toBeVisible();
});

test("a calibration in the future is refused at its field, and what was typed stays", async ({
  page,
}) => {
  await page.goto("/benches/equipment/new");
  await expectAccessible(page);
  await page.getByLabel("Name", { exact: true }).fill(names.analyzer);
  await page.getByLabel("Kind").selectOption("instrument");
  await page.getByRole("button", { name: "Add equipment" }).click();
  await expect(page.getByRole("heading", { name: names.analyzer })).toBeVisible();
  const day = page.getByLabel("Calibrated on");
  await day.fill("2099-01-01");
  await page.getByLabel("Laboratory").fill("Harbour calibration");
  await page.getByLabel("Certificate number").fill("HC-14");
  await page.getByRole("button", { name: "Record calibration" }).click();
  await expect(day).toHaveAttribute("aria-invalid", "true");
  await expect(day).toHaveValue("2099-01-01");
  await expect(page.getByLabel("Laboratory")).toHaveValue("Harbour calibration");
  await expect(page.getByLabel("Certificate number")).toHaveValue("HC-14");
  await expectAccessible(page);
  await day.fill("2026-02-01");
  await page.getByRole("button", { name: "Record calibration" }).click();
  await expect(page.getByText("The calibration is recorded.")).toBeVisible();
  await expect(page.getByRole("region", { name: "Calibrations" })).toContainText("HC-14");
});

test("a budget line without a distribution is named at its field, and the numbers stay", async ({
  page,
}) => {
  await page.goto(`${at.bench}/budget`);
  await page.getByLabel("Title").fill("30 MHz to 1 GHz");
  await page.getByRole("button", { name: "Add line" }).click();
  const line = page.getByRole("group", { name: /^1\./ });
  await line.getByLabel("Quantity").fill("Antenna factor");
  await line.getByLabel("Value in dB").fill("2");
  await page.getByRole("button", { name: "Save as revision 1" }).click();
  const distribution = line.getByLabel("Distribution");
  await expect(distribution).toHaveAttribute("aria-invalid", "true");
  await expect(line.getByLabel("Value in dB")).toHaveValue("2");
  await expect(page.getByLabel("Title")).toHaveValue("30 MHz to 1 GHz");
  await expectAccessible(page);
  await distribution.selectOption("normal");
  // 2 dB, normal at k = 2, is u = 1 dB, and U is 2 dB again.
  await expect(page.getByRole("region", { name: "What follows" })).toContainText("2.00 dB");
  await page.getByRole("button", { name: "Save as revision 1" }).click();
  await expect(page).toHaveURL(new RegExp(`${at.bench}$`));
  await expect(page.getByRole("rowheader", { name: "Antenna factor" })).toBeVisible();
});
