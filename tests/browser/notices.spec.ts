import AxeBuilder from "@axe-core/playwright";
import { expect, signedIn, test } from "@/tests/browser/support";

test("A librarian sees in the bar that something waits, reads it, and the bar knows", async ({ page }) => {
  await signedIn(page, "nils.ferrant");
  await page.goto("/cables");
  const link = page.getByRole("link", { name: /^Notices \d+ unread$/ });
  await expect(link).toBeVisible();
  const before = Number(/\d+/.exec((await link.getAttribute("aria-label")) ?? "")?.[0]);
  await link.click();
  await expect(page).toHaveURL(/\/notices$/);
  await expect(page.getByRole("heading", { level: 1, name: "Notices" })).toBeVisible();
  await page.getByRole("link", { name: /sent revision 1 of T100-H1 for review/ }).click();
  await expect(page).toHaveURL(/\/cables\/t100-h1$/);
  const left = before === 1 ? "Notices" : `Notices ${before - 1} unread`;
  await expect(page.getByRole("link", { name: left, exact: true })).toBeVisible();
  await page.goto("/notices");
  await expect(page.getByRole("link", { name: /^Libby Thornquist sent revision 1 of T100-H1/ })).toBeVisible();
});

test("All notices are read at a word, and stay read", async ({ page }) => {
  await signedIn(page, "libby.thornquist");
  await page.goto("/notices");
  await page.getByRole("button", { name: "Mark all as read" }).click();
  await expect(page.getByText("All read")).toBeVisible();
  await page.reload();
  await expect(page.getByText("All read")).toBeVisible();
  await expect(page.getByRole("link", { name: "Notices", exact: true })).toBeVisible();
});

test("Whoever has not been told anything is told what will stand there", async ({ page }) => {
  await signedIn(page, "cormac.dray");
  await page.goto("/notices");
  await expect(page.getByText("Nothing to tell you yet")).toBeVisible();
  await expect(page.getByRole("link", { name: "Letters of the team" })).toHaveCount(0);
  const answer = await page.goto("/team/letters");
  expect(answer?.status()).toBe(404);
});

test("An auditor finds the letters of the team, and that none goes out without a mail server", async ({ page }) => {
  await signedIn(page, "iris.penhallow");
  await page.goto("/notices");
  await page.getByRole("link", { name: "Letters of the team" }).click();
  await expect(page).toHaveURL(/\/team\/letters$/);
  await expect(page.getByText("No mail server is set")).toBeVisible();
  const { violations } = await new AxeBuilder({ page }).analyze();
  expect(violations.filter(({ impact }) => impact === "serious" || impact === "critical")).toEqual([]);
});
