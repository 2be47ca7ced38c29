import AxeBuilder from "@axe-core/playwright";
import type { Page } from "@playwright/test";
import { expect, signedIn, test } from "@/tests/browser/support";

const row = (page: Page, name: string) => page.getByRole("row", { name: new RegExp(name) });

/** Presses Tab until something with this name has the focus. */
async function tabTo(page: Page, name: RegExp, most = 60): Promise<void> {
  for (let i = 0; i < most; i++) {
    await page.keyboard.press("Tab");
    const focused = page.locator(":focus");
    const label = (await focused.getAttribute("aria-label")) ?? (await focused.textContent()) ?? "";
    if (name.test(label)) return;
  }
  throw new Error(`Tab never came to ${name}`);
}

test("A designer finds, holds two, compares, opens an entry and uses it in a run, all by the keyboard", async ({
  page,
}) => {
  await signedIn(page, "ines.hartwell");
  await page.goto("/cables");
  await page.waitForLoadState("networkidle");
  await page.keyboard.press("/");
  await expect(page.getByLabel("Search the catalogue")).toBeFocused();
  await page.keyboard.type("lowloss 50 ohm");
  await expect(page.getByText("Read as lowloss, 50 Ω")).toBeVisible();
  await expect(row(page, "C50-F10")).toBeVisible();

  await page.keyboard.press("ArrowDown");
  const first = page.locator("[data-cable]").first();
  await expect(first.getByRole("link").first()).toBeFocused();
  await page.keyboard.press("h");
  await page.keyboard.press("ArrowDown");
  await page.keyboard.press("h");
  await expect(page).toHaveURL(/held=.*held=/);
  const tray = page.getByRole("complementary", { name: "Held up to compare" });
  await expect(tray).toContainText("reference");
  await expect(tray).toContainText("%");

  await tabTo(page, /^Open side by side$/);
  await page.keyboard.press("Enter");
  const comparison = page.getByRole("dialog", { name: "Side by side" });
  await expect(comparison.getByRole("row", { name: /Loss at 100 MHz/ })).toContainText(/[+−]\d+\s%/);
  await page.keyboard.press("Escape");
  await expect(comparison).toBeHidden();

  await page.keyboard.press("/");
  await page.keyboard.press("ArrowDown");
  await page.keyboard.press("Enter");
  await page.waitForURL(/\/cables\/c50-f(10|7)\?held=/);
  await expect(page.getByRole("button", { name: "Held: put back" })).toBeVisible();
  await tabTo(page, /^Use in a run$/);
  await page.keyboard.press("Enter");
  await page.waitForURL(/\/runs\/new\?cable=c50-f/);
  await expect(page.getByLabel("First cable")).toHaveValue(/c50-f/);
});

test("A search with its ranges and what is held up can be sent: the address opens the same again", async ({ page }) => {
  await signedIn(page, "ines.hartwell");
  await page.goto("/cables");
  await page.waitForLoadState("networkidle");
  await page.getByRole("slider", { name: "Impedance, at most" }).focus();
  for (let i = 0; i < 30; i++) await page.keyboard.press("ArrowLeft");
  await page.getByLabel("Outer diameter, typed upper end").fill("0.3 in");
  await page.getByLabel("Loss at", { exact: true }).fill("160 MHz");
  await expect(page).toHaveURL(/at=160000000.*z0=\.\.\d+.*od=\.\.7\.62/);
  await page.getByRole("combobox", { name: "Sort" }).selectOption("loss");
  await expect(row(page, "C50-F10")).toBeHidden();
  await row(page, "C50-F7").getByRole("button", { name: "Hold C50-F7 to compare" }).click();
  await row(page, "C50-S5").getByRole("button", { name: "Hold C50-S5 to compare" }).click();
  await expect(page.getByText("Held up to compare").first()).toBeVisible();
  const names = await page
    .locator("[data-cable]")
    .evaluateAll((rows) => rows.map((one) => one.getAttribute("data-cable")));
  expect(names.length).toBeGreaterThan(1);

  const sent = page.url();
  await page.goto("/runs");
  await page.goto(sent);
  await expect(page.locator("[data-cable]")).toHaveCount(names.length);
  expect(
    await page.locator("[data-cable]").evaluateAll((rows) => rows.map((one) => one.getAttribute("data-cable"))),
  ).toEqual(names);
  await expect(page.getByLabel("Outer diameter, typed upper end")).toHaveValue("7.62");
  await expect(page.getByRole("complementary", { name: "Held up to compare" })).toContainText("C50-S5");
});

test("The search comes back when one comes back from an entry", async ({ page }) => {
  await signedIn(page, "ines.hartwell");
  await page.goto("/cables");
  await page.getByLabel("Search the catalogue").fill("mast feeder");
  await row(page, "C50-F28").getByRole("link").first().click();
  await page.waitForURL(/\/cables\/c50-f28/);
  await page.goBack();
  await expect(page.getByLabel("Search the catalogue")).toHaveValue("mast feeder");
  await expect(page.getByText("Read as mast, feeder")).toBeVisible();
  await expect(row(page, "C50-F28")).toBeVisible();
});

