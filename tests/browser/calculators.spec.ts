import AxeBuilder from "@axe-core/playwright";
import { devices, type Page } from "@playwright/test";
import { expect, signedIn, test } from "@/tests/browser/support";

const pages = ["", "/per-length", "/attenuation", "/mismatch", "/length", "/stub", "/pad"].map((p) => `/calculate${p}`);
const notNumbers = /NaN|Infinity|undefined|null/;

const reading = (page: Page, label: string) =>
  page.locator("dl > div").filter({ has: page.getByText(label, { exact: true }) });

test("The calculators are found from the bar and by their keys, each with a drawing and a sentence", async ({
  page,
}) => {
  await signedIn(page, "ines.hartwell");
  await page.goto("/runs");
  await page.getByRole("link", { name: "Calculate" }).first().click();
  await expect(page.getByRole("heading", { level: 1, name: "Calculate" })).toBeVisible();
  await expect(page.getByRole("heading", { level: 2 })).toHaveCount(6);
  await page.keyboard.press("6");
  await expect(page.getByRole("heading", { level: 1, name: "Resistive pad" })).toBeVisible();
  await page.keyboard.press("1");
  await expect(page.getByRole("heading", { level: 1, name: "Per-length figures" })).toBeVisible();
});

test("Three per-length figures that contradict one another are said to, by how much, and the address can be sent", async ({
  page,
}) => {
  await signedIn(page, "libby.thornquist");
  await page.goto("/calculate/per-length");
  await page.getByLabel("Impedance", { exact: true }).fill("75");
  await page.getByLabel("Velocity factor", { exact: true }).fill("83");
  await expect(page.getByText("= 0.83, read as per cent")).toBeVisible();
  await page.getByLabel("Capacitance", { exact: true }).fill("67 pF/m");
  await expect(page.getByText(/make the capacitance 53\.6/)).toContainText("+25.0");
  await expect(page.getByRole("row", { name: /the velocity factor, if it is 0.664/ })).toContainText(
    "solid polyethylene",
  );
  await page.getByLabel("Inductance", { exact: true }).fill("301");
  await expect(page.getByText("Without the capacitance the others agree")).toBeVisible();

  const address = page.url();
  expect(address).toContain("z0=75&vf=83&delay=&c=67+pF%2Fm&l=301");
  await signedIn(page, "nils.ferrant");
  await page.goto(address);
  await expect(page.getByLabel("Velocity factor", { exact: true })).toHaveValue("83");
  await expect(page.getByText("Without the capacitance the others agree")).toBeVisible();
});

test("A length is worked out for a cable chosen by keyboard, survives a slip, and starts a run", async ({ page }) => {
  await signedIn(page, "ines.hartwell");
  await page.goto("/calculate/attenuation");
  await page.getByRole("button", { name: "Cable", exact: true }).focus();
  await page.keyboard.press("Enter");
  await expect(page.getByRole("listitem").filter({ hasText: "C50-F10" })).toBeVisible();
  await page.route(/q=C50-S5/, async (route) => {
    await new Promise((resolve) => setTimeout(resolve, 600));
    await route.continue();
  });
  await page.getByLabel("Search the catalogue").fill("C50-S5");
  // Keys that come before the answer never take a cable of the search before.
  for (const key of ["ArrowDown", "ArrowDown", "Enter"]) await page.keyboard.press(key);
  await expect(page.getByLabel("Search the catalogue")).toBeFocused();
  await expect(page.locator("ul[aria-busy=false]").filter({ hasText: "C50-S5" })).toBeVisible();
  await page.keyboard.press("ArrowDown");
  await page.keyboard.press("ArrowDown");
  await page.keyboard.press("Enter");
  await expect(page.getByRole("button", { name: "Cable", exact: true })).toHaveText("C50-S5");
  await expect(page.getByRole("button", { name: "Cable", exact: true })).toBeFocused();

  await page.getByLabel("Length", { exact: true }).fill("118 ft");
  await page.getByLabel("Frequency", { exact: true }).fill("27.2 MHz");
  await expect(page.getByText("= 35.9664 m")).toBeVisible();
  await expect(reading(page, "Attenuation")).toContainText("2.97");
  await page.getByLabel("Length", { exact: true }).fill("118 furlongs");
  await expect(page.getByText("“furlongs” is not a unit of length. Try 36 m or 118 ft.")).toBeVisible();
  await expect(reading(page, "Attenuation")).toContainText("2.97");
  await expect(page.getByText("Until every field is right")).toBeVisible();
  await page.getByLabel("Length", { exact: true }).fill("36 m");
  await page.getByLabel("Temperature", { exact: true }).fill("45");
  await expect(page.getByText(/by the resistivity of the conductors, ×1\.098/)).toBeVisible();
  await page.getByRole("button", { name: "Figures" }).click();
  await expect(page.getByRole("row", { name: /1 MHz/ }).first()).toBeVisible();

  await page.getByRole("link", { name: "Start a run with this" }).click();
  await page.waitForURL(/\/runs\/new\?cable=c50-s5/);
  await expect(page.getByLabel("Length", { exact: true })).toHaveValue("36 m");
  await page.getByLabel("Name", { exact: true }).fill("From a calculator");
  await page.getByRole("button", { name: "Start the run" }).click();
  await page.waitForURL(/\/runs\/[0-9a-f-]{36}$/);
  await expect(page.getByRole("button", { name: /1 of 1, C50-S5, 36.00 metres/ })).toBeVisible();
});

