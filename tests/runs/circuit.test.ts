import { describe, expect, test } from "vitest";
import type { Line } from "@/lib/line/element";
import { cableIdsOf, cableRefsOf, referredElement, resolveCircuit, totalLength } from "@/lib/runs/circuit";
import { saveSentence } from "@/lib/runs/revision";
import type { Circuit, Element } from "@/lib/runs/circuit-schema";
import { coaxModel } from "@/tests/support/cables";

const line = (cableId: string, revision?: number) => ({ cableId, revision });
const source = { kind: "constant", reOhm: 50, imOhm: 0 } as const;

const elements: Element[] = [
  { kind: "cable", line: line("a"), lengthM: 2 },
  { kind: "joint", lossDb: 0.1 },
  { kind: "stub", connection: "shunt", end: "open", line: line("b", 3), lengthM: 9 },
  {
    kind: "parallel",
    branches: [
      { line: line("a"), lengthM: 5 },
      { line: { model: coaxModel }, lengthM: 6 },
    ],
  },
];
const circuit: Circuit = { source, elements, load: { kind: "open" }, referenceOhm: 50 };

test("cableRefsOf(circuit) gives every reference to the catalogue with its place, in order", () => {
  expect(cableRefsOf(circuit)).toEqual([
    { path: "elements.0.line", ref: line("a") },
    { path: "elements.2.line", ref: line("b", 3) },
    { path: "elements.3.branches.0.line", ref: line("a") },
  ]);
});

test("cableIdsOf(circuit) gives each cable once, in order", () => {
  expect(cableIdsOf(circuit)).toEqual(["a", "b"]);
});

test("totalLength(circuit) counts what lies along the way: no stubs, and one of parallel branches", () => {
  expect(totalLength(circuit)).toBe(7);
  expect(totalLength({ ...circuit, elements: [] })).toBe(0);
});

describe("resolveCircuit(circuit, findLine)", () => {
  const find = ({ cableId, revision }: { cableId: string; revision?: number }): Line => ({
    ...{ model: coaxModel, cableId, revision: revision ?? 1 },
  });

  test("puts a line in the place of every reference and leaves the rest", () => {
    const result = resolveCircuit(circuit, find);
    if (!("circuit" in result)) throw new Error("it has faults");
    const a = { model: coaxModel, cableId: "a", revision: 1 };
    expect(result.circuit).toEqual({
      ...circuit,
      elements: [
        { ...elements[0], line: a },
        elements[1],
        { ...elements[2], line: { model: coaxModel, cableId: "b", revision: 3 } },
        {
          kind: "parallel",
          branches: [
            { line: a, lengthM: 5 },
            { line: { model: coaxModel }, lengthM: 6 },
          ],
        },
      ],
    });
  });

  test("says of every reference that leads nowhere where it is, and gives no circuit", () => {
    const result = resolveCircuit(circuit, (ref) => (ref.cableId === "b" ? find(ref) : undefined));
    expect(result).toEqual({
      faults: [
        { path: "elements.0.line", message: "There is no such cable in the catalogue." },
        { path: "elements.3.branches.0.line", message: "There is no such cable in the catalogue." },
      ],
    });
  });

  test("is undone by referredElement, which gives a line from the catalogue back as the reference it was", () => {
    const result = resolveCircuit(circuit, find);
    if (!("circuit" in result)) throw new Error("it has faults");
    const again = result.circuit.elements.map(referredElement);
    expect(cableRefsOf({ ...circuit, elements: again })).toEqual([
      { path: "elements.0.line", ref: line("a", 1) },
      { path: "elements.2.line", ref: line("b", 3) },
      { path: "elements.3.branches.0.line", ref: line("a", 1) },
    ]);
    expect(again[3]).toMatchObject({ branches: [{}, { line: { model: coaxModel } }] });
  });
});

describe("saveSentence(before, after)", () => {
  const before = {
    ...{
      name: "n",
      site: "s",
      folder: "f",
      circuit,
      temperatureC: 20,
      designHz: 1e8,
      availablePowerW: null,
      bandHz: null,
    },
    ...{ targets: [], sourceName: "S", loadName: "L" },
  };
  const joint: Element = { kind: "joint", name: "J1 mast", lossDb: 0.1 };

  test.each<[string, object]>([
    ["Changed the name.", { name: "other" }],
    ["Changed the band and the targets.", { bandHz: [1, 2], targets: [{ quantity: "loss", atMost: 1 }] }],
    ["Changed the site, the temperature and the power.", { availablePowerW: 5, temperatureC: 25, site: "x" }],
    ["Changed the load.", { circuit: { ...circuit, load: source } }],
    [
      "Changed the source and the reference.",
      { circuit: { ...circuit, source: { ...source, reOhm: 75 }, referenceOhm: 75 } },
    ],
    ["Changed one more element.", { circuit: { ...circuit, elements: [...elements, joint] } }],
    ["Changed 2 more elements.", { circuit: { ...circuit, elements: [...elements, joint, joint] } }],
    ["Changed 3 elements fewer.", { circuit: { ...circuit, elements: elements.slice(0, 1) } }],
    ["Changed the element “J1 mast”.", { circuit: { ...circuit, elements: elements.with(1, joint) } }],
    ["Changed element 1.", { circuit: { ...circuit, elements: elements.with(0, { kind: "joint" }) } }],
    ["Changed 2 elements.", { circuit: { ...circuit, elements: elements.with(0, joint).with(1, joint) } }],
  ])("is “%s”", (sentence, change) => {
    expect(saveSentence(before, { ...before, ...change })).toBe(sentence);
  });

  test("is nothing when nothing changed", () => {
    expect(saveSentence(before, structuredClone(before))).toBeUndefined();
  });
});
