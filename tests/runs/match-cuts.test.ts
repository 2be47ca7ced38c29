import { expect, test } from "vitest";
import type { Cut } from "@/lib/line/match/match-request";
import { cutSentence } from "@/lib/runs/match-cuts";

const cut: Cut = { name: "Stub", line: "C50-F10", count: 1, lengthM: 0.951, cutM: 0.939, trimHzPerM: 3.4e6 };
const plain = (each: Cut) => cutSentence(each).replaceAll("\u00a0", " ");

test("a piece says what to cut of which cable, and which way the match moves when it is trimmed", () => {
  expect(plain(cut)).toBe("Stub: cut 939 mm of C50-F10; 10 mm off moves the match up by 34.0 kHz.");
  const short = { ...cut, name: "Section", count: 2, lengthM: 0.2, cutM: 0.2, trimHzPerM: -2e6 };
  expect(plain(short)).toBe("Section: cut 2 times 200 mm of C50-F10; 1 mm off moves the match down by 2.00 kHz.");
});

test("a piece without a best frequency says nothing of trimming, one shorter than its ends that it cannot be made", () => {
  expect(plain({ ...cut, trimHzPerM: null })).toBe("Stub: cut 939 mm of C50-F10.");
  expect(plain({ ...cut, cutM: null })).toBe("Stub: too short for its ends in C50-F10.");
});
