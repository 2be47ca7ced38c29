import { afterEach, describe, expect, test, vi } from "vitest";
import { networkAddress } from "@/lib/http/origin";

afterEach(() => vi.unstubAllEnvs());

describe("The network address sign-in attempts are counted by", () => {
  const from = (forwarded: string) =>
    networkAddress(new Request("http://localhost/", { headers: { "x-forwarded-for": forwarded } }));

  test("is not what the one who asks says it is", () => {
    expect(from("198.51.100.7")).toBe(from("203.0.113.9"));
  });

  test("is the last that a trusted proxy names", () => {
    vi.stubEnv("TRUST_PROXY", "on");
    expect(from("10.9.9.9, 203.0.113.9")).toBe("203.0.113.9");
    expect(networkAddress(new Request("http://localhost/"))).toBe("unknown");
  });
});
