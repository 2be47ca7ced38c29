import AxeBuilder from "@axe-core/playwright";
import { expect, makeRun, signedIn, test } from "@/tests/browser/support";

test("An auditor reads a run and its matches and can change nothing", async ({ page }) => {
  await signedIn(page, "ines.hartwell");
  const address = await makeRun(page, "Read by an auditor");
  await signedIn(page, "iris.penhallow");
  await page.goto(address);
  await expect(page.getByText("You are reading; your role changes nothing")).toBeVisible();
  await page.getByRole("button", { name: /1 of 1/ }).click();
  await expect(page.getByLabel("Length", { exact: true })).toBeDisabled();
  await expect(page.getByRole("button", { name: "Split" })).toHaveCount(0);
  await page.goto(`${address}/match`);
  await expect(page.getByRole("button", { name: "Choose A" })).toHaveAttribute("aria-disabled", "true");
  await page.goto("/runs/new");
  await expect(page.getByRole("heading", { level: 1 })).toBeVisible();
  await expect(page.getByRole("button", { name: "Start the run" })).toHaveCount(0);
});

test("An installer sees only the issued runs given to them", async ({ page }) => {
  await signedIn(page, "ines.hartwell");
  const draft = await makeRun(page, "Not for installers");
  await signedIn(page, "rhys.colborne");
  await page.goto("/runs");
  await expect(page.getByRole("link", { name: /Mast M2 telemetry/ })).toBeVisible();
  await expect(page.getByRole("link", { name: /Not for installers/ })).toHaveCount(0);
  const answer = await page.goto(draft);
  expect(answer?.status()).toBe(404);
  await signedIn(page, "cormac.dray");
  await page.goto("/runs");
  await expect(page.getByText("No run has been given to you yet")).toBeVisible();
});

test("Whoever is not signed in is sent to the door and comes back to the page they asked for", async ({ page }) => {
  await page.goto("/cables?q=foam");
  await expect(page).toHaveURL(/\/sign-in\?next=/);
  await page.getByLabel("Work email").fill("libby.thornquist@quillhaven.example");
  await page.getByLabel("Password", { exact: true }).fill("not the password");
  await page.getByRole("button", { name: "Sign in", exact: true }).click();
  await expect(page.getByText(/is not right/).first()).toBeVisible();
  await page.getByLabel("Password", { exact: true }).fill("spring-tide-demo");
  await page.getByRole("button", { name: "Sign in", exact: true }).click();
  await page.waitForURL(/\/cables\?q=foam/);
});

for (const theme of ["paper", "tar"])
  test(`No screen has a serious accessibility fault on ${theme}`, async ({ page, baseURL }) => {
    await page.context().addCookies([{ name: "theme", value: theme, url: baseURL ?? "" }]);
    await page.goto("/sign-in");
    const check = async (what: string) => {
      const { violations } = await new AxeBuilder({ page }).analyze();
      const serious = violations.filter(({ impact }) => impact === "serious" || impact === "critical");
      expect(serious.map(({ id, nodes }) => `${what}: ${id} ${nodes[0]?.html}`)).toEqual([]);
    };
    await check("sign in");
    await signedIn(page, "ines.hartwell");
    const address = await makeRun(page, `Accessible on ${theme}`);
    for (const path of ["/runs", "/cables", "/notices", "/limits", "/runs/new", address, `${address}/match`]) {
      await page.goto(path);
      await expect(page.getByRole("heading", { level: 1 }).first()).toBeAttached();
      if (path === "/cables") await expect(page.getByRole("row", { name: /C50-F10/ })).toBeVisible();
      if (path === address) await page.getByRole("button", { name: /1 of 1/ }).click();
      await check(path);
    }
  });
