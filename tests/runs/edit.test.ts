import fc from "fast-check";
import { expect, test } from "vitest";
import {
  changeBetween,
  edited,
  faultsAfter,
  history,
  insertAt,
  move,
  newElement,
  redone,
  removeAt,
  split,
  undone,
  type RunDraft,
} from "@/lib/runs/edit";
import { elementSchema, type Element } from "@/lib/runs/circuit-schema";

const line = { cableId: "c50-f10" };
const kinds = ["cable", "parallel", "stub", "shunt", "part", "pad", "joint", "transformer"] as const;
const cable = (lengthM: number): Element => ({ kind: "cable", line, lengthM });

function draft(lengthM: number): RunDraft {
  return {
    name: "Mast feeder",
    site: "",
    folder: "",
    circuit: { source: { kind: "constant", reOhm: 50, imOhm: 0 }, elements: [cable(lengthM)], load: { kind: "open" } },
    temperatureC: 20,
    designHz: 27.2e6,
    availablePowerW: 200,
    bandHz: null,
    targets: [],
    sourceName: "Source",
    loadName: "Load",
  };
}

test.each(kinds)("newElement(%s) is an element the schema accepts", (kind) => {
  expect(elementSchema.safeParse(newElement(kind, line, 50)).error).toBeUndefined();
});

test("split(elements, index) keeps the whole length, wherever the cut is", () => {
  fc.assert(
    fc.property(
      fc.double({ min: 0.01, max: 1000, noNaN: true }),
      fc.double({ min: -10, max: 2000, noNaN: true }),
      (length, at) => {
        const halves = split([cable(length)], 0, at);
        const total = halves.reduce((sum, half) => sum + (half.kind === "cable" ? half.lengthM : NaN), 0);
        expect(halves).toHaveLength(2);
        expect(Math.abs(total - length)).toBeLessThan(1e-9 * length);
      },
    ),
  );
});

test("split, move and remove leave the line alone where they cannot apply", () => {
  const pad = newElement("pad", line, 50);
  expect(split([pad], 0)).toEqual([pad]);
  expect(move([pad, cable(1)], 0, 5)).toEqual([pad, cable(1)]);
  expect(move([pad, cable(1)], 0, -1)).toEqual([pad, cable(1)]);
  expect(removeAt([pad], 3)).toEqual([pad]);
});

test("move(elements, from, to) reorders and keeps every element", () => {
  const elements = [cable(1), cable(2), cable(3)];
  expect(move(elements, 0, 2)).toEqual([cable(2), cable(3), cable(1)]);
  expect(insertAt(elements, 1, [cable(9)])).toEqual([cable(1), cable(9), cable(2), cable(3)]);
});

test("undo goes back any depth and redo comes all the way forward", () => {
  let h = history(draft(1));
  for (let i = 2; i <= 40; i++) h = edited(h, draft(i), null);
  const last = h.present;
  for (let i = 0; i < 60; i++) h = undone(h);
  expect(h.present).toEqual(draft(1));
  for (let i = 0; i < 60; i++) h = redone(h);
  expect(h.present).toBe(last);
});

test("typing in one field is one step back", () => {
  let h = history(draft(1));
  for (const length of [3, 36, 36.5]) h = edited(h, draft(length), "elements.0.lengthM");
  expect(undone(h).present).toEqual(draft(1));
});

test("changeBetween(saved, next) holds the changed fields and nothing else", () => {
  expect(changeBetween(draft(1), { ...draft(1), name: "Roof feeder" })).toEqual({ name: "Roof feeder" });
  expect(changeBetween(draft(1), draft(1))).toEqual({});
  expect(Object.keys(changeBetween(draft(1), draft(2)))).toEqual(["circuit"]);
});

test("a field that cannot be read keeps its text with its element, wherever the element goes", () => {
  const before = [cable(1), cable(2), cable(3)];
  const fault = { text: "abc", message: "not a length" };
  const faults = { "elements.1.lengthM": fault, temperatureC: fault };
  expect(faultsAfter(faults, before, insertAt(before, 0, [cable(9)]))).toEqual({
    "elements.2.lengthM": fault,
    temperatureC: fault,
  });
  expect(faultsAfter(faults, before, removeAt(before, 1))).toEqual({ temperatureC: fault });
  expect(faultsAfter(faults, before, move(before, 1, 0))).toEqual({ "elements.0.lengthM": fault, temperatureC: fault });
  expect(faultsAfter(faults, before, [cable(1.5), ...before.slice(1)])).toBe(faults);
});
