import AxeBuilder from "@axe-core/playwright";
import { expect, makeRun, signedIn, test } from "@/tests/browser/support";

test("A run is looked at over time: fronts, both ends, a longer edge, a pulse, and figures instead of the picture", async ({
  page,
}) => {
  await signedIn(page, "gwen.ostrander");
  const address = await makeRun(page, "Over time");
  await page.goto(address);
  await expect(page.getByText("Saved, revision 1")).toBeVisible();
  await page.keyboard.press("3");
  await expect(page).toHaveURL(`${address}/time`);
  // 22 − j35 Ω is known at one frequency only, so there is no signal; the page says so and what to do.
  await expect(page.getByText("An end with the same reactance at every frequency has no signal.")).toBeVisible();

  const origin = new URL(test.info().project.use.baseURL ?? "").origin;
  const answer = await page.request.post("/api/v1/runs", {
    headers: { Origin: origin, "Sec-Fetch-Site": "same-origin" },
    data: {
      name: "Bus over time",
      circuit: {
        source: { kind: "constant", reOhm: 120, imOhm: 0 },
        elements: [
          { kind: "cable", line: { cableId: "p120-s1" }, lengthM: 60 },
          { kind: "stub", name: "Drop 1", connection: "shunt", end: "open", line: { cableId: "p120-s1" }, lengthM: 1 },
          { kind: "cable", line: { cableId: "p120-s1" }, lengthM: 40 },
        ],
        load: { kind: "constant", reOhm: 120, imOhm: 0 },
      },
      targets: [{ quantity: "overshoot", atMost: 0.15 }],
    },
  });
  const { id } = (await answer.json()) as { id: string };
  await page.goto(`/runs/${id}/time`);
  await expect(page.getByRole("heading", { name: "Wave fronts" })).toBeVisible();
  await expect(page.getByText("at most 15.0 %")).toBeVisible();
  await expect(page.getByRole("rowheader", { name: "Drop 1" })).toBeVisible();
  await page.getByLabel("Edge, 0–100 %").fill("100 ns");
  await page.getByLabel("The source gives").selectOption("pulse");
  await expect(page.getByLabel("Width")).toBeVisible();
  await page.getByLabel("Edge, 0–100 %").fill("1 furlong");
  await expect(page.getByText("“furlong” is not a unit of time").first()).toBeVisible();
  await page.getByRole("button", { name: "Figures" }).click();
  await expect(page.getByRole("columnheader", { name: "Load, V" })).toBeVisible();
  await expect(page.locator("body")).not.toContainText(/NaN|Infinity|undefined/);
});

for (const theme of ["paper", "tar"])
  test(`The time view has no serious accessibility fault on ${theme}, and fits a phone`, async ({ page }) => {
    await page.context().addCookies([{ name: "theme", value: theme, url: test.info().project.use.baseURL ?? "" }]);
    await signedIn(page, "gwen.ostrander");
    const found = await page.request.get("/api/v1/runs?q=Studio%202%20tie%20line");
    const [run] = ((await found.json()) as { items: { id: string }[] }).items;
    await page.goto(`/runs/${run?.id}/time`);
    await expect(page.getByRole("heading", { name: "Wave fronts" })).toBeVisible();
    const { violations } = await new AxeBuilder({ page }).analyze();
    expect(violations.filter(({ impact }) => impact === "serious" || impact === "critical")).toEqual([]);
    await page.setViewportSize({ width: 390, height: 844 });
    await expect.poll(() => page.evaluate(() => document.documentElement.scrollWidth)).toBeLessThanOrEqual(390);
  });
