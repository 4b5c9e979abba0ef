import { closeSync, ftruncateSync, openSync, rmSync } from "node:fs";
import { join } from "node:path";
import type { Page } from "@playwright/test";
import { expect, test } from "@playwright/test";
import { addTransducer, layFiles } from "./bench-work";
import { signIn } from "./sign-in";
import { uniqueName } from "./unique-name";

const FOLDER = join("tests", "fixtures", "bad-sweeps");
const NOWHERE = "Nothing is charted here";

/** What each file is told, at the file itself. */
const REFUSED = [
  ["binary.csv", "This is no text file: line 2 holds a control character."],
  ["header-only.csv", "the file holds 4 lines of header or text and no data."],
  ["level-in-words.csv", 'Line 5, column 2: the level reads "high", which is no number.'],
  ["no-level-at-all.csv", "No table of frequency and level was found"],
  ["order-changes.csv", "Line 5: the frequency 30.5 comes after 31"],
  ["frequency-repeated.csv", "Line 5: the frequency 31 is repeated with another level"],
  ["frequency-nan.csv", 'Line 4, column 1: the frequency reads "NaN", which is no number.'],
  ["level-infinite.csv", 'Line 4, column 2: the level reads "inf", which is no number.'],
] as const;

/** Files that can be read, with what was done to them said before anything is stored. */
const WARNED = [
  ["descending.csv", "The frequencies descend; the rows were turned round."],
  ["level-nan.csv", '"Level" has 1 point without a level; they are gaps.'],
] as const;

/** Every answer of the server that was its own fault. */
function watchFaults(page: Page): string[] {
  const faults: string[] = [];
  page.on("response", (answer) => {
    if (answer.status() >= 500) faults.push(`${answer.status()} ${answer.url()}`);
  });
  return faults;
}

async function makeBuild(page: Page): Promise<string> {
  await page.goto("/programs/new");
  await page.getByLabel("Name", { exact: true }).fill(uniqueName("Sandpiper"));
  await page.getByLabel("Target margin in dB").fill("3");
  await page.getByRole("button", { name: "Create program" }).click();
  await page.getByLabel("Build", { exact: true }).fill("S1");
  await page.getByRole("button", { name: "Add build" }).click();
  const link = page.getByRole("cell", { name: "S1" }).getByRole("link");
  return (await link.getAttribute("href")) ?? "";
}

/** Path of a sweep of the demo. */
async function findSweep(page: Page): Promise<string> {
  await page.goto("/");
  await page.getByRole("link", { name: "Gannet", exact: true }).click();
  await page.getByRole("cell", { name: "G3" }).getByRole("link").click();
  const sweeps = page.getByRole("region", { name: "Sweeps" });
  const link = sweeps.locator('a[href^="/sweeps/"]').first();
  return (await link.getAttribute("href")) ?? "";
}

test("bad files are told what is wrong with them at the file, and the build still has no sweep", async ({
  page,
}, testInfo) => {
  const faults = watchFaults(page);
  await signIn(page, "engineer@saltmarsh.example");
  const build = await makeBuild(page);
  await page.goto(`/sweeps/import?build=${build.split("/").at(-1)}`);

  const asked: string[] = [];
  page.on("request", (request) => {
    if (request.method() === "POST") asked.push(request.url());
  });
  await layFiles(page, join(FOLDER, "empty.csv"));
  await expect(page.getByRole("article", { name: "empty.csv" })).toContainText(
    "The file is empty.",
  );
  const huge = testInfo.outputPath("huge.csv");
  const handle = openSync(huge, "w");
  ftruncateSync(handle, 200 * 1024 * 1024);
  closeSync(handle);
  await layFiles(page, huge);
  await expect(page.getByRole("article", { name: "huge.csv" })).toContainText(
    "The file has 200 MB and at most 60 MB can be read.",
  );
  // Neither of them had to be sent to be refused.
  expect(asked).toEqual([]);
  rmSync(huge);

  for (const [name, text] of REFUSED) {
    await layFiles(page, join(FOLDER, name));
    const card = page.getByRole("article", { name });
    await expect(card.getByRole("status")).toHaveText("refused");
    await expect(card.getByRole("alert")).toContainText(text);
    // The line is said once.
    await expect(card.getByRole("alert")).not.toContainText(/line \d+: line \d+/i);
  }
  for (const [name, text] of WARNED) {
    await layFiles(page, join(FOLDER, name));
    await expect(page.getByRole("article", { name })).toContainText(text);
  }
  for (const [name] of WARNED)
    await page
      .getByRole("article", { name })
      .getByRole("button", { name: "Take off the list" })
      .click();
  await expect(page.getByRole("button", { name: "Store 0 sweeps" }).first()).toBeDisabled();

  await page.goto(build);
  await expect(page.getByText("No sweeps yet.")).toBeVisible();
  expect(faults).toEqual([]);
});

