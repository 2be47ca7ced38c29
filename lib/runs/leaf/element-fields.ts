/** The fields of each kind of element. To give an element a new value to edit, add a line here. */
import {
  choice,
  optionalQuantity,
  quantity,
  type LeafField,
  type LineField,
  type TypedField,
} from "@/lib/runs/leaf/field";
import { terminationFields } from "@/lib/runs/leaf/termination-fields";
import type { Termination } from "@/lib/line/element";
import type { Element, LineRef } from "@/lib/runs/circuit-schema";

type Of<K extends Element["kind"]> = Extract<Element, { kind: K }>;

const longest = 1e7;
const positive = { isPositive: true };
const notNegative = { isNotNegative: true };
const across: [string, string][] = [
  ["shunt", "Across the line"],
  ["series", "In the line"],
];

function lineField<T extends { line: LineRef }>(): LineField<T> {
  return {
    input: "line",
    name: "line",
    label: "Cable",
    text: (edited) => ("cableId" in edited.line ? edited.line.cableId : ""),
    write: (edited, line) => ({ ...edited, line }),
  };
}

const laid = <T extends Of<"cable"> | Of<"stub">>(): LeafField<T>[] => [
  quantity<T>({ key: "lengthM", label: "Length", kind: "length", bounds: { ...notNegative, most: longest } }),
  optionalQuantity<T>({ key: "lengthToleranceM", label: "Cut tolerance ±", kind: "length", bounds: notNegative }),
  optionalQuantity<T>({
    key: "temperatureC",
    label: "Temperature",
    kind: "temperature",
    width: "narrow",
    bounds: { least: -200, most: 400 },
  }),
  optionalQuantity<T>({
    key: "paralleled",
    label: "In parallel",
    kind: "number",
    width: "narrow",
    bounds: { least: 1, most: 100, isWhole: true },
  }),
];

/** What a termination's fields do, done to the termination inside something else. */
function inside<T>(
  read: (edited: T) => Termination,
  write: (edited: T, next: Termination) => T,
  fields: LeafField<Termination>[],
): LeafField<T>[] {
  return fields.map((field) => ({
    ...field,
    name: `termination_${field.name}`,
    text: (edited: T) => field.text(read(edited)),
    isShown: (edited: T) => field.isShown?.(read(edited)) ?? true,
    write: (edited: T, value: never) => write(edited, field.write(read(edited), value)),
  })) as LeafField<T>[];
}

function stubEnd(edited: Of<"stub">): Termination {
  return edited.end === "open" || edited.end === "short" ? { kind: edited.end } : edited.end;
}

function withEnd(edited: Of<"stub">, end: Termination): Of<"stub"> {
  return { ...edited, end: end.kind === "open" || end.kind === "short" ? end.kind : end };
}

const partKinds: [string, string][] = [
  ["rOhm", "Resistor"],
  ["lH", "Coil"],
  ["cF", "Capacitor"],
];
const partKind = (edited: Of<"part">) => (edited.rOhm !== undefined ? "rOhm" : edited.lH !== undefined ? "lH" : "cF");
const firstValues: Record<string, number> = { rOhm: 50, lH: 100e-9, cF: 100e-12 };

function asPart({ kind, name, connection }: Of<"part">, value: string): Of<"part"> {
  return { kind, ...(name === undefined ? {} : { name }), connection, [value]: firstValues[value] };
}

/** Without a Q there is no frequency of Q either. */
const qField: TypedField<Of<"part">> = {
  ...optionalQuantity<Of<"part">>({
    key: "q",
    label: "Q",
    kind: "number",
    width: "narrow",
    bounds: positive,
    isShown: (e) => e.rOhm === undefined,
  }),
  write: (edited, value: number | undefined) => {
    const { q: _q, qAtHz, ...rest } = edited;
    if (value === undefined) return rest;
    return { ...rest, q: value, ...(qAtHz === undefined ? {} : { qAtHz }) };
  },
};

const partFields: LeafField<Of<"part">>[] = [
  choice<Of<"part">, "kind">("kind", "Part", partKinds, { text: partKind, write: asPart }),
  choice<Of<"part">, "connection">("connection", "Placed", across),
  quantity({
    key: "rOhm",
    label: "Resistance",
    kind: "resistance",
    bounds: notNegative,
    isShown: (e) => e.rOhm !== undefined,
  }),
  quantity({
    key: "lH",
    label: "Inductance",
    kind: "inductance",
    bounds: notNegative,
    isShown: (e) => e.lH !== undefined,
  }),
  quantity({
    key: "cF",
    label: "Capacitance",
    kind: "capacitance",
    bounds: positive,
    isShown: (e) => e.cF !== undefined,
  }),
  qField,
  optionalQuantity({
    key: "qAtHz",
    label: "Q at",
    kind: "frequency",
    bounds: positive,
    isShown: (e) => e.q !== undefined,
  }),
];

const fieldsOf: { [K in Element["kind"]]: LeafField<Of<K>>[] } = {
  cable: [lineField(), ...laid<Of<"cable">>()],
  parallel: [
    optionalQuantity({
      key: "temperatureC",
      label: "Temperature",
      kind: "temperature",
      width: "narrow",
      bounds: { least: -200, most: 400 },
    }),
  ],
  stub: [
    lineField(),
    choice<Of<"stub">, "connection">("connection", "Placed", across),
    ...inside<Of<"stub">>(
      stubEnd,
      withEnd,
      terminationFields().map((f) => (f.name === "kind" ? { ...f, label: "Far end" } : f)),
    ),
    ...laid<Of<"stub">>(),
  ],
  shunt: inside<Of<"shunt">>(
    (e) => e.termination,
    (e, termination) => ({ ...e, termination }),
    terminationFields(),
  ),
  part: partFields,
  pad: [
    choice<Of<"pad">, "topology">("topology", "Shape", [
      ["T", "T"],
      ["pi", "pi"],
    ]),
    quantity({ key: "lossDb", label: "Loss", kind: "loss", bounds: { ...notNegative, most: 200 } }),
    quantity({ key: "inputOhm", label: "Source side", kind: "resistance", bounds: positive }),
    quantity({ key: "outputOhm", label: "Load side", kind: "resistance", bounds: positive }),
  ],
  joint: [
    optionalQuantity({ key: "lossDb", label: "Loss", kind: "loss", bounds: { ...notNegative, most: 200 } }),
    optionalQuantity({
      key: "lossDbAtOneGhz",
      label: "Loss at 1 GHz, as √f",
      kind: "loss",
      bounds: { ...notNegative, most: 200 },
    }),
    optionalQuantity({ key: "shuntF", label: "Capacitance", kind: "capacitance", bounds: notNegative }),
    optionalQuantity({ key: "referenceOhm", label: "Reference", kind: "resistance", bounds: positive }),
  ],
  transformer: [quantity({ key: "turnsRatio", label: "Turns, source to load", kind: "number", bounds: positive })],
};

export function elementFields(kind: Element["kind"]): LeafField<Element>[] {
  return fieldsOf[kind] as unknown as LeafField<Element>[];
}
