import { devices } from "@playwright/test";
import { expect, makeRun, signedIn, test } from "@/tests/browser/support";

const { viewport: _viewport, defaultBrowserType: _type, ...phone } = devices["iPhone 13"];
test.use({ ...phone, viewport: { width: 390, height: 844 }, browserName: "chromium" });

test("On a phone every screen fits its width, and the line runs down the page", async ({ page }) => {
  await signedIn(page, "ines.hartwell");
  const address = await makeRun(page, "A run with a rather long name that will not fit on the bar of any phone");
  for (const path of [
    "/runs",
    "/cables",
    "/notices",
    "/limits",
    "/runs/new",
    address,
    `${address}/match`,
    "/sign-in",
  ]) {
    await page.goto(path);
    await page.waitForLoadState("networkidle");
    const overflow = await page.evaluate(
      () => document.documentElement.scrollWidth - document.documentElement.clientWidth,
    );
    expect(overflow, `${path} is wider than the phone`).toBeLessThanOrEqual(0);
  }
  await page.goto(address);
  const piece = page.getByRole("button", { name: /1 of 1, C50-F10/ }).locator("visible=true");
  const box = await piece.boundingBox();
  expect(box?.height ?? 0).toBeGreaterThan(box?.width ?? 0);
  await piece.click();
  await page.getByLabel("Length", { exact: true }).fill("20");
  await expect(page.getByText("20.00").locator("visible=true").first()).toBeVisible();
});
