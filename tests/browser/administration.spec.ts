import { expect, test } from "@playwright/test";
import { expectAccessible } from "./accessibility";
import { signIn } from "./sign-in";

test("an engineer sets milestones and clocks, with every error at its row, and archives the program", async ({
  page,
}) => {
  await signIn(page, "engineer@saltmarsh.example");
  await page.goto("/programs/new");
  await page.getByLabel("Name", { exact: true }).fill("Knot");
  await page.getByLabel("Target margin in dB").fill("3");
  await page.getByRole("button", { name: "Create program" }).click();
  await expect(page.getByRole("heading", { name: "Knot" })).toBeVisible();
  const program = page.url();

  await page.goto(`${program}/edit`);
  await page.getByRole("button", { name: "Add milestone" }).click();
  await page.getByRole("button", { name: "Add milestone" }).click();
  const first = page.getByRole("group", { name: "Milestone 1" });
  const second = page.getByRole("group", { name: "Milestone 2" });
  await second.getByLabel("Milestone", { exact: true }).fill("Lab visit");
  await second.getByLabel("Required margin in dB").fill("2,5");
  await page.getByRole("button", { name: "Store milestones" }).click();
  await expect(first.getByText("Give it a name.")).toBeVisible();
  await expect(second.getByText("Write the date as year-month-day")).toBeVisible();
  await expectAccessible(page);
  await page.getByRole("button", { name: "Remove milestone 1" }).click();
  // The row that was second keeps its error and what was typed.
  await expect(first.getByText("Write the date as year-month-day")).toBeVisible();
  await expect(first.getByLabel("Milestone", { exact: true })).toHaveValue("Lab visit");
  await first.getByLabel("Due on").fill("2027-03-01");
  await page.getByRole("button", { name: "Store milestones" }).click();
  await expect(page.getByText("Milestones stored: 1.")).toBeVisible();
  await page.reload();
  await expect(first.getByLabel("Required margin in dB")).toHaveValue("2.5");

  await page.getByRole("button", { name: "Archive this program" }).click();
  await page.getByRole("button", { name: "Archive", exact: true }).click();
  await expect(page).toHaveURL(/\/programs$/);
  await page.goto("/programs/archived");
  await expectAccessible(page);
  await page.getByRole("button", { name: "Restore Knot" }).click();
  await expect(page.getByText("Knot is back.")).toBeVisible();
});

test("a liaison meets a clear refusal instead of the forms", async ({ page }) => {
  await signIn(page, "liaison@saltmarsh.example");
  await page.getByRole("link", { name: "Tern", exact: true }).first().click();
  await expect(page.getByRole("heading", { name: "Tern", level: 1 })).toBeVisible();
  await page.goto(`${page.url()}/edit`);
  await expect(page.getByText("may read programs, not change them")).toBeVisible();
  await expect(page.getByRole("button", { name: "Store details" })).toHaveCount(0);
  await page.goto("/team/audit");
  await expect(page.getByText("Only an admin of your team reads its audit trail.")).toBeVisible();
});

test("an admin adds a member, who changes the password and is shut out at once", async ({
  page,
  browser,
}) => {
  await signIn(page, "admin@saltmarsh.example");
  await page.goto("/team");
  const form = page.locator("form").filter({ hasText: "First password" });
  await form.getByLabel("Name").fill("Nell Sandbar");
  await form.getByLabel("E-mail").fill("nell@saltmarsh.example");
  await form.getByLabel("First password").fill("too short");
  await form.getByRole("button", { name: "Add member" }).click();
  await expect(form.getByText("Use at least 12 characters.")).toBeVisible();
  await form.getByLabel("First password").fill("paper in the drawer");
  await form.getByRole("button", { name: "Add member" }).click();
  await expect(page.getByText("Nell Sandbar is a member now.")).toBeVisible();
  await expectAccessible(page);

  const context = await browser.newContext();
  const hers = await context.newPage();
  await hers.goto("/sign-in");
  await hers.getByLabel("E-mail").fill("nell@saltmarsh.example");
  await hers.getByLabel("Password").fill("paper in the drawer");
  await hers.getByRole("button", { name: "Sign in" }).click();
  await expect(hers.getByRole("heading", { name: "Overview" })).toBeVisible();
  await hers.goto("/account");
  await expectAccessible(hers);
  await hers.getByLabel("Current password").fill("paper in the drawer");
  await hers.getByLabel("New password", { exact: true }).fill("known to Nell alone");
  await hers.getByLabel("New password again").fill("known to Nell alone");
  await hers.getByRole("button", { name: "Change password" }).click();
  await expect(hers.getByText("Your password is changed.")).toBeVisible();

  await page.getByLabel("Role of Nell Sandbar").selectOption("manager");
  await page.getByRole("button", { name: "Store the role of Nell Sandbar" }).click();
  await expect(page.getByRole("button", { name: "Store the role of Nell Sandbar" })).toHaveCount(0);
  await expect(page.getByLabel("Role of Nell Sandbar")).toHaveValue("manager");
  const row = page.getByRole("row").filter({ hasText: "Nell Sandbar" });
  await row.getByRole("button", { name: "Deactivate" }).click();
  await page.getByRole("dialog").getByRole("button", { name: "Deactivate" }).click();
  await expect(row.getByText("deactivated")).toBeVisible();
  await hers.goto("/programs");
  await expect(hers).toHaveURL(/\/sign-in$/);
  await context.close();

  await page.getByRole("link", { name: "Audit trail" }).click();
  const newest = page.getByRole("listitem").first();
  await expect(newest).toContainText("Isla Marram deactivated member Nell Sandbar");
  await newest.getByText("Details").click();
  await expect(newest).toContainText("member.deactivate");
  await expectAccessible(page);
  await page.getByLabel("Action").selectOption("member.change-role");
  await page.getByRole("button", { name: "Filter" }).click();
  await expect(page).toHaveURL(/action=member\.change-role/);
  await expect(page.getByRole("listitem").first()).toContainText("changed the role of member");
});

test("after ten wrong passwords the form asks to wait", async ({ page }) => {
  await page.goto("/sign-in");
  await page.getByLabel("E-mail").fill("nobody@saltmarsh.example");
  for (let tries = 0; tries < 10; tries++) {
    await page.getByLabel("Password").fill(`guess ${tries}`);
    const answer = page.waitForResponse(/callback\/credentials/);
    await page.getByRole("button", { name: "Sign in" }).click();
    await answer;
    await expect(page.getByText("The address or the password is not right")).toBeVisible();
  }
  await page.getByRole("button", { name: "Sign in" }).click();
  await expect(page.getByText("Too many tries. Wait some minutes and try again.")).toBeVisible();
});