test("A fifth cable asks which of the four goes back", async ({ page }) => {
  await signedIn(page, "ines.hartwell");
  await page.goto("/cables?held=c50-f10&held=c50-f7&held=c50-f28&held=c50-s5");
  await row(page, "C75-F7").hover();
  await page.keyboard.press("h");
  const question = page.getByRole("dialog", { name: "Which cable goes back?" });
  await expect(question).toContainText("Which goes back for C75-F7?");
  await question.getByRole("button", { name: /C50-F7/ }).click();
  await expect(page).toHaveURL(/held=c50-f10&held=c75-f7&held=c50-f28&held=c50-s5/);
});

test("Nothing found tells what to leave out, with how many that gives, and what cannot be read leaves the search as it was", async ({
  page,
}) => {
  await signedIn(page, "ines.hartwell");
  await page.goto("/cables?q=foam&z0=60..70");
  await expect(page.getByText("No cable fits “foam” within these filters.")).toBeVisible();
  await page.getByRole("button", { name: /Without the range of impedance: \d+ cables/ }).click();
  await expect(page.locator("[data-cable]").first()).toBeVisible();
  await page.getByLabel("Impedance, typed lower end").fill("seventy");
  await expect(page.getByText("“seventy” is not a resistance. Try 50 Ω.")).toBeVisible();
  await expect(page).not.toHaveURL(/z0=/);
});

test("An entry says what lies beyond its data, follows the temperature, and names what takes its place", async ({
  page,
}) => {
  await signedIn(page, "ines.hartwell");
  await page.goto("/cables/c50-f10");
  const reading = (name: string) => page.locator("dl > div").filter({ hasText: name });
  await expect(reading("Loss at 100 MHz")).toContainText("4.13");
  await expect(page.getByText("beyond the data", { exact: true })).toBeVisible();
  await page.getByLabel("Temperature").fill("45");
  // Resistivity +9.825 %: the dc resistance by that, 8.61 to 9.46 mΩ/m.
  await expect(reading("Loop resistance")).toContainText("9.46");
  await expect(page.getByText(/Slope used: that of the resistivity/)).toContainText("×1.098");
  await expect(reading("Loss at 100 MHz")).toContainText("4.3");
  await page.getByLabel("Loss at", { exact: true }).fill("2.4 GHz");
  await expect(reading("Loss at 2.4 GHz")).toContainText("beyond the data");
  await page.getByLabel("Temperature").fill("120");
  await expect(page.getByText("Beyond the data: the cable is rated for −40 to 85 °C.")).toBeVisible();
  await expect(page).toHaveURL(/at=2400000000&t=120/);
  await page.getByRole("button", { name: "Figures" }).first().click();
  await expect(page.getByRole("row", { name: /^100 4\.1/ })).toBeVisible();

  await page.goto("/cables/c50-s10");
  await expect(page.getByText(/Superseded by/)).toContainText("velocity factor 0.659 → 0.850");
  await expect(page.getByRole("button", { name: "Use in a run" })).toHaveAttribute("aria-disabled", "true");
  await page.getByRole("link", { name: "C50-F10" }).click();
  await page.waitForURL(/\/cables\/c50-f10/);
});

for (const theme of ["paper", "tar"])
  test(`Catalogue, comparison and entries have no serious fault of accessibility (${theme})`, async ({
    page,
    context,
    baseURL,
  }) => {
    await context.addCookies([{ name: "theme", value: theme, url: baseURL ?? "" }]);
    await signedIn(page, "ines.hartwell");
    for (const path of [
      "/cables?held=c50-f10&held=c50-f7",
      "/cables?held=c50-f10&held=c50-f7&compare=open",
      "/cables?q=foam&z0=60..70",
      "/cables/c50-f10",
      "/cables/c50-s10?t=-90&at=9000000000",
      "/cables/p100-u4",
    ]) {
      await page.goto(path);
      await page.waitForLoadState("networkidle");
      const { violations } = await new AxeBuilder({ page }).analyze();
      const serious = violations.filter(({ impact }) => impact === "serious" || impact === "critical");
      expect(serious.map(({ id, nodes }) => `${path} ${id}: ${nodes[0]?.html}`)).toEqual([]);
    }
  });

test.describe("On a phone", () => {
  test.use({ viewport: { width: 390, height: 844 }, hasTouch: true });

  test("facets are cards, cables are held and compared by touch, and nothing is wider than the screen", async ({
    page,
  }) => {
    await signedIn(page, "ines.hartwell");
    await page.goto("/cables");
    await page.waitForLoadState("networkidle");
    await page.getByRole("button", { name: /^Outer, mm/ }).tap();
    await page.getByLabel("Outer diameter, typed upper end").fill("8");
    await expect(page).toHaveURL(/od=\.\.8/);
    await page.getByRole("button", { name: "Hold C50-F7 to compare" }).tap();
    await page.getByRole("button", { name: "Hold C50-S5 to compare" }).tap();
    await page.getByRole("button", { name: "Compare 2" }).tap();
    await expect(page.getByRole("dialog", { name: "Side by side" })).toContainText("Loss at 100 MHz");
    await page.getByRole("button", { name: "Close" }).tap();
    await row(page, "C50-F7").getByRole("link").first().tap();
    await page.waitForURL(/\/cables\/c50-f7/);
    for (const path of ["/cables", "/cables/c50-f7", "/cables/p100-s4", "/cables/c75-d7"]) {
      await page.goto(path);
      await page.waitForLoadState("networkidle");
      const wider = await page.evaluate(
        () => document.documentElement.scrollWidth - document.documentElement.clientWidth,
      );
      expect(wider, `${path} is wider than the phone`).toBeLessThanOrEqual(0);
    }
  });
});
