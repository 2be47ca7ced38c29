/** What every journey starts with: a page that fails on a console error, and signing in as one of the demo's people. */
import { expect, test as base, type Page } from "@playwright/test";

export const test = base.extend<{ page: Page }>({
  page: async ({ page }, run) => {
    const wrong: string[] = [];
    page.on("console", (message) => {
      // The browser itself reports a refused answer; the journeys that ask for one say so on the screen.
      const isRefusal = message.text().startsWith("Failed to load resource");
      if (message.type() === "error" && !isRefusal) wrong.push(message.text());
    });
    page.on("pageerror", (error) => wrong.push(error.message));
    onceAwake(page);
    await run(page);
    expect(wrong, "errors in the browser's console").toEqual([]);
  },
});

export { expect } from "@playwright/test";

/** Whether every button and field of the page answers: until React has taken them over, what is typed is not heard. */
function isAwake(): boolean {
  const controls = [...document.querySelectorAll("main button, main input, main textarea, main select")];
  return controls.every((control) => Object.keys(control).some((key) => key.startsWith("__reactProps")));
}

/** Opening or loading a page lasts until it answers, as it does for people, who are slower than a journey. */
function onceAwake(page: Page): void {
  const [goto, reload] = [page.goto.bind(page), page.reload.bind(page)];
  const awake = async <Answer>(answer: Answer): Promise<Answer> => {
    await page.waitForFunction(isAwake, undefined, { timeout: 10_000 }).catch(() => undefined);
    return answer;
  };
  page.goto = async (...asked) => awake(await goto(...asked));
  page.reload = async (...asked) => awake(await reload(...asked));
}

/** Signs in by the front door. */
export async function signIn(page: Page, name: string): Promise<void> {
  await page.goto("/sign-in");
  await page.getByLabel("Work email").fill(`${name}@quillhaven.example`);
  await page.getByLabel("Password", { exact: true }).fill("spring-tide-demo");
  await page.getByRole("button", { name: "Sign in", exact: true }).click();
  await page.waitForURL(/\/runs$/);
}

/** Signs in by the API, where the front door is not what is tested. */
export async function signedIn(page: Page, name: string): Promise<void> {
  const origin = new URL(test.info().project.use.baseURL ?? "").origin;
  const answer = await page.request.post("/api/v1/session", {
    data: { email: `${name}@quillhaven.example`, password: "spring-tide-demo" },
    headers: { Origin: origin, "Sec-Fetch-Site": "same-origin" },
  });
  expect(answer.status()).toBe(200);
}

/** A run of one cable made by the API, and its address. */
export async function makeRun(page: Page, name: string): Promise<string> {
  const origin = new URL(test.info().project.use.baseURL ?? "").origin;
  const answer = await page.request.post("/api/v1/runs", {
    headers: { Origin: origin, "Sec-Fetch-Site": "same-origin" },
    data: {
      name,
      circuit: {
        source: { kind: "constant", reOhm: 50, imOhm: 0 },
        elements: [{ kind: "cable", line: { cableId: "c50-f10" }, lengthM: 36 }],
        load: { kind: "constant", reOhm: 22, imOhm: -35 },
      },
      designHz: 27.2e6,
      bandHz: [26.9e6, 27.5e6],
      availablePowerW: 200,
    },
  });
  expect(answer.status()).toBe(201);
  return `/runs/${((await answer.json()) as { id: string }).id}`;
}

/** The run as the server has it. */
export async function storedRun(
  page: Page,
  address: string,
): Promise<{ version: number; circuit: { elements: unknown[] } } & Record<string, unknown>> {
  return (await page.request.get(`/api/v1${address}`)).json();
}
