import { expect, makeRun, signedIn, storedRun, test } from "@/tests/browser/support";

interface Stored {
  kind: string;
  name?: string;
  lengthM?: number;
}
const line = async (page: Parameters<typeof storedRun>[0], address: string) =>
  (await storedRun(page, address)).circuit.elements as Stored[];

test("A designer matches at the transmitter, is told what stays on the line, keeps the match there and finds it there again", async ({
  page,
}) => {
  await signedIn(page, "ines.hartwell");
  const address = await makeRun(page, "Match at the transmitter");
  await page.goto(`${address}/match`);
  const place = page.getByLabel("Match at");
  await expect(place).toHaveValue("0");
  await expect(page.getByText("A match here serves")).toHaveCount(0);

  // Scenario figures: 36 m of C50-F10 show 138.6+j1.8 Ω, keep VSWR 3.54 and lose 1.33 dB instead of 0.76 dB.
  await place.selectOption({ label: "Source, before C50-F10" });
  await expect(page.getByText("Before C50-F10 the run shows")).toContainText("138.6+j1.8");
  const left = page.getByText("A match here serves Source, not the line behind it");
  await expect(left).toContainText("C50-F10 keeps a VSWR of 3.54");
  await expect(left).toContainText("1.33 dB is lost between it and the load at 27.2 MHz, 0.57 dB of it");
  await expect(left).toContainText("the same pieces lose 0.76 dB");

  const first = page.getByRole("article").first();
  await expect(first).toContainText("Lost up to the load, match included");
  await first.getByRole("button", { name: "Choose A" }).click();
  await expect(first.getByText("Chosen for this run")).toBeVisible();
  await expect(page.getByText("Saved, revision 2")).toBeVisible();
  const kept = await line(page, address);
  expect(kept.at(-1)).toMatchObject({ kind: "cable", lengthM: 36 });
  expect(kept.length).toBeGreaterThan(1);

  await page.reload();
  await expect(place).toHaveValue("1");
  await expect(page.getByText("Chosen for this run")).toBeVisible();
  await page.getByRole("button", { name: "Take out" }).click();
  await expect(page.getByText("Saved, revision 3")).toBeVisible();
  expect(await line(page, address)).toMatchObject([{ kind: "cable", lengthM: 36 }]);
});

test("The tolerance of the cut is read as it is typed, and what cannot be meant is refused at its field", async ({
  page,
}) => {
  await signedIn(page, "ines.hartwell");
  await page.goto(`${await makeRun(page, "Cut to within")}/match`);
  const cut = page.getByLabel("Cut to within ±");
  await expect(cut).toHaveValue("5 mm");
  await expect(page.getByText("Worst VSWR, cut ±5 mm").first()).toBeVisible();
  await expect(page.getByRole("heading", { name: "When the cut is not perfect" })).toBeVisible();
  await cut.fill("1 cm");
  await expect(page.getByText("Worst VSWR, cut ±10 mm").first()).toBeVisible();
  await cut.fill("3");
  await expect(page.getByText("At most 100 mm. Write the unit, 5 mm.")).toBeVisible();
  await expect(page.getByText("Worst VSWR, cut ±10 mm").first()).toBeVisible();
  await cut.fill("");
  await page.getByLabel("Parts within ±").fill("");
  await expect(page.getByRole("heading", { name: "When the cut is not perfect" })).toHaveCount(0);
  await expect(page.getByText("NaN")).toHaveCount(0);
});
