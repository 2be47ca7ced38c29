import AxeBuilder from "@axe-core/playwright";
import type { Page } from "@playwright/test";
import { expect, signedIn, test } from "@/tests/browser/support";

/** A sheet's table as a spreadsheet of another country copies it; the row at 450 MHz is mistyped. */
const table = [
  "MHz\tdB/100 m",
  ...["5\t1,37", "10\t1,94", "50\t4,40", "100\t6,28", "200\t8,98"],
  ...["450\t11,92", "900\t19,85", "1500\t26,18", "3000\t38,48"],
].join("\n");

const checks = (page: Page) => page.getByRole("list", { name: "Checks" });

/** A name no other test of this run uses: drafts stay in the demo's catalogue. */
const fresh = () => `X-${Date.now().toString(36)}`;

async function fillSheet(page: Page, designation: string): Promise<void> {
  await page.getByLabel("Designation").fill(designation);
  await page.getByLabel("Diameter of the inner conductor").fill("1.02");
  await page.getByLabel("Diameter of the dielectric").fill("4.6 mm");
  await page.getByLabel("Permittivity").fill("1.4516");
  await page.getByLabel("Impedance", { exact: true }).fill("75");
  await page.getByLabel("Velocity factor", { exact: true }).fill("83 %");
  await page.getByLabel("Capacitance", { exact: true }).fill("67 pF/m");
  await page.getByLabel("Dc resistance, loop").fill("30.1");
  await page.getByLabel("Dc resistance, one conductor").fill("21.1 Ω/km");
}

async function isClean(page: Page): Promise<void> {
  const { violations } = await new AxeBuilder({ page }).analyze();
  expect(violations.map(({ id, nodes }) => `${id}: ${nodes[0]?.html ?? ""}`)).toEqual([]);
}

test("A librarian pastes a data sheet, is told what contradicts it, corrects it and sends it for review", async ({
  page,
}) => {
  const designation = fresh();
  await signedIn(page, "libby.thornquist");
  await page.goto("/cables");
  await page.getByRole("link", { name: "New cable" }).click();
  await page.waitForURL(/\/cables\/new$/);
  await fillSheet(page, designation);
  await page.getByLabel(/Paste rows from a spreadsheet/).fill(table);
  await expect(page.getByText("9 rows read as frequency in MHz, loss in dB/100 m, decimal commas.")).toBeVisible();

  await expect(checks(page)).toContainText(
    "The odd one is the capacitance: 67.0 pF/m is stated, the rest say 53.6 pF/m.",
  );
  await expect(checks(page)).toContainText("that of solid polyethylene");
  await expect(checks(page)).toContainText(/The row at 450\sMHz gives 11\.92 dB\/100 m, 1\d\.\d % below/);
  await expect(page.getByText(/things to look at/).first()).toBeVisible();

  await page.getByRole("button", { name: "Save as a draft" }).click();
  await page.waitForURL(/\/cables\/[^/]+\/edit$/);
  await expect(page.getByRole("heading", { level: 1 })).toContainText(`${designation}, draft of revision 1`);

  await page.getByLabel("Capacitance", { exact: true }).fill("53.6");
  await page.getByLabel("Loss of row 6").fill("13.72");
  await expect(checks(page)).toContainText("Every row goes with the others.");
  await expect(page.getByText("agrees with itself")).toBeVisible();
  await expect(page.getByText("Saved", { exact: true })).toBeVisible();
  await isClean(page);

  await page.reload();
  await expect(page.getByLabel("Capacitance", { exact: true })).toHaveValue("53.6");
  await expect(page.getByLabel("Loss of row 6")).toHaveValue("13.72");

  await page.getByRole("button", { name: "Send for review" }).click();
  await page.getByLabel("What the reviewer should know").fill("Capacitance and one row corrected with the maker.");
  await page.getByRole("button", { name: "Send it" }).click();
  await page.waitForURL(/\/cables\/[^/]+$/);
  await expect(page.getByText("In review, revision 1").first()).toBeVisible();
});

test("What is typed of a new cable survives closing the page, and any of it can be undone", async ({ page }) => {
  await signedIn(page, "libby.thornquist");
  await page.goto("/cables/new?designation=triax%2050");
  await expect(page.getByLabel("Designation")).toHaveValue("triax 50");
  await page.getByLabel("Impedance", { exact: true }).fill("50");
  await page.getByLabel("Velocity factor", { exact: true }).fill("0.66");
  await expect(page.getByText("Kept in this browser")).toBeVisible();
  await page.reload();
  await expect(page.getByLabel("Velocity factor", { exact: true })).toHaveValue("0.66");
  await page.getByLabel("Velocity factor", { exact: true }).fill("0.7");
  await page.getByRole("button", { name: "Undo" }).click();
  await expect(page.getByLabel("Velocity factor", { exact: true })).toHaveValue("0.66");
  await page.getByRole("button", { name: "Discard" }).click();
  await page.getByRole("button", { name: "Discard it" }).click();
  await page.waitForURL(/\/cables$/);
  await page.goto("/cables/new");
  await expect(page.getByLabel("Impedance", { exact: true })).toHaveValue("");
});

test("Two librarians edit one draft: both versions are shown and nothing is lost", async ({ page, browser }, info) => {
  const designation = fresh();
  await signedIn(page, "libby.thornquist");
  await page.goto("/cables/new");
  await page.getByLabel("Designation").fill(designation);
  await page.getByLabel("Impedance", { exact: true }).fill("75");
  await page.getByLabel("Velocity factor", { exact: true }).fill("0.83");
  await page.getByRole("button", { name: "Save as a draft" }).click();
  await page.waitForURL(/\/cables\/[^/]+\/edit$/);

  const other = await (await browser.newContext({ baseURL: info.project.use.baseURL })).newPage();
  await signedIn(other, "nils.ferrant");
  await other.goto(new URL(page.url()).pathname);
  await other.getByLabel("What it is").fill("trunk of studio 2");
  await expect(other.getByText("Saved", { exact: true })).toBeVisible();

  await page.getByLabel("Capacitance", { exact: true }).fill("53.6");
  const conflict = page.getByRole("alertdialog", { name: "Two versions of this draft" });
  await expect(conflict.getByRole("row", { name: /What it is trunk of studio 2 nothing/ })).toBeVisible();
  await expect(conflict.getByRole("row", { name: /Capacitance nothing 53\.6/ })).toBeVisible();
  await conflict.getByRole("button", { name: "Keep mine, on top of theirs" }).click();
  await expect(page.getByLabel("What it is")).toHaveValue("trunk of studio 2");
  await expect(page.getByLabel("Capacitance", { exact: true })).toHaveValue("53.6");
  await expect(page.getByText("Saved", { exact: true })).toBeVisible();
  await other.context().close();
});
