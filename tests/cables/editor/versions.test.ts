import { expect, test } from "vitest";
import { redone, stepped, steps, undone } from "@/lib/cables/editor/undo";
import { differences, laidOver } from "@/lib/cables/editor/versions";
import { emptyTexts, type EntryTexts } from "@/lib/cables/editor/texts";

const figures = (change: Partial<EntryTexts["figures"]>, more: Partial<EntryTexts> = {}): EntryTexts => ({
  ...{ ...emptyTexts, ...more },
  figures: { ...emptyTexts.figures, ...change },
});

test("Mine over theirs is what I changed and nothing else: what they changed elsewhere stays", () => {
  const base = figures({ z0: "75", c: "67" });
  const mine = figures({ z0: "75", c: "53.6" }, { rows: [{ frequency: "10", loss: "2", isLeftOut: false, note: "" }] });
  const theirs = figures({ z0: "74.9", c: "67" });
  const both = laidOver(base, mine, theirs);
  expect(both.figures).toMatchObject({ z0: "74.9", c: "53.6" });
  expect(both.rows).toEqual(mine.rows);
});

test("Where two versions differ is told field by field with both values", () => {
  const rows = differences(
    figures({ c: "67" }),
    figures({ c: "" }, { ruling: { ...emptyTexts.ruling, loss: "construction" } }),
  );
  expect(rows).toEqual([
    { what: "Capacitance", theirs: "67", mine: "nothing" },
    { what: "Loss is ruled by", theirs: "lossTable", mine: "construction" },
  ]);
});

test("Typing one field is one step; everything can be undone and done again", () => {
  let now = steps("");
  for (const text of ["5", "50"]) now = stepped(now, text, "figures.z0");
  now = stepped(now, "50 Ω", "name");
  expect(undone(now).present).toBe("50");
  expect(undone(undone(now)).present).toBe("");
  expect(redone(redone(undone(undone(now)))).present).toBe("50 Ω");
  expect(undone(steps("x")).present).toBe("x");
});
