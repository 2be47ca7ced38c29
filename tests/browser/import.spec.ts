/** Many entries at once: a list as somebody keeps it, read, looked at, brought in; what was brought in, taken out again. */
import { readFile } from "node:fs/promises";
import AxeBuilder from "@axe-core/playwright";
import { expect, signedIn, test } from "@/tests/browser/support";

const mark = (browserName: string, project: string) => `${browserName}-${project}`.replace(/\W/g, "").slice(0, 12);

const sheet = (name: string) =>
  [
    'Type,Description,Family,"Z0 (Ohm)",VF %,Cap. pF/m,Loop resistance Ω/km,Loss 10 MHz (dB/100m),Loss 100 MHz (dB/100m)',
    `${name}-50,50 ohm feeder,coax,50,85,78.5,8.6,1.27,4.1`,
    `${name}-75,imported row,coax,75,83,67,,,`,
    `${name}-1,nothing but a name,coax,50,,,,,`,
  ].join("\r\n");

test("A librarian brings in a list: the contradiction goes into quarantine, the rest are drafts", async ({
  page,
  browserName,
}, info) => {
  const name = `IMP${mark(browserName, info.project.name)}`;
  await signedIn(page, "libby.thornquist");
  await page.goto("/cables");
  await page.getByText("Take out, bring in").click();
  await page.getByRole("link", { name: "Bring in cables" }).click();
  await expect(page.getByRole("heading", { level: 1, name: "Bring in cables" })).toBeVisible();
  const file = { name: "old list.csv", mimeType: "text/csv", buffer: Buffer.from(sheet(name)) };
  await page.getByLabel("Choose a file").setInputFiles(file);
  const bringIn = page.getByRole("button", { name: "Bring in 1 draft and 1 in quarantine" });
  await expect(bringIn).toBeVisible();
  await expect(page.getByText("Nothing is stored yet.")).toBeVisible();
  await expect(page.getByRole("row", { name: new RegExp(`${name}-75`) })).toContainText("Quarantined");
  await expect(page.getByRole("row", { name: new RegExp(`${name}-1\\b`) })).toContainText("No entry");
  const { violations } = await new AxeBuilder({ page }).analyze();
  const serious = violations.filter(({ impact }) => impact === "serious" || impact === "critical");
  expect(serious.map(({ id, nodes }) => `${id} ${nodes[0]?.html}`)).toEqual([]);
  await bringIn.click();
  await expect(page.getByText("Brought in: 1 draft and 1 in quarantine.")).toBeVisible();
  await page.getByRole("link", { name: `${name}-75` }).click();
  await expect(page.getByRole("heading", { level: 1, name: `${name}-75` })).toBeAttached();
  await expect(page.getByText("Quarantined, revision 1")).toBeVisible();
});

test("A file that is no table is refused in words", async ({ page }) => {
  await signedIn(page, "libby.thornquist");
  await page.goto("/cables/import");
  const file = { name: "list.xlsx", mimeType: "application/zip", buffer: Buffer.from([0x50, 0x4b, 3, 4, 0, 0]) };
  await page.getByLabel("Choose a file").setInputFiles(file);
  await expect(page.getByText(/save the sheet as CSV/)).toBeVisible();
});

test("A designer takes the catalogue out, but is not offered to bring one in", async ({ page }) => {
  await signedIn(page, "ines.hartwell");
  await page.goto("/cables");
  await page.getByText("Take out", { exact: true }).click();
  await expect(page.getByRole("link", { name: "Bring in cables" })).toHaveCount(0);
  const started = page.waitForEvent("download");
  await page.getByRole("link", { name: "All cables as CSV" }).click();
  const download = await started;
  expect(download.suggestedFilename()).toMatch(/^catalogue-[\d-]+\.csv$/);
  expect(await readFile(await download.path(), "utf8")).toContain("C50-F10");
  expect((await page.goto("/cables/import"))?.status()).toBe(404);
});

test("An entry shows its measured lot against the model, and takes evidence that is what it says", async ({
  page,
  browserName,
}, info) => {
  await signedIn(page, "nils.ferrant");
  await page.goto("/cables/c50-f10");
  const lots = page.locator("section", { has: page.getByRole("heading", { name: "Measured lots" }) });
  await expect(lots.getByText("Q-114")).toBeVisible();
  await expect(lots.getByText("0.843", { exact: true })).toBeVisible();
  const evidence = page.locator("section", { has: page.getByRole("heading", { name: "Evidence" }) });
  await evidence.getByText("Add a file").click();
  const title = `Sweep of 20 m, ${mark(browserName, info.project.name)} ${Date.now()}`;
  await evidence.getByLabel("Title, issue and page").fill(title);
  const input = evidence.getByLabel("Choose a file");
  await input.setInputFiles({ name: "no.pdf", mimeType: "application/pdf", buffer: Buffer.from("%PDF-1.7 but not") });
  await evidence.getByRole("button", { name: "Add", exact: true }).click();
  await expect(evidence.getByText(/whatever its name says/)).toBeVisible();
  const sweep = `! ${title}\n# MHz S DB R 50\n10 -30 0\n20 -31 5\n`;
  await input.setInputFiles({ name: "sweep.s1p", mimeType: "text/plain", buffer: Buffer.from(sweep) });
  await evidence.getByRole("button", { name: "Add", exact: true }).click();
  await expect(evidence.getByText(title)).toBeVisible();
});
