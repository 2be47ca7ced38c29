import AxeBuilder from "@axe-core/playwright";
import { expect, makeRun, signedIn, test } from "@/tests/browser/support";

test("Many builds of a run are drawn beside the page: limits, yield, what matters most, and the same seed the same figures", async ({
  page,
}) => {
  await signedIn(page, "ines.hartwell");
  const address = await makeRun(page, "Many builds");
  await page.goto(address);
  await expect(page.getByText("Saved, revision 1")).toBeVisible();
  await page.keyboard.press("4");
  await expect(page).toHaveURL(`${address}/tolerance`);
  await expect(page.getByRole("rowheader", { name: "impedance of C50-F10" })).toBeVisible();
  await page.getByRole("button", { name: "Figures" }).first().click();
  const figures = page.getByRole("table").filter({ has: page.getByRole("columnheader", { name: "median" }) });
  const first = await figures.textContent();
  await page.getByLabel("Seed").fill("2");
  await expect.poll(() => figures.textContent()).not.toBe(first);
  await page.getByLabel("Seed").fill("1");
  await expect.poll(() => figures.textContent()).toBe(first);
  await page.getByLabel("Impedance ±").fill("200");
  await expect(page.getByText("At most 50 %.")).toBeVisible();
  await page.getByLabel("Impedance ±").fill("");
  await expect(page.getByRole("rowheader", { name: "impedance of C50-F10" })).toBeHidden();
  await expect(page.locator("body")).not.toContainText(/NaN|Infinity|undefined/);
  await expect(page.getByRole("heading", { name: "What matters most" })).toBeVisible();
  await expect(page.getByText(/Drawing \d+ builds/)).toBeHidden();
  for (const theme of ["paper", "tar"]) {
    await page.evaluate((to) => (document.documentElement.dataset.theme = to), theme);
    const { violations } = await new AxeBuilder({ page }).analyze();
    expect(violations.filter(({ impact }) => impact === "serious" || impact === "critical")).toEqual([]);
  }
  await page.setViewportSize({ width: 390, height: 844 });
  await expect.poll(() => page.evaluate(() => document.documentElement.scrollWidth)).toBeLessThanOrEqual(390);
});
