import { expect, test } from "@playwright/test";
import { expectAccessible } from "./accessibility";
import { signIn } from "./sign-in";

const DEFERRAL = "Only an accredited test lab and the applicable edition of the standard decide.";

test("whoever is not signed in is sent to the sign-in page, and a wrong password is told there", async ({
  page,
}) => {
  await page.goto("/programs");
  await expect(page).toHaveURL(/\/sign-in$/);
  await expect(page.getByText(DEFERRAL)).toBeVisible();
  await expectAccessible(page);
  await page.getByLabel("E-mail").fill("engineer@saltmarsh.example");
  await page.getByLabel("Password").fill("not the password");
  await page.getByRole("button", { name: "Sign in" }).click();
  await expect(page.getByText("The address or the password is not right")).toBeVisible();
  await expect(page.getByLabel("E-mail")).toHaveValue("engineer@saltmarsh.example");
});

test("an engineer makes a program and its build, after a clear word about what was missing", async ({
  page,
}) => {
  await signIn(page, "engineer@saltmarsh.example");
  await expectAccessible(page);
  await page.getByRole("link", { name: "New program" }).click();
  await page.getByLabel("Name", { exact: true }).fill("Dunlin");
  await page.getByRole("button", { name: "Create program" }).click();
  await expect(page.getByText("State the target margin in dB.")).toBeVisible();
  await expect(page.getByLabel("Target margin in dB")).toBeFocused();
  await expect(page.getByLabel("Name", { exact: true })).toHaveValue("Dunlin");
  await page.getByLabel("Target margin in dB").fill("2,5");
  await page.getByRole("button", { name: "Create program" }).click();
  await expect(page.getByRole("heading", { name: "Dunlin", level: 1 })).toBeVisible();
  await expect(page.getByText("+2.5 dB")).toBeVisible();
  await page.getByLabel("Build", { exact: true }).fill("D1");
  await page.getByRole("button", { name: "Add build" }).click();
  await expect(page.getByRole("cell", { name: "D1" })).toBeVisible();
  await expectAccessible(page);
});

test("a liaison reads programs and meets a clear refusal instead of the form", async ({ page }) => {
  await signIn(page, "liaison@saltmarsh.example");
  await expect(page.getByRole("link", { name: "New program" })).toHaveCount(0);
  await page.goto("/programs/new");
  await expect(page.getByText("Your role in this team may read programs")).toBeVisible();
  await page.goto("/team");
  await expect(page.getByText("Only an admin of your team sees its people.")).toBeVisible();
});

test("an admin sees the people, and another team sees none of our programs", async ({ page }) => {
  await signIn(page, "admin@saltmarsh.example");
  await page.getByRole("link", { name: "Team" }).click();
  await expect(page.getByRole("cell", { name: "manager@saltmarsh.example" })).toBeVisible();
  await expectAccessible(page);
  await page.goto("/");
  await page.getByRole("link", { name: "Gannet" }).click();
  await expect(page.getByRole("heading", { name: "Gannet", level: 1 })).toBeVisible();
  const address = page.url();
  await page.getByRole("button", { name: "Sign out" }).click();
  await expect(page).toHaveURL(/\/sign-in$/);
  await signIn(page, "admin@fenwick.example");
  await expect(page.getByRole("link", { name: "Sluice" })).toBeVisible();
  await expect(page.getByRole("link", { name: "Gannet" })).toHaveCount(0);
  await page.goto(address);
  await expect(page.getByRole("heading", { name: "Nothing is charted here" })).toBeVisible();
});
