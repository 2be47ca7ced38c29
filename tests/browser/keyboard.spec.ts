import { expect, makeRun, signedIn, storedRun, test } from "@/tests/browser/support";

test("Everything on the line is done without a mouse", async ({ page }) => {
  await signedIn(page, "owen.castlebay");
  const address = await makeRun(page, "By keys alone");
  await page.goto(address);
  await expect(page.getByText("Saved, revision 1")).toBeVisible();

  await page.keyboard.press("ArrowRight");
  await expect(page.getByRole("region", { name: "The source" })).toBeVisible();
  await page.keyboard.press("ArrowRight");
  await expect(page.getByRole("region", { name: "C50-F10" })).toBeVisible();
  await page.keyboard.press("s");
  await expect(page.getByRole("button", { name: /1 of 2, C50-F10, 18\.00 metres/ })).toBeVisible();
  await page.keyboard.press("a");
  await expect(page.getByRole("button", { name: /2 of 3/ })).toBeVisible();
  await page.keyboard.press("Delete");
  await expect(page.getByRole("button", { name: /2 of 2/ })).toBeVisible();
  await expect(page.getByRole("button", { name: /1 of 2/ })).toHaveAttribute("aria-pressed", "true");
  await page.keyboard.press("Enter");
  const length = page.getByLabel("Length", { exact: true });
  await length.focus();
  await page.keyboard.press("ArrowUp");
  await expect(length).toHaveValue(/^19/);
  await page.keyboard.press("Shift+ArrowUp");
  await expect(length).toHaveValue(/^29/);
  await expect(page.getByText(/Saved, revision [2-9]/)).toBeVisible();
  await expect
    .poll(async () => (await storedRun(page, address)).circuit.elements)
    .toMatchObject([{ lengthM: 29 }, { lengthM: 18 }]);

  await page.keyboard.press("Control+z");
  await expect(length).toHaveValue(/^18/);
  await page.getByRole("heading", { name: "Where the power goes" }).click();
  await page.keyboard.press("]");
  await expect(page.getByText(/^0\.[2-4]\d\sm$/).first()).toBeVisible();
  await page.keyboard.press("?");
  await expect(page.getByRole("dialog", { name: "Keys" })).toContainText("split the cable");
  await page.keyboard.press("Escape");
  await page.keyboard.press("2");
  await expect(page).toHaveURL(`${address}/match`);
  await page.keyboard.press("t");
  await expect(page.locator("html")).toHaveAttribute("data-theme", /tar|paper/);
});

test("Single letters can be turned off, and then type nothing into the run", async ({ page }) => {
  await signedIn(page, "owen.castlebay");
  const address = await makeRun(page, "Keys off");
  await page.goto(address);
  await expect(page.getByText("Saved, revision 1")).toBeVisible();
  await page.keyboard.press("?");
  await page.getByLabel("Single letters do nothing").check();
  await page.keyboard.press("Escape");
  await page.keyboard.press("a");
  await page.keyboard.press("ArrowRight");
  await expect(page.getByRole("region", { name: "The source" })).toBeVisible();
  await expect(page.getByRole("button", { name: /1 of 1/ })).toBeVisible();
});
