// Runs before each test file: an unexpected console.error fails the test that caused it.
import { afterEach, beforeEach, expect, vi } from "vitest";

beforeEach(() => {
  vi.spyOn(console, "error");
});

afterEach(() => {
  expect(vi.mocked(console.error).mock.calls).toEqual([]);
  vi.restoreAllMocks();
});
