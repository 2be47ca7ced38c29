/** A revision from its beginning to its approval, and what people are told on the way. */
import AxeBuilder from "@axe-core/playwright";
import type { APIResponse, Page } from "@playwright/test";
import { expect, signedIn, test } from "@/tests/browser/support";

const model = (lossTangent: number) => ({
  conductors: [{ form: "sqrt", r0OhmPerM: 0.03, skinCornerRadPerS: 254_000 }],
  ...{ lInfHPerM: 301.25e-9, cFPerM: 53.61e-12, lossTangent },
});
const construction = (dielectricMm: number, lossTangent: number) => ({
  ...{ kind: "coax", innerMm: 1.02, dielectricMm, relativePermittivity: 1.4516, lossTangent },
  outerDiameterMm: 6.9,
});

/** Asks the API as our own page would. */
async function ask(page: Page, method: "post" | "patch", path: string, data: unknown, tag = ""): Promise<APIResponse> {
  const origin = new URL(test.info().project.use.baseURL ?? "").origin;
  const headers = { Origin: origin, "Sec-Fetch-Site": "same-origin", ...(tag && { "If-Match": tag }) };
  const answer = await page.request[method](`/api/v1${path}`, { headers, data });
  expect(answer.ok(), `${method} ${path}: ${answer.status()} ${await answer.text()}`).toBe(true);
  return answer;
}
const tagOf = (answer: APIResponse) => answer.headers().etag ?? "";

/** An approved entry of Libby Thornquist's, and a run of Ines Hartwell's that uses it. */
async function approvedEntry(page: Page, designation: string): Promise<string> {
  await signedIn(page, "libby.thornquist");
  const entry = { designation, name: "75 Ω test trunk", family: "coaxial", model: model(1.5e-4) };
  const draft = await ask(page, "post", "/cables", { ...entry, construction: construction(4.6, 1.5e-4) });
  const { id } = (await draft.json()) as { id: string };
  const sent = await ask(page, "post", `/cables/${id}/submit`, {}, "*");
  await signedIn(page, "nils.ferrant");
  await ask(page, "post", `/cables/${id}/approve`, {}, tagOf(sent));
  await signedIn(page, "ines.hartwell");
  await ask(page, "post", "/runs", {
    name: `Slipway camera on ${designation}`,
    circuit: {
      source: { kind: "constant", reOhm: 75, imOhm: 0 },
      elements: [{ kind: "cable", line: { cableId: id }, lengthM: 80 }],
      load: { kind: "constant", reOhm: 75, imOhm: 0 },
    },
    designHz: 160e6,
    targets: [{ quantity: "loss", atMost: 6.6 }],
  });
  return id;
}

