import type { Page } from "@playwright/test";
import { expect } from "@playwright/test";
import { addTransducer } from "./bench-work";

const ANTENNA = "Frequency [MHz]\tFactor [dB/m]\n30\t11\n80\t8\n320\t12\n1280\t20\n";
const CABLE = "Frequency [MHz]\tLoss [dB]\n30\t0.8\n40\t1\n640\t3\n1280\t4\n";

const pathOf = (page: Page) => new URL(page.url()).pathname;

/**
 * A radiated mask of the team from memory, 40 dBµV/m at 3 m from 30 to 230 MHz and 47 above,
 * quasi-peak; returns its path.
 */
export async function importMask(page: Page, title: string): Promise<string> {
  const flat = (startHz: number, stopHz: number, db: number) => ({
    startHz,
    stopHz,
    startDb: db,
    stopDb: db,
    interpolation: "log",
  });
  const mask = {
    format: "neap-mask",
    version: 1,
    key: "",
    title,
    port: "radiated",
    unit: "dBuV/m",
    distanceM: 3,
    document: "House rule 7",
    clause: "2",
    edition: "B",
    provenance: "from memory",
    note: "",
    lines: [
      {
        name: "Quasi-peak",
        detector: "quasi-peak",
        rbwHz: 120e3,
        rbwKind: "6dB",
        segments: [flat(30e6, 230e6, 40), flat(230e6, 1e9, 47)],
      },
    ],
  };
  await page.goto("/masks/import");
  await page.getByLabel("Or paste its text").fill(JSON.stringify(mask));
  await page.getByRole("button", { name: "Import mask" }).click();
  await expect(page.getByRole("heading", { name: title })).toBeVisible();
  return pathOf(page);
}

/** A program that names one mask, with a build; returns the paths of both. */
export async function makeProgram(page: Page, names: { program: string; mask: string }) {
  await page.goto("/programs/new");
  await page.getByLabel("Name", { exact: true }).fill(names.program);
  await page.getByLabel("Target margin in dB").fill("6");
  await page.getByRole("button", { name: "Create program" }).click();
  await expect(page.getByRole("heading", { name: names.program })).toBeVisible();
  const program = pathOf(page);
  await page.goto(`${program}/edit`);
  await page.getByLabel("Search masks").fill(names.mask);
  await page.getByRole("checkbox", { name: names.mask }).check();
  await page.getByRole("button", { name: "Store masks" }).click();
  await expect(page.getByText("Masks stored.")).toBeVisible();
  await page.goto(program);
  await page.getByLabel("Build", { exact: true }).fill("K1");
  await page.getByRole("button", { name: "Add build" }).click();
  await page.getByRole("cell", { name: "K1" }).getByRole("link").click();
  await expect(page.getByRole("heading", { name: `${names.program} K1` })).toBeVisible();
  return { program, build: pathOf(page) };
}

/** A bench at 3 m that adds 12 dB at 160 MHz and 19 dB at 640 MHz; returns its path. */
export async function makeBench(page: Page, name: string): Promise<string> {
  await page.goto("/benches/new");
  await page.getByLabel("Name", { exact: true }).fill(name);
  await page.getByLabel("Measuring distance in m").fill("3");
  await page.getByLabel("Guard in dB").fill("4");
  await page.getByRole("button", { name: "Create bench" }).click();
  await expect(page).toHaveURL(/\/signal-path$/);
  await addTransducer(page, { name: "Whip on the quay", kind: "antenna", table: ANTENNA });
  const cable = await addTransducer(page, { name: "Reed cable", kind: "cable", table: CABLE });
  await expect(cable.getByRole("status")).toContainText("4 rows read");
  await page.getByRole("button", { name: "Save as revision" }).click();
  await expect(page.getByRole("rowheader", { name: "Reed cable" })).toBeVisible();
  return pathOf(page);
}