test("a mask with crossing segments is told so at the row and is not stored", async ({ page }) => {
  const faults = watchFaults(page);
  const title = uniqueName("Crossed mask");
  await signIn(page, "engineer@saltmarsh.example");
  await page.goto("/masks/new");
  await page.getByLabel("Title").fill(title);
  await page.getByLabel("Port").selectOption("radiated");
  await page.getByLabel("Unit of the limit").selectOption("dBuV/m");
  await page.getByLabel("Measuring distance in m").fill("3");
  await page.getByLabel("Line", { exact: true }).fill("Edge");
  await page.getByLabel("Detector").selectOption("quasi-peak");
  await page.getByRole("button", { name: "Add segment" }).click();
  for (const [place, cells] of [
    [1, ["30 MHz", "100 MHz", "40", "60"]],
    [2, ["50 MHz", "200 MHz", "60", "40"]],
  ] as const) {
    await page.getByLabel(`start frequency, segment ${place} of Edge`).focus();
    for (const text of cells) {
      await page.keyboard.type(text);
      await page.keyboard.press("Tab");
    }
  }
  const crossed = page.getByLabel("start frequency, segment 2 of Edge");
  await expect(crossed).toHaveAttribute("aria-invalid", "true");
  await expect(crossed).toHaveAccessibleDescription(/This segment crosses segment 1/);
  await expect(page.getByLabel("start frequency, segment 1 of Edge")).not.toHaveAttribute(
    "aria-invalid",
  );
  await page.getByRole("button", { name: "Create mask" }).click();
  await expect(page.getByText("Some fields need another look; nothing was stored.")).toBeVisible();
  await expect(crossed).toBeFocused();
  await page.goto("/masks");
  await expect(page.getByRole("link", { name: "CISPR 32 class B, 3 m" }).first()).toBeVisible();
  await expect(page.getByText(title)).toHaveCount(0);
  expect(faults).toEqual([]);
});

test("a factor table with one row is told so at its transducer, and the path keeps its revision", async ({
  page,
}) => {
  const faults = watchFaults(page);
  await signIn(page, "engineer@saltmarsh.example");
  await page.goto("/benches/new");
  await page.getByLabel("Name", { exact: true }).fill(uniqueName("Bare bench"));
  await page.getByLabel("Guard in dB").fill("0");
  await page.getByRole("button", { name: "Create bench" }).click();
  await expect(page).toHaveURL(/\/signal-path$/);
  const bench = page.url().replace("/signal-path", "");
  const table = "Frequency [MHz]\tLoss [dB]\n30\t1.2\n";
  const group = await addTransducer(page, { name: "Short cable", kind: "cable", table });
  const field = group.getByLabel("Factor table");
  await expect(field).toHaveAccessibleDescription(/A factor table needs at least two lines/);
  await page.getByRole("button", { name: "Save as revision 2" }).click();
  await expect(page.getByRole("alert").first()).toBeVisible();
  await expect(field).toHaveAccessibleDescription(/A factor table needs at least two lines/);
  await expect(page).toHaveURL(/\/signal-path$/);
  await page.goto(bench);
  await expect(page.getByText("No transducers: levels at")).toBeVisible();
  await expect(page.getByRole("link", { name: "Revision 2" })).toHaveCount(0);
  expect(faults).toEqual([]);
});

