import { mkdtempSync, readFileSync, rmSync, statSync } from "node:fs";
import { tmpdir } from "node:os";
import path from "node:path";
import { afterEach, beforeEach, expect, test, vi } from "vitest";

let folder: string;
beforeEach(() => {
  folder = mkdtempSync(path.join(tmpdir(), "ropewalk-"));
  vi.resetModules(); // the secret is made once a process
  vi.stubEnv("DATABASE_FILE", path.join(folder, "data/ropewalk.db"));
  vi.stubEnv("SESSION_SECRET", "");
});
afterEach(() => {
  vi.unstubAllEnvs();
  rmSync(folder, { recursive: true });
});

const secretOfNewProcess = async () => {
  vi.resetModules();
  return (await import("@/lib/auth/secret")).sessionSecret();
};

test("Without SESSION_SECRET one is made and kept beside the database, for nobody else to read", async () => {
  const made = await secretOfNewProcess();
  const file = path.join(folder, "data/session-secret");
  expect(made.length).toBeGreaterThanOrEqual(32);
  expect(readFileSync(file, "utf8")).toBe(made);
  expect(statSync(file).mode & 0o777).toBe(0o600);
});

test("The secret made once is found again, so that a restart signs nobody out", async () => {
  expect(await secretOfNewProcess()).toBe(await secretOfNewProcess());
});

test("SESSION_SECRET is taken when given", async () => {
  vi.stubEnv("SESSION_SECRET", "a secret of at least thirty-two characters");
  expect(await secretOfNewProcess()).toBe("a secret of at least thirty-two characters");
});

test("A SESSION_SECRET too short to seal with is refused", async () => {
  vi.stubEnv("SESSION_SECRET", "short");
  await expect(secretOfNewProcess()).rejects.toThrow(/at least 32/);
});
