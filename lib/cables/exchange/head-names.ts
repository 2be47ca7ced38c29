/** What people call the columns of a cable list. Pure. */
import type { QuantityKind } from "@/lib/format/unit-spelling";

/** What a column of a foreign table is about. */
export type Meaning =
  | "designation"
  | "aliases"
  | "name"
  | "family"
  | "source"
  | "z0"
  | "velocityFactor"
  | "delay"
  | "capacitance"
  | "inductance"
  | "loopResistance"
  | "coreResistance"
  | "screenResistance"
  | "lossTangent"
  | "loss"
  | "maxFrequency"
  | "maxVoltage"
  | "minBend"
  | "minTemperature"
  | "maxTemperature"
  | "inner"
  | "dielectric"
  | "permittivity"
  | "wire"
  | "spacing"
  | "outerDiameter";

interface Named {
  meaning: Meaning;
  /** undefined: words */
  kind?: QuantityKind;
  /** taken where neither head nor cell has a unit; without it such a cell is refused, since a wrong guess is a wrong cable */
  usual?: string;
  /** as `plainHead` spells them */
  names: string[];
}

export const named: readonly Named[] = [
  {
    meaning: "designation",
    names: ["designation", "type", "cable", "cable type", "part", "part number", "id", "code"],
  },
  { meaning: "aliases", names: ["aliases", "alias", "also called", "other names"] },
  { meaning: "name", names: ["name", "description", "title", "remark", "use"] },
  { meaning: "family", names: ["family", "kind of cable", "class"] },
  { meaning: "source", names: ["source", "data sheet", "datasheet", "sheet", "reference", "origin"] },
  {
    meaning: "z0",
    kind: "resistance",
    usual: "Ω",
    names: ["z0", "z", "zo", "impedance", "characteristic impedance", "nominal impedance", "zc"],
  },
  {
    meaning: "velocityFactor",
    names: ["vf", "nvp", "velocity factor", "velocity", "velocity ratio", "velocity of propagation", "vp", "v/c"],
  },
  { meaning: "delay", kind: "timePerLength", names: ["delay", "propagation delay", "td"] },
  { meaning: "capacitance", kind: "capacitancePerLength", names: ["c", "capacitance", "cap"] },
  { meaning: "inductance", kind: "inductancePerLength", names: ["l", "inductance"] },
  {
    meaning: "loopResistance",
    kind: "resistancePerLength",
    names: ["loop resistance", "r loop", "dc loop resistance", "dc resistance loop", "loop r", "r0", "rdc loop"],
  },
  {
    meaning: "coreResistance",
    kind: "resistancePerLength",
    names: [
      ...["inner conductor resistance", "conductor resistance", "inner resistance", "r inner", "core resistance"],
      ...["resistance per core", "dc resistance inner", "inner dc resistance", "centre conductor resistance"],
    ],
  },
  {
    meaning: "screenResistance",
    kind: "resistancePerLength",
    names: [
      ...["outer conductor resistance", "screen resistance", "shield resistance", "r outer", "outer resistance"],
      ...["dc resistance outer", "outer dc resistance", "braid resistance"],
    ],
  },
  {
    meaning: "lossTangent",
    kind: "number",
    names: ["tan δ", "tan delta", "loss tangent", "tanδ", "dissipation factor"],
  },
  {
    meaning: "maxFrequency",
    kind: "frequency",
    names: ["max frequency", "highest frequency", "maximum frequency", "f max", "fmax", "rated frequency"],
  },
  {
    meaning: "maxVoltage",
    kind: "voltage",
    usual: "V",
    names: ["max voltage", "highest voltage", "maximum voltage", "voltage", "rated voltage"],
  },
  { meaning: "minBend", kind: "length", names: ["min bend", "bend radius", "min bend radius", "least bend radius"] },
  {
    meaning: "minTemperature",
    kind: "temperature",
    usual: "°C",
    names: ["min temperature", "lowest temperature", "t min"],
  },
  {
    meaning: "maxTemperature",
    kind: "temperature",
    usual: "°C",
    names: ["max temperature", "highest temperature", "t max"],
  },
  {
    meaning: "inner",
    kind: "length",
    names: ["inner", "inner conductor", "inner diameter", "centre conductor", "conductor diameter", "d"],
  },
  { meaning: "dielectric", kind: "length", names: ["dielectric", "dielectric diameter", "over dielectric"] },
  { meaning: "permittivity", kind: "number", names: ["permittivity", "εr", "er", "dielectric constant"] },
  { meaning: "wire", kind: "length", names: ["wire", "wire diameter", "core diameter"] },
  { meaning: "spacing", kind: "length", names: ["spacing", "wire spacing", "s"] },
  {
    meaning: "outerDiameter",
    kind: "length",
    names: ["od", "outer diameter", "diameter", "overall diameter", "sheath diameter", "outside diameter", "jacket"],
  },
];

const byName = new Map(named.flatMap((each) => each.names.map((name) => [name, each] as const)));

/** A head in the spelling of `names`: lower case, no underscores, dots or units. */
export function plainHead(text: string): string {
  return text
    .normalize("NFC")
    .toLowerCase()
    .replace(/[\u03b4\u2206]/g, "δ")
    .replace(/₀/g, "0")
    .replace(/[_.:,]+/g, " ")
    .replace(/\b(nom|nominal|typ|typical)\b/g, " ")
    .replace(/\s+/g, " ")
    .trim();
}

export function meaningOf(name: string): Named | undefined {
  return byName.get(name);
}