test("a malformed id leads to a page that says so, never to a fault", async ({ page }) => {
  const faults = watchFaults(page);
  await signIn(page, "engineer@saltmarsh.example");
  const sweep = await findSweep(page);
  const build = new URL(page.url()).pathname;
  const buildId = build.split("/").at(-1) ?? "";
  for (const bad of ["not-an-id", encodeURIComponent("' or 1=1 --"), "0".repeat(36)])
    for (const path of [
      `/programs/${bad}`,
      `/programs/${bad}/edit`,
      `/programs/${bad}/builds/${buildId}`,
      `${build.replace(buildId, bad)}`,
      `${build.replace(buildId, bad)}/edit`,
      `/sweeps/${bad}`,
      `/sweeps/import?build=${bad}`,
      `/sweeps/import?build=${buildId}&step=${bad}`,
      `/ladders/${bad}`,
      `/ladders/${bad}/edit`,
      `/masks/${bad}`,
      `/masks/${bad}/edit`,
      `/benches/${bad}`,
      `/benches/${bad}/edit`,
      `/benches/${bad}/signal-path`,
      `/reports/${bad}`,
      `/reports/${bad}/edit`,
      `/reports/new?build=${bad}`,
    ]) {
      const answer = await page.request.get(path);
      expect(answer.status(), path).toBe(404);
      expect(await answer.text(), path).toContain(NOWHERE);
    }
  await page.goto("/sweeps/not-an-id");
  await expect(page.getByRole("heading", { name: NOWHERE })).toBeVisible();
  // A mask that the sweep was never held against is passed over.
  await page.goto(`${sweep}?mask=not-an-id&from=x&to=-1`);
  await expect(page.getByRole("navigation", { name: "Masks" })).toBeVisible();
  expect(faults).toEqual([]);
});

test("a forged request for a trace is answered with a problem that names the field", async ({
  page,
}) => {
  await signIn(page, "engineer@saltmarsh.example");
  const sweep = await findSweep(page);
  for (const [query, field] of [
    ["0?fromHz=2&toHz=1", "toHz"],
    ["0?fromHz=1&toHz=1", "toHz"],
    ["0?fromHz=abc&toHz=1", "fromHz"],
    ["0?fromHz=-1&toHz=1", "fromHz"],
    ["0?fromHz=1&toHz=NaN", "toHz"],
    ["0?fromHz=1&toHz=Infinity", "toHz"],
    ["0?fromHz=1&toHz=1e400", "toHz"],
    ["0", "fromHz"],
    ["0?fromHz=1&toHz=1e9&columns=1000000000", "columns"],
    ["0?fromHz=1&toHz=1e9&columns=0", "columns"],
    ["0?fromHz=1&toHz=1e9&columns=many", "columns"],
    ["0?fromHz=1&toHz=1e9&columns=10.5", "columns"],
    ["0?fromHz=1&toHz=1e9&scale=wave", "scale"],
    ["-1?fromHz=1&toHz=1e9", "position"],
    ["x?fromHz=1&toHz=1e9", "position"],
  ] as const) {
    const answer = await page.request.get(`/api/v1${sweep}/traces/${query}`);
    expect(answer.status(), query).toBe(422);
    expect(answer.headers()["content-type"], query).toBe("application/problem+json");
    const { fieldErrors } = (await answer.json()) as { fieldErrors: Record<string, string> };
    expect(Object.keys(fieldErrors), query).toContain(field);
  }
  for (const path of [
    `/api/v1${sweep}/traces/9999?fromHz=1&toHz=1e9`,
    "/api/v1/sweeps/not-an-id/traces/0?fromHz=1&toHz=1e9",
    "/api/v1/sweeps/not-an-id/file",
    "/api/v1/reports/not-an-id/pdf",
  ]) {
    const answer = await page.request.get(path);
    expect(answer.status(), path).toBe(404);
    expect(answer.headers()["content-type"], path).toBe("application/problem+json");
  }
});
