import { expect, makeRun, signedIn, storedRun, test } from "@/tests/browser/support";

test("A length that cannot be read says so where it was typed, is kept, and is not saved until it can be", async ({
  page,
}) => {
  await signedIn(page, "ines.hartwell");
  const address = await makeRun(page, "Bad length");
  await page.goto(address);
  await page.getByRole("button", { name: /1 of 1/ }).click();
  const length = page.getByLabel("Length", { exact: true });
  await length.fill("36 parsnips");
  await expect(page.getByText("“parsnips” is not a unit of length").first()).toBeVisible();
  await expect(page.getByText("A field cannot be read; saving waits for it")).toBeVisible();
  await expect(page.locator("body")).not.toContainText(/NaN|Infinity|undefined/);
  await page.keyboard.press("Escape");
  await page
    .getByRole("button", { name: /Load: Load/ })
    .first()
    .click();
  await page.getByRole("button", { name: /1 of 1/ }).click();
  await expect(page.getByLabel("Length", { exact: true })).toHaveValue("36 parsnips");
  await page.getByLabel("Length", { exact: true }).fill("40 m");
  await expect(page.getByText("Saved, revision 2")).toBeVisible();
  expect((await storedRun(page, address)).circuit.elements).toMatchObject([{ lengthM: 40 }]);
});

test("Two people change one run: the second sees both versions and nothing is lost", async ({ page, browser }) => {
  await signedIn(page, "ines.hartwell");
  const address = await makeRun(page, "Two at once");
  const context = await browser.newContext({ baseURL: test.info().project.use.baseURL });
  const other = await context.newPage();
  await signedIn(other, "tomas.averill");
  await page.goto(address);
  await other.goto(address);

  await other.getByLabel("Name of the run").fill("Two at once, by Tomas");
  await expect(other.getByText("Saved, revision 2")).toBeVisible();

  await page.getByRole("button", { name: /1 of 1/ }).click();
  await page.getByLabel("Length", { exact: true }).fill("37 m");
  const conflict = page.getByRole("alertdialog");
  await expect(conflict).toContainText("Tomas Averill saved this run while you were changing it");
  await expect(conflict.getByRole("row", { name: /Name/ })).toContainText("Two at once, by Tomas");
  expect(await storedRun(page, address)).toMatchObject({
    name: "Two at once, by Tomas",
    circuit: { elements: [{ lengthM: 36 }] },
  });
  await conflict.getByRole("button", { name: /Take theirs/ }).click();
  await expect(page.getByLabel("Name of the run")).toHaveValue("Two at once, by Tomas");
  await page.getByRole("button", { name: "Undo" }).click();
  await expect(page.getByText("Saved, revision 3")).toBeVisible();
  expect(await storedRun(page, address)).toMatchObject({ circuit: { elements: [{ lengthM: 37 }] } });
  await context.close();
});

test("Mine on top of theirs keeps what they changed elsewhere", async ({ page, browser }) => {
  await signedIn(page, "ines.hartwell");
  const address = await makeRun(page, "On top");
  const context = await browser.newContext({ baseURL: test.info().project.use.baseURL });
  const other = await context.newPage();
  await signedIn(other, "tomas.averill");
  await page.goto(address);
  await other.goto(address);
  await other.getByLabel("Name of the run").fill("On top, renamed by Tomas");
  await expect(other.getByText("Saved, revision 2")).toBeVisible();
  await page.getByRole("button", { name: /1 of 1/ }).click();
  await page.getByLabel("Length", { exact: true }).fill("37 m");
  await page.getByRole("button", { name: /Keep mine/ }).click();
  await expect(page.getByText("Saved, revision 3")).toBeVisible();
  expect(await storedRun(page, address)).toMatchObject({
    name: "On top, renamed by Tomas",
    circuit: { elements: [{ lengthM: 37 }] },
  });
  await context.close();
});

