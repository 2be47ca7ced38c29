import { afterEach, expect, test, vi } from "vitest";
import { demoPassword, demoSignIns } from "@/lib/team/demo";

afterEach(() => vi.unstubAllEnvs());

test("the demo names its people by role", () => {
  vi.stubEnv("DEMO", "");
  const people = demoSignIns() ?? [];
  expect(people).toHaveLength(12);
  expect(people).toContainEqual({ name: "Ada Winslade", email: "ada.winslade@quillhaven.example", role: "admin" });
  expect(demoPassword()).toBe("spring-tide-demo");
});

test("outside the demo nobody's address and no password is given away", () => {
  vi.stubEnv("DEMO", "off");
  expect(demoSignIns()).toBeNull();
  expect(demoPassword()).toBeNull();
});

test.each(["OFF", "false", "0", " off"])("DEMO=%s is a slip of the pen, and opens nothing", (said) => {
  vi.stubEnv("DEMO", said);
  expect(() => demoPassword()).toThrow(/"on" or "off"/);
});
