import AxeBuilder from "@axe-core/playwright";
import { expect, signedIn, test } from "@/tests/browser/support";

test("A librarian adds a limit line beside those of the standards, and takes it away again", async ({ page }) => {
  await signedIn(page, "libby.thornquist");
  await page.goto("/calculate");
  await page.getByRole("link", { name: "Limit lines" }).click();
  await expect(page).toHaveURL(/\/limits$/);
  await expect(page.getByText("Category 5e cable, insertion loss")).toBeVisible();
  await page.getByRole("button", { name: "Add a line" }).click();
  const form = page.getByRole("form", { name: "Add a limit line" });
  await form.getByLabel("Name").fill("Quayside trunk");
  await form.getByLabel("From", { exact: true }).fill("1");
  await form.getByLabel("To", { exact: true }).fill("100");
  await form.getByLabel("k1 · √f, dB").fill("1.9");
  await form.getByRole("button", { name: "Add the line" }).click();
  await expect(form.getByText("The edition is needed.")).toBeVisible();
  await form.getByLabel("Taken from").fill("House specification 12");
  await form.getByLabel("Edition").fill("3");
  await form.getByRole("button", { name: "Add the line" }).click();
  await expect(page.getByText("at most 1.9 dB at 1 MHz, 19 dB at 100 MHz, per 100 m")).toBeVisible();
  const { violations } = await new AxeBuilder({ page }).analyze();
  expect(violations.filter(({ impact }) => impact === "serious" || impact === "critical")).toEqual([]);
  await page.getByRole("button", { name: "Remove Quayside trunk" }).click();
  await page.getByRole("button", { name: "Remove the line" }).click();
  await expect(page.getByText("Quayside trunk")).toHaveCount(0);
});

test("A designer reads the lines and changes none; an installer has no such page", async ({ page }) => {
  await signedIn(page, "ines.hartwell");
  await page.goto("/limits");
  await expect(page.getByText("Category 6 channel, return loss")).toBeVisible();
  await expect(page.getByRole("button", { name: /Add a line|^Remove/ })).toHaveCount(0);
  await signedIn(page, "rhys.colborne");
  const answer = await page.goto("/limits");
  expect(answer?.status()).toBe(404);
});
