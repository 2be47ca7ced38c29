import { expect, test } from "vitest";
import { distinct } from "@/lib/line/match/distinct";
import { findMatches } from "@/lib/line/match/find-matches";
import { c50F10, c75F7, everyday } from "@/tests/support/match-lines";

const { candidates } = findMatches({ ...everyday, lines: [c50F10, c75F7] });
const [first, second] = candidates;

test("candidates that are told apart by their titles stay as they are, in their order", () => {
  expect(distinct(candidates)).toEqual(candidates);
});

test("the same network is kept once, however often it was found", () => {
  expect(distinct([first!, second!, { ...first! }])).toEqual([first, second]);
});

test("different networks of one title are numbered, so that each can be named", () => {
  const like = { ...second!, title: first!.title };
  const alike = distinct([first!, like, { ...like, elements: [] }]);
  expect(alike.map(({ title }) => title)).toEqual([
    first!.title,
    `${first!.title}, solution 2`,
    `${first!.title}, solution 3`,
  ]);
});

test("coil and capacitor of the same standard values, once the one across the line and once the other, have two titles", () => {
  const { candidates: found } = findMatches({
    ...everyday,
    designHz: 134190031.5284729,
    bandHz: [134190031.5284729, 134190031.5284729],
    load: { kind: "constant", reOhm: 0.8659913313196904, imOhm: 0.48530565272780124 },
    methods: ["lSection"],
    partQ: { coilQ: 192.92307617224392, capacitorQ: 19.193598020735244 },
  });
  const titles = found.map(({ title }) => title);
  expect(new Set(titles).size).toBe(titles.length);
  expect(titles.join()).toContain(", solution 2");
});
