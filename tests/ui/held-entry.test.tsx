import { expect, test } from "vitest";
import { entryKey, holdEntry, readHeldEntry } from "@/lib/cables/editor/held-entry";
import { emptyTexts } from "@/lib/cables/editor/texts";
import { countHeld, forgetHeld } from "@/lib/runs/held";

test("What is typed of an entry is kept in the browser, counts as a kept change, and is forgotten on signing out", () => {
  const key = entryKey("libby", "c75-f7");
  const held = { texts: { ...emptyTexts, designation: "C75-F9" }, base: emptyTexts, version: 3 };
  expect(holdEntry(key, held)).toBe(true);
  expect(readHeldEntry(key)).toEqual(held);
  expect(readHeldEntry(entryKey("nils", "c75-f7"))).toBeNull();
  expect(countHeld("libby")).toBe(1);
  forgetHeld("libby");
  expect(readHeldEntry(key)).toBeNull();
});

test("What cannot be a kept entry counts as nothing", () => {
  const key = entryKey("libby", null);
  for (const text of ["", "{", "null", "[]", '{"texts":{}}', '{"texts":{"designation":"x"},"base":1,"version":1}']) {
    window.localStorage.setItem(key, text);
    expect(readHeldEntry(key)).toBeNull();
  }
});
