import { defineConfig, devices } from "@playwright/test";
import path from "node:path";

const root = path.resolve(import.meta.dirname, "..");
const port = Number(process.env.BROWSER_TEST_PORT ?? 3471);
const base = `http://127.0.0.1:${port}`;

export default defineConfig({
  testDir: path.join(root, "tests/browser"),
  testMatch: "**/*.spec.ts",
  outputDir: path.join(root, "test-results"),
  fullyParallel: false,
  workers: 1,
  timeout: 120_000,
  expect: { timeout: 15_000 },
  use: {
    ...devices["Desktop Chrome"],
    baseURL: base,
    viewport: { width: 1440, height: 900 },
    trace: "retain-on-failure",
    launchOptions: {
      executablePath: "/usr/bin/chromium",
      // The resolver rule keeps the browser from looking up its maker's hosts at start.
      args: [
        "--no-sandbox",
        "--disable-gpu",
        "--disable-quic",
        "--no-first-run",
        "--disable-background-networking",
        "--disable-component-update",
        "--disable-sync",
        "--host-resolver-rules=MAP * ~NOTFOUND, EXCLUDE 127.0.0.1, EXCLUDE localhost",
      ],
    },
  },
  webServer: {
    command: "node app.mjs",
    cwd: root,
    url: `${base}/api/v1/health`,
    reuseExistingServer: false,
    timeout: 180_000,
    env: {
      PORT: String(port),
      DATABASE_FILE: path.join(root, ".reports", "browser.db"),
      NEXT_TELEMETRY_DISABLED: "1",
    },
  },
});