test("A typed cable goes into a run of its own", async ({ page }) => {
  await signedIn(page, "gwen.ostrander");
  await page.goto(
    "/calculate/length?cable=typed&z0=93&vf=0.84&r0=143&corner=333+kHz&tan=0.0003&frequency=10+MHz&wanted=λ/2",
  );
  await expect(reading(page, "Phase")).toContainText("180");
  await page.getByRole("link", { name: "Start a run with this" }).click();
  await expect(page.getByLabel("First cable")).toHaveValue("typed");
  await page.getByLabel("Name", { exact: true }).fill("A cable nobody has entered");
  await page.getByRole("button", { name: "Start the run" }).click();
  await page.waitForURL(/\/runs\/[0-9a-f-]{36}$/);
  await expect(page.getByRole("button", { name: /1 of 1, own model/ })).toBeVisible();
  await page.getByRole("link", { name: "Match" }).first().click();
  await expect(page.getByRole("link", { name: "Match" }).first()).toHaveAttribute("aria-current", "page");
  await expect(page.locator("body")).not.toContainText(notNumbers);
});

test("A mismatch reads the same from any of its figures, and the near end shows how much the line hides", async ({
  page,
}) => {
  await signedIn(page, "ines.hartwell");
  await page.goto("/calculate/mismatch?given=load&load=22-35j&reference=50&loss=3+dB&power=200+W&as=net");
  await expect(reading(page, "VSWR at the load")).toContainText("3.54");
  await expect(page.getByText(/The near end shows 1\.78 only because/)).toBeVisible();
  await expect(page.getByText(/High voltage: up to 133/)).toBeVisible();
  await expect(page.getByText(/The line loses 4\.28/)).toBeVisible();
  await page.getByLabel("Known").selectOption("returnLoss");
  await page.getByLabel("Return loss", { exact: true }).fill("9.54 dB");
  await expect(reading(page, "VSWR at the load")).toContainText("2.00");
  await page.getByLabel("Known").selectOption("gamma");
  await page.getByLabel("Reflection, |Γ|").fill("1");
  await expect(page.locator("body")).not.toContainText(notNumbers);
});

test("A stub, the stub for a part, and a section from the team's cables", async ({ page }) => {
  await signedIn(page, "ines.hartwell");
  await page.goto("/calculate/stub?cable=c50-f10&frequency=97.3+MHz&length=λ/4&end=open&across=50");
  await expect(reading(page, "Stub")).toContainText("654");
  await expect(reading(page, "Takes from the line")).toContainText(/44\.[0-9]/);
  await page.getByLabel("Reactance wanted").fill("132 pF");
  await expect(page.getByRole("row", { name: /^Open/ }).first()).toBeVisible();
  await expect(page.getByText("Yes: two of P120-B1 side by side")).toBeVisible();
  await page.getByLabel("to", { exact: true }).fill("50 Ω");
  await expect(page.getByText(/Yes: C50-/)).toBeVisible();
  await page.getByRole("link", { name: "Start a run with this" }).click();
  await expect(page.getByLabel(/With a stub of the same cable, 654/)).toBeChecked();
});

