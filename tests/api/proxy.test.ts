import { NextRequest } from "next/server";
import { describe, expect, test } from "vitest";
import { config, proxy } from "@/proxy";

const page = (path: string) => proxy(new NextRequest(`http://ropewalk.test${path}`));
const policyOf = (response: Response) => response.headers.get("content-security-policy") ?? "";

describe("A page", () => {
  test("may run only scripts that carry its own nonce, and take styles only from us or with the nonce", () => {
    const policy = policyOf(page("/runs"));
    const nonce = /'nonce-([^']+)'/.exec(policy)?.[1];
    expect(nonce).toMatch(/^[\w+/]{20,}=*$/);
    expect(policy).toContain(`script-src 'self' 'nonce-${nonce}' 'strict-dynamic';`);
    expect(policy).toContain(`style-src 'self' 'nonce-${nonce}';`);
    expect(policy).not.toMatch(/script-src[^;]*unsafe/);
  });

  test("gets a nonce of its own every time", () => {
    expect(policyOf(page("/runs"))).not.toBe(policyOf(page("/runs")));
  });

  test("can neither be framed nor send a form elsewhere nor move its base", () => {
    for (const directive of ["frame-ancestors 'none'", "form-action 'self'", "base-uri 'none'", "object-src 'none'"])
      expect(policyOf(page("/"))).toContain(directive);
  });

  test("is told its nonce, its policy and its path, whatever the browser claimed they were", () => {
    const forged = { "x-nonce": "guessed", "x-ropewalk-path": "https://elsewhere.test" };
    const response = proxy(new NextRequest("http://ropewalk.test/runs?state=draft", { headers: forged }));
    const told = (name: string) => response.headers.get(`x-middleware-request-${name}`);
    expect(policyOf(response)).toContain(`'nonce-${told("x-nonce")}'`);
    expect(told("content-security-policy")).toBe(policyOf(response));
    expect(told("x-ropewalk-path")).toBe("/runs?state=draft");
  });
});

test.each(["/cables/%E0%A4%A", "/runs/%E0%A4", "/api/v1/cables/%zz", "/%"])(
  "An address that cannot be read, %s, is refused as such",
  (path) => {
    expect(page(path).status).toBe(400);
  },
);

test("What is served by the API passes untouched, and only when its address has a % in it", () => {
  expect(policyOf(page("/api/v1/cables/c50%2Df10"))).toBe("");
  const isMatched = (path: string) => config.matcher.some((pattern) => new RegExp(`^${pattern}$`).test(path));
  const paths = ["/", "/runs", "/api/v1/cables", "/api/v1/cables/c50%2Df10", "/_next/static/chunks/a.js", "/icon.svg"];
  expect(paths.filter(isMatched)).toEqual(["/", "/runs", "/api/v1/cables/c50%2Df10"]);
});
