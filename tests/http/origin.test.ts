import { afterEach, describe, expect, test, vi } from "vitest";
import { madeForHeader } from "@/lib/http/call";
import { networkAddress, refuseOtherPerson } from "@/lib/http/origin";
import { actor } from "@/tests/support/people";

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

describe("A page that was made for one person", () => {
  const from = (method: string, madeFor?: string) =>
    new Request("http://localhost/", { method, headers: madeFor === undefined ? {} : { [madeForHeader]: madeFor } });
  const librarian = actor("librarian");

  test("changes nothing once another has signed in in the same browser, and says who", () => {
    expect(() => refuseOtherPerson(from("PATCH", "somebody"), librarian)).toThrow(
      /Skerry Light librarian has signed in/,
    );
  });

  test("changes what it may while the same person is signed in; a script names nobody, and reading is free", () => {
    expect(() => refuseOtherPerson(from("PATCH", librarian.personId), librarian)).not.toThrow();
    expect(() => refuseOtherPerson(from("PATCH"), librarian)).not.toThrow();
    expect(() => refuseOtherPerson(from("GET", "somebody"), librarian)).not.toThrow();
  });
});
