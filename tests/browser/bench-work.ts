import type { Locator, Page } from "@playwright/test";
import { expect } from "@playwright/test";

interface TransducerText {
  name: string;
  kind: string;
  /** Rows of frequency and factor, as a spreadsheet pastes them. */
  table: string;
}

/** Adds a transducer as the last of the path and gives its fieldset. */
export async function addTransducer(page: Page, transducer: TransducerText): Promise<Locator> {
  await page.getByRole("button", { name: "Add transducer" }).click();
  const group = page.getByRole("group", { name: /^\d+\. / }).last();
  await group.getByLabel("Name").fill(transducer.name);
  await group.getByLabel("Kind").selectOption(transducer.kind);
  await group.getByLabel("Factor table").fill(transducer.table);
  return group;
}

export interface UploadFile {
  name: string;
  mimeType: string;
  buffer: Buffer;
}

/** Lays files on the import page that is open, as if they were dropped. */
export async function layFiles(page: Page, files: UploadFile | UploadFile[] | string) {
  await page.getByLabel("Choose sweep files or drop them here").setInputFiles(files);
}

/** Imports one radiated sweep on the import page that is open and gives its card. */
export async function importRadiated(page: Page, bench: string, file: UploadFile) {
  await page.getByLabel("Bench", { exact: true }).selectOption({ label: bench });
  const common = page.locator("details").filter({ hasText: "Measurement settings for all files" });
  if ((await common.getAttribute("open")) === null) await common.locator("summary").click();
  await common.getByLabel("Port").selectOption("radiated");
  await common.getByLabel("RBW counted at").selectOption("6dB");
  await layFiles(page, file);
  const card = page.getByRole("article", { name: file.name });
  await expect(card.getByRole("status")).toHaveText("ready");
  await page.getByRole("button", { name: "Store 1 sweep" }).click();
  // Storing ends with the page being read anew; a machine that does more at once takes its time.
  await expect(page.getByText("1 sweep is stored.")).toBeVisible({ timeout: 20_000 });
  return card;
}
