import fc from "fast-check";
import { expect, test } from "vitest";
import { rowsInSight, segments } from "@/components/cables/row-window";

const sight = fc
  .tuple(fc.integer({ min: 0, max: 500 }), fc.integer({ min: 0, max: 60 }))
  .map(([from, rows]) => ({ from, to: from + rows }));

test("The rows drawn and the room of the others make up the whole list, each row once and in order", () => {
  fc.assert(
    fc.property(fc.nat(400), sight, fc.option(fc.nat(450)), (count, inSight, kept) => {
      let next = 0;
      for (const segment of segments(count, inSight, kept)) {
        if (segment.kind === "gap") expect(segment.rows).toBeGreaterThan(0);
        expect(segment.kind === "gap" ? segment.from : segment.index).toBe(next);
        next += segment.kind === "gap" ? segment.rows : 1;
      }
      expect(next).toBe(count);
    }),
  );
});

test("The row that has the focus is drawn wherever the list has been scrolled to", () => {
  fc.assert(
    fc.property(sight, fc.nat(399), (inSight, kept) => {
      const drawn = segments(400, inSight, kept).filter((segment) => segment.kind === "row");
      expect(drawn).toContainEqual({ kind: "row", index: kept });
      expect(drawn.length).toBeLessThanOrEqual(61);
    }),
  );
});

test("Every row in the window is drawn, and no more than a few besides", () => {
  fc.assert(
    fc.property(fc.integer({ min: -2000, max: 1e6 }), (top) => {
      const { from, to } = rowsInSight(top, 900, 52);
      expect(from).toBeLessThanOrEqual(Math.max(0, Math.floor(top / 52)));
      expect(to).toBeGreaterThanOrEqual(Math.max(0, Math.ceil((top + 900) / 52)));
      expect(to - from).toBeLessThanOrEqual(50);
    }),
  );
});