test("A librarian begins a revision, cannot approve it, and a colleague does by key once its effect is on the screen", async ({
  page,
}, { project }) => {
  const designation = `RV-${project.name.slice(0, 12)}-${Date.now() % 1e6}`;
  const id = await approvedEntry(page, designation);

  await signedIn(page, "libby.thornquist");
  await page.goto(`/cables/${id}`);
  await page.getByRole("button", { name: "New revision" }).click();
  const dialog = page.getByRole("dialog", { name: `Begin a new revision of ${designation}` });
  await dialog.getByLabel("Why").fill("Four cuts measured.");
  await dialog.getByRole("button", { name: "Begin it" }).click();
  await expect(page.getByText("Revision 2 is your draft.")).toBeVisible();

  const change = { model: model(9e-4), construction: construction(4.7, 9e-4) };
  await ask(page, "patch", `/cables/${id}`, change, "*");
  await page.reload();
  await page.getByRole("button", { name: "Send for review" }).click();
  await page.getByRole("button", { name: "Send it" }).click();
  await expect(page.getByText("Revision 2 is in review.")).toBeVisible();

  await page.goto(`/review?cable=${id}`);
  await expect(page.getByRole("heading", { name: designation })).toBeVisible();
  await expect(page.getByRole("button", { name: /Approve revision 2/ })).toHaveAttribute("aria-disabled", "true");
  await expect(page.getByRole("button", { name: /Approve revision 2/ })).toHaveAccessibleDescription(
    /You cannot review your own changes: somebody else approves/,
  );

  await signedIn(page, "nils.ferrant");
  await page.goto("/review");
  await page.getByRole("link", { name: new RegExp(`${designation} Revision 2`) }).click();
  await expect(page).toHaveURL(new RegExp(`cable=${id}`));
  await expect(page.getByRole("row", { name: /Dielectric diameter/ })).toContainText("is now 4.7");
  await expect(page.getByRole("row", { name: /Slipway camera/ })).toContainText("would be missed");
  await expect(page.getByText(/One target that is met would be missed/)).toBeVisible();
  await page.getByLabel("Write a note").fill("Looked at with the author.");
  await page.getByRole("button", { name: "Say it" }).click();
  await expect(page.getByRole("listitem").filter({ hasText: "Looked at with the author." })).toBeVisible();
  // The note has been said: its field is left, so that the key belongs to the page.
  await page.getByLabel("Write a note").blur();
  await page.keyboard.press("a");
  await expect(page.getByRole("button", { name: /Approve revision 2/ })).toHaveCount(0);

  await page.goto(`/cables/${id}`);
  await expect(page.getByText("Approved, revision 2")).toBeVisible();
  await page.getByRole("button", { name: /Show all \d+ steps/ }).click();
  await expect(page.getByRole("list", { name: "Steps, the last first" })).toContainText("approved by Nils Ferrant");
});

test("A reported problem becomes a quarantine, and the cable goes into no new run", async ({ page }, { project }) => {
  const designation = `RQ-${project.name.slice(0, 12)}-${Date.now() % 1e6}`;
  const id = await approvedEntry(page, designation);
  await page.goto(`/cables/${id}`);
  await page.getByRole("button", { name: "Report a problem with this cable" }).click();
  await page.getByLabel("What is wrong with it").fill("The reel reads 67 pF/m.");
  await page.getByRole("button", { name: "Report it" }).click();
  await expect(page.getByText("The reel reads 67 pF/m.")).toBeVisible();

  await signedIn(page, "nils.ferrant");
  await page.goto("/review");
  await expect(page.getByText("The reel reads 67 pF/m.").first()).toBeVisible();
  await page.goto(`/cables/${id}`);
  await page.getByLabel("What came of it").fill("Measured: it is another cable.");
  await page.getByRole("button", { name: "Quarantine it" }).click();
  await expect(page.getByText("Quarantined, revision 1")).toBeVisible();
  await expect(page.getByRole("button", { name: "Use in a run" })).toHaveAttribute("aria-disabled", "true");
});

test("A designer has no review, and an auditor reads it without deciding", async ({ page }) => {
  await signedIn(page, "ines.hartwell");
  expect((await page.goto("/review"))?.status()).toBe(404);
  await signedIn(page, "iris.penhallow");
  await page.goto("/review?cable=c50-f28");
  await expect(page.getByText("your role decides nothing")).toBeVisible();
  await expect(page.getByRole("button", { name: /Approve/ })).toHaveCount(0);
});

for (const theme of ["paper", "tar"])
  test(`The review has no serious accessibility fault on ${theme}`, async ({ page, baseURL }) => {
    await page.context().addCookies([{ name: "theme", value: theme, url: baseURL ?? "" }]);
    await signedIn(page, "nils.ferrant");
    await page.goto("/review?cable=c50-f28");
    await expect(page.getByRole("heading", { name: "C50-F28" })).toBeVisible();
    await expect(page.getByRole("row", { name: /Mast M2 telemetry/ })).toBeVisible();
    const { violations } = await new AxeBuilder({ page }).analyze();
    const serious = violations.filter(({ impact }) => impact === "serious" || impact === "critical");
    expect(serious.map(({ id, nodes }) => `${id} ${nodes[0]?.html}`)).toEqual([]);
  });
