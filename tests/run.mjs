// `npm test`: everything that must hold, from a fresh clone on. Node built-ins only, since node_modules may not be there.
// Ends with the plain line "N passed, M failed, K skipped"; lint, types and build count one each.
import { spawnSync } from "node:child_process";
import { existsSync, mkdirSync, readFileSync, rmSync, statSync } from "node:fs";
import path from "node:path";

const root = path.resolve(import.meta.dirname, "..");
const reports = path.join(root, ".reports");
const env = { ...process.env, NEXT_TELEMETRY_DISABLED: "1" };
const bin = (name) => path.join(root, "node_modules", ".bin", name);
const totals = { passed: 0, failed: 0, skipped: 0 };

function run(command, args, extraEnv = {}) {
  console.log(`\n> ${path.basename(command)} ${args.join(" ")}`);
  return spawnSync(command, args, { cwd: root, stdio: "inherit", env: { ...env, ...extraEnv } }).status ?? 1;
}

function step(command, args, extraEnv) {
  const isPassed = run(command, args, extraEnv) === 0;
  totals[isPassed ? "passed" : "failed"]++;
  return isPassed;
}

/** Runs a test tool and adds up its JSON report; no report, or an exit code that the report does not explain, is a failure. */
function suite(command, args, extraEnv, reportFile, read) {
  const status = run(command, args, extraEnv);
  if (!existsSync(reportFile)) {
    totals.failed++;
    return;
  }
  const counts = read(JSON.parse(readFileSync(reportFile, "utf8")));
  for (const key of Object.keys(totals)) totals[key] += counts[key];
  if (status !== 0 && counts.failed === 0) totals.failed++;
  if (counts.passed + counts.failed === 0) totals.failed++;
}

function isInstallNeeded() {
  const installed = path.join(root, "node_modules", ".package-lock.json");
  return !existsSync(installed) || statSync(installed).mtimeMs < statSync(path.join(root, "package-lock.json")).mtimeMs;
}

function finish() {
  console.log(`\n${totals.passed} passed, ${totals.failed} failed, ${totals.skipped} skipped`);
  process.exit(totals.failed === 0 ? 0 : 1);
}

if (isInstallNeeded() && run("npm", ["ci"]) !== 0) {
  totals.failed++;
  finish();
}
const isRoot = process.getuid?.() === 0;
if (!existsSync("/usr/bin/chromium") && isRoot) {
  const install = ["install", "-y", "--no-install-recommends", "chromium"];
  const quiet = { DEBIAN_FRONTEND: "noninteractive" };
  if (run("apt-get", install, quiet) !== 0) {
    run("apt-get", ["update"], quiet);
    run("apt-get", install, quiet);
  }
}
rmSync(reports, { recursive: true, force: true });
mkdirSync(reports, { recursive: true });

step(bin("eslint"), [".", "--max-warnings", "0"]);
step(bin("prettier"), ["--check", "--log-level", "warn", "."]);
step(bin("next"), ["typegen"]);
step(bin("tsc"), ["--noEmit"]);

const unitReport = path.join(reports, "unit.json");
suite(
  bin("vitest"),
  [
    "run",
    "--config",
    "tests/vitest.config.ts",
    "--reporter=default",
    "--reporter=json",
    `--outputFile.json=${unitReport}`,
  ],
  {},
  unitReport,
  (report) => ({
    passed: report.numPassedTests,
    failed: report.numFailedTests + (report.numFailedTestSuites > 0 && report.numFailedTests === 0 ? 1 : 0),
    skipped: report.numPendingTests + report.numTodoTests,
  }),
);

if (step(bin("next"), ["build"])) {
  const browserReport = path.join(reports, "browser.json");
  suite(
    bin("playwright"),
    ["test", "--config", "tests/playwright.config.ts", "--reporter=list,json"],
    { PLAYWRIGHT_JSON_OUTPUT_FILE: browserReport },
    browserReport,
    ({ stats }) => ({ passed: stats.expected, failed: stats.unexpected + stats.flaky, skipped: stats.skipped }),
  );
}
finish();
