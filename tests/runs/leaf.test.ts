import { expect, test } from "vitest";
import { newElement } from "@/lib/runs/edit";
import { elementFields } from "@/lib/runs/leaf/element-fields";
import { elementKinds } from "@/lib/runs/leaf/element-kinds";
import type { LeafField } from "@/lib/runs/leaf/field";
import { terminationFields } from "@/lib/runs/leaf/termination-fields";
import type { Termination } from "@/lib/line/element";
import { terminationSchema } from "@/lib/runs/termination-schema";
import { elementSchema, type Element } from "@/lib/runs/circuit-schema";

const line = { cableId: "c50-f10" };

function field<T>(fields: LeafField<T>[], name: string): LeafField<T> {
  const found = fields.find((f) => f.name === name);
  if (!found) throw new Error(`no field ${name}`);
  return found;
}

/** Types a text into a field: the element after it, or the message beside it. */
function typed<T>(fields: LeafField<T>[], edited: T, name: string, text: string): T | string {
  const f = field(fields, name);
  if (f.input !== "typed") return f.write(edited, text as never);
  const read = f.schema.safeParse(text);
  return read.success ? f.write(edited, read.data as never) : (read.error.issues[0]?.message ?? "");
}

test.each(elementKinds.map(({ kind }) => kind))("every field of a %s writes back what it shows", (kind) => {
  const element = newElement(kind, line, 50);
  for (const f of elementFields(kind)) {
    if (f.input !== "typed" || f.isShown?.(element) === false) continue;
    const after = typed(elementFields(kind), element, f.name, f.text(element));
    expect(elementSchema.safeParse(after).error, f.name).toBeUndefined();
    expect(after, f.name).toEqual(element);
  }
});

test("a length typed in feet becomes metres, an emptied tolerance is left out", () => {
  const cable = newElement("cable", line, 50);
  expect(typed(elementFields("cable"), cable, "lengthM", "118 ft")).toMatchObject({ lengthM: 35.9664 });
  const toleranced = typed(elementFields("cable"), cable, "lengthToleranceM", "10 mm") as Element;
  expect(toleranced).toMatchObject({ lengthToleranceM: 0.01 });
  expect(typed(elementFields("cable"), toleranced, "lengthToleranceM", "")).toEqual(cable);
});

test.each([
  ["cable", "lengthM", "-4", "0 or more."],
  ["cable", "lengthM", "4 MHz", /not a unit of length/],
  ["cable", "lengthM", "1e9 km", "At most 10000000."],
  ["cable", "paralleled", "1.5", "A whole number."],
  ["cable", "temperatureC", "9000", "At most 400."],
  ["pad", "inputOhm", "0", "More than 0."],
] as const)("%s.%s refuses %j with a sentence", (kind, name, text, message) => {
  expect(typed(elementFields(kind), newElement(kind, line, 50), name, text)).toEqual(
    typeof message === "string" ? message : expect.stringMatching(message),
  );
});

test("a part keeps its place when it turns from coil to capacitor, and loses its Q with its frequency", () => {
  const coil: Element = { kind: "part", connection: "series", lH: 350e-9, q: 120, qAtHz: 27.2e6 };
  expect(typed(elementFields("part"), coil, "kind", "cF")).toEqual({ kind: "part", connection: "series", cF: 100e-12 });
  expect(typed(elementFields("part"), coil, "q", "")).toEqual({ kind: "part", connection: "series", lH: 350e-9 });
});

test.each(["constant", "series", "parallel", "open", "short"])(
  "a termination can be turned into %s and stays valid",
  (kind) => {
    const fields = terminationFields();
    for (const before of [
      { kind: "constant", reOhm: 22, imOhm: -35 },
      { kind: "open" },
      { kind: "network", topology: "series", rOhm: 50, cF: 1e-12 },
    ] satisfies Termination[])
      expect(terminationSchema.safeParse(typed<Termination>(fields, before, "kind", kind)).error).toBeUndefined();
  },
);

test("an impedance with a negative resistance is refused", () => {
  const load: Termination = { kind: "constant", reOhm: 50, imOhm: 0 };
  expect(typed<Termination>(terminationFields(), load, "impedance", "22-35j")).toEqual({
    kind: "constant",
    reOhm: 22,
    imOhm: -35,
  });
  expect(typed<Termination>(terminationFields(), load, "impedance", "-5")).toBe("The resistance cannot be negative.");
});
