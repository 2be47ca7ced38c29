import { expect, test } from "vitest";
import { nextPath } from "@/app/sign-in/next-path";

test.each([
  ["/runs/mast-m2?view=match#b", "/runs/mast-m2?view=match#b"],
  ["/cables", "/cables"],
  [undefined, "/runs"],
  ["", "/runs"],
  ["runs", "/runs"],
  ["//elsewhere.example", "/runs"],
  ["/\\elsewhere.example", "/runs"],
  ["/\t/elsewhere.example", "/runs"],
  ["https://elsewhere.example/", "/runs"],
  ["javascript:alert(1)", "/runs"],
  [["/cables", "/runs/1"], "/runs"],
])("after signing in %j leads to %s, never to another site", (next, path) => {
  expect(nextPath(next)).toBe(path);
});
