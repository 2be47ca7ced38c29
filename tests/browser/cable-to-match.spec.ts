import { expect, signIn, test } from "@/tests/browser/support";

test("A designer finds a cable by a misspelt search, builds a run, compares matches, keeps one and finds it all again", async ({
  page,
}) => {
  await signIn(page, "ines.hartwell");

  await page.getByRole("link", { name: "Catalogue" }).first().click();
  await page.getByLabel("Search the catalogue").fill("lowloss 10 milimeter");
  await expect(page.getByText("Read as lowloss, 10 mm across")).toBeVisible();
  const row = page.getByRole("row", { name: /C50-F10/ });
  await expect(row).toBeVisible();
  await expect(row).toContainText("4.13");
  await row.getByRole("link", { name: "Use in a run" }).click();

  await page.getByLabel("Name", { exact: true }).fill("Roof whip 27 MHz");
  await expect(page.getByLabel("First cable")).toHaveValue("c50-f10");
  await page.getByLabel("Length").fill("118 ft");
  await expect(page.getByText("= 35.9664 m")).toBeVisible();
  await page.getByLabel("Length").fill("36 m");
  await page.getByLabel("Frequency").fill("27.2mhz");
  await page.getByLabel("Load impedance").fill("22-35j");
  await page.getByLabel(/Available power/).fill("200 W");
  await page.getByRole("button", { name: "Start the run" }).click();

  // Scenario figures: an independent line model of the same single-term cable gives Zin 138.6+j1.8 Ω, VSWR 2.77 at the
  // source and 3.54 at the load, 0.76 dB matched loss and 1.33 dB in the line.
  await page.waitForURL(/\/runs\/[0-9a-f-]{36}$/);
  await expect(page.getByText("3.54", { exact: true })).toBeVisible();
  await page.getByRole("button", { name: /1 of 1, C50-F10/ }).click();
  const leaf = page.getByRole("region", { name: "C50-F10" });
  await expect(leaf).toContainText("138.6+j1.8");
  await expect(leaf).toContainText("0.760");
  await expect(page.getByRole("row", { name: /Mismatch and standing waves/ })).toContainText("1.65");

  await page.getByRole("link", { name: "Match", exact: true }).first().click();
  await expect(page.getByRole("checkbox", { name: /^Compare / }).nth(5)).toBeVisible();
  const columns = page.getByRole("article");
  await expect(columns).toHaveCount(4);
  await page.getByRole("checkbox", { name: "Compare Coil and capacitor, 350 nH and 129 pF" }).click();
  await expect(page.getByText("Four stand side by side already")).toBeVisible();
  const stub = page.getByRole("article", { name: /Shorted stub, 951 mm of C50-F10 269 mm from the load/ });
  await expect(stub).toContainText("0.06");
  await stub.getByRole("button", { name: /^Choose/ }).click();
  await expect(stub.getByText("Chosen for this run")).toBeVisible();
  await expect(page.getByText("Saved, revision 2")).toBeVisible();

  await page.getByRole("button", { name: /Account of Ines Hartwell/ }).click();
  await page.getByRole("button", { name: "Sign out" }).click();
  await page.waitForURL(/\/sign-in/);

  await signIn(page, "ines.hartwell");
  await page.getByRole("link", { name: /Roof whip 27 MHz/ }).click();
  await expect(page.getByRole("button", { name: /1 of 3, C50-F10, 35\.73 metres/ })).toBeVisible();
  await expect(page.getByRole("button", { name: /2 of 3, Stub/ })).toBeVisible();
  await page.getByRole("link", { name: "Match", exact: true }).first().click();
  await expect(page.getByText("Chosen for this run")).toBeVisible();
});
