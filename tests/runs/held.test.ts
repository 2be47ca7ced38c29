// @vitest-environment jsdom
import { beforeEach, expect, test } from "vitest";
import { countHeld, forgetHeld, type Held, heldKey, hold, readHeld } from "@/lib/runs/held";

const draft = { name: "Mast", circuit: { elements: [] } } as unknown as Held["draft"];
const held: Held = { draft, base: draft, version: 3 };
const key = heldKey("ines", "r1");

beforeEach(() => window.localStorage.clear());

test("What is kept comes back whole, and nothing is kept with null", () => {
  hold(key, held);
  expect(readHeld(key)).toEqual(held);
  hold(key, null);
  expect(readHeld(key)).toBeNull();
});

test.each([
  ["not JSON", "{"],
  ["no draft", JSON.stringify({ draft: null, base: draft, version: 1 })],
  ["no base", JSON.stringify({ draft, version: 1 })],
  ["no elements", JSON.stringify({ draft: { name: "x", circuit: {} }, base: draft, version: 1 })],
])("Kept text of another shape, %s, counts as nothing", (_, text) => {
  window.localStorage.setItem(key, text);
  expect(readHeld(key)).toBeNull();
});

test("Signing out forgets one's own changes and nobody else's", () => {
  hold(key, held);
  hold(heldKey("gwen", "r1"), held);
  forgetHeld("ines");
  expect(countHeld("ines")).toBe(0);
  expect(countHeld("gwen")).toBe(1);
});