test("A change made while the server was away survives a closed tab and is sent later", async ({ page }) => {
  await signedIn(page, "ines.hartwell");
  const address = await makeRun(page, "Closed while away");
  await page.goto(address);
  await page.route("**/api/v1/runs/*", (route) => route.abort());
  await page.getByLabel("Name of the run").fill("Closed while away, and kept");
  await expect(page.getByText(/Not saved since/)).toBeVisible();
  page.on("dialog", (dialog) => void dialog.accept());
  await page.goto("/runs");
  await page.unroute("**/api/v1/runs/*");
  await page.goto(address);
  await expect(page.getByLabel("Name of the run")).toHaveValue("Closed while away, and kept");
  await expect(page.getByText("Saved, revision 2")).toBeVisible();
  expect(await storedRun(page, address)).toMatchObject({ name: "Closed while away, and kept" });
});

test("Undo and redo reach back over every edit of a run", async ({ page }) => {
  await signedIn(page, "gwen.ostrander");
  const address = await makeRun(page, "Undo");
  await page.goto(address);
  await page.getByRole("button", { name: /1 of 1/ }).click();
  await page.getByRole("button", { name: "Split" }).click();
  await expect(page.getByRole("button", { name: /2 of 2/ })).toBeVisible();
  await page.getByRole("button", { name: "Insert before" }).click();
  await page.getByRole("button", { name: "Pad", exact: true }).click();
  await expect(page.getByRole("button", { name: /3 of 3/ })).toBeVisible();
  await page.getByRole("button", { name: "Undo" }).click();
  await page.getByRole("button", { name: "Undo" }).click();
  await expect(page.getByRole("button", { name: /1 of 1/ })).toBeVisible();
  await page.getByRole("button", { name: "Redo" }).click();
  await expect(page.getByRole("button", { name: /2 of 2/ })).toBeVisible();
});

test("When the server is away the work stays, says since when, and is saved on a second try", async ({ page }) => {
  await signedIn(page, "ines.hartwell");
  const address = await makeRun(page, "Server away");
  await page.goto(address);
  await page.route("**/api/v1/runs/*", (route) => route.abort());
  await page.getByLabel("Name of the run").fill("Server away and back");
  await expect(page.getByText(/Not saved since/)).toBeVisible();
  await page.unroute("**/api/v1/runs/*");
  await page.getByRole("button", { name: "Try again" }).click();
  await expect(page.getByText("Saved, revision 2")).toBeVisible();
  expect(await storedRun(page, address)).toMatchObject({ name: "Server away and back" });
});

test("A change followed at once by a link is saved; going back shows it, and typing goes on from there", async ({
  page,
}) => {
  await signedIn(page, "ines.hartwell");
  const address = await makeRun(page, "Leaving at once");
  await page.goto(address);
  await expect(page.getByText("Saved, revision 1")).toBeVisible();
  await page.getByLabel("Name of the run").fill("Left at once");
  await page.getByRole("navigation", { name: "Places" }).getByRole("link", { name: "Catalogue" }).click();
  await expect(page).toHaveURL(/\/cables/);
  await expect.poll(async () => (await storedRun(page, address)).name).toBe("Left at once");

  await page.goBack();
  await expect(page.getByLabel("Name of the run")).toHaveValue("Left at once");
  await expect(page.getByText("Saved, revision 2")).toBeVisible();
  await page.getByLabel("Name of the run").fill("Left and back");
  await expect(page.getByText("Saved, revision 3")).toBeVisible();
  await expect(page.getByRole("alertdialog")).toBeHidden();
});

test("A save whose answer is lost is not taken for somebody else's", async ({ page }) => {
  await signedIn(page, "ines.hartwell");
  const address = await makeRun(page, "Lost answer");
  await page.goto(address);
  await expect(page.getByText("Saved, revision 1")).toBeVisible();
  let isLost = false;
  await page.route("**/api/v1/runs/*", async (route) => {
    if (route.request().method() !== "PATCH" || isLost) return route.continue();
    isLost = true;
    await route.fetch();
    await route.abort();
  });
  await page.getByLabel("Name of the run").fill("Answer lost");
  await page.getByRole("button", { name: "Try again" }).click();
  await expect(page.getByText("Saved, revision 2")).toBeVisible();
  await expect(page.getByRole("alertdialog")).toBeHidden();
});