test("A pad below the least loss is refused with the least, which one press takes", async ({ page }) => {
  await signedIn(page, "owen.castlebay");
  await page.goto("/calculate/pad");
  await page.getByLabel("Loss", { exact: true }).fill("4 dB");
  await page.getByLabel("Source side").fill("75");
  await expect(page.getByText(/At least 5\.72/)).toBeVisible();
  await page.getByRole("button", { name: /Take the least loss/ }).click();
  await expect(page.getByText("At the least loss only two resistors are left")).toBeVisible();
  await expect(page.getByRole("row", { name: /Series, source side/ })).toContainText("43.30");
  await page.getByRole("link", { name: "Start a run with this" }).click();
  await expect(page.getByLabel(/With a pad of 5\.72/)).toBeChecked();
});

test("A mangled address opens with usual values and says so, and an address of another's cable too", async ({
  page,
}) => {
  await signedIn(page, "ines.hartwell");
  await page.goto("/calculate/attenuation?cable=nonesuch&length=36+parsnips&lenght=3&frequency=%00");
  await expect(page.getByText(/the address held “36 parsnips”.*The usual 100 m stands here/)).toBeVisible();
  await expect(page.getByText("The address also holds “lenght”, which means nothing here.")).toBeVisible();
  await expect(page.getByText("There is no cable “nonesuch” for you. C50-F10 stands here.")).toBeVisible();
  await expect(page.getByLabel("Length", { exact: true })).toHaveValue("100 m");
});

test("An auditor calculates but starts no run; an installer without cables types one", async ({ page }) => {
  await signedIn(page, "iris.penhallow");
  await page.goto("/calculate/length");
  await expect(page.getByRole("button", { name: "Copy the address" })).toBeVisible();
  await expect(page.getByRole("link", { name: "Start a run with this" })).toHaveCount(0);
  await signedIn(page, "cormac.dray");
  await page.goto("/calculate/attenuation");
  await expect(page.getByRole("button", { name: "Cable", exact: true })).toHaveText("Typed");
  await expect(reading(page, "Attenuation")).toContainText("dB");
});

for (const theme of ["paper", "tar"])
  test(`No calculator has a serious accessibility fault or a figure that is none on ${theme}`, async ({
    page,
    baseURL,
  }) => {
    await page.context().addCookies([{ name: "theme", value: theme, url: baseURL ?? "" }]);
    await signedIn(page, "ines.hartwell");
    for (const path of pages) {
      await page.goto(path);
      await page.waitForLoadState("networkidle");
      await expect(page.locator("main")).not.toContainText(notNumbers);
      const { violations } = await new AxeBuilder({ page }).analyze();
      const serious = violations.filter(({ impact }) => impact === "serious" || impact === "critical");
      expect(serious.map(({ id, nodes }) => `${path}: ${id} ${nodes[0]?.html}`)).toEqual([]);
    }
  });

test.describe("On a phone", () => {
  const { viewport: _viewport, defaultBrowserType: _type, ...phone } = devices["iPhone 13"];
  test.use({ ...phone, viewport: { width: 390, height: 844 } });

  test("every calculator fits the width, with fields that a thumb can press", async ({ page }) => {
    await signedIn(page, "ines.hartwell");
    for (const path of [...pages, "/calculate/attenuation?cable=typed&length=1234567+m&frequency=999.999+MHz"]) {
      await page.goto(path);
      await page.waitForLoadState("networkidle");
      const overflow = await page.evaluate(
        () => document.documentElement.scrollWidth - document.documentElement.clientWidth,
      );
      expect(overflow, `${path} is wider than the phone`).toBeLessThanOrEqual(0);
      await expect(page.locator("main")).not.toContainText(notNumbers);
      for (const box of await page
        .locator("main input, main select")
        .evaluateAll((fields) => fields.map((field) => (field.parentElement ?? field).getBoundingClientRect().height)))
        expect(box).toBeGreaterThanOrEqual(44);
    }
  });
});
