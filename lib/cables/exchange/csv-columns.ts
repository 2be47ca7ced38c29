/**
 * The columns of our own CSV: a head with its unit, and where in an entry the cell belongs. All of them together carry an
 * entry without loss; the parts that are lists of their own (figures, inputs, loss slopes) stand in their cell as JSON.
 * The order is the order in the file. Pure.
 */

/** How a cell is written. A number's text is its SI value with the point moved by `shift` places. */
export type CellForm =
  | { as: "text" | "flag" | "json" | "list" | "words" }
  | { as: "number"; shift: number }
  /** worked out from the rest for whoever reads the table; not read back */
  | { as: "derived"; shift: number };

export type OwnColumn = CellForm & {
  head: string;
  /** dotted, into the entry */
  path: string;
};

const text = (head: string, path: string): OwnColumn => ({ head, path, as: "text" });
const json = (head: string, path: string): OwnColumn => ({ head, path, as: "json" });
const number = (head: string, path: string, shift = 0): OwnColumn => ({ head, path, as: "number", shift });
const derived = (head: string, path: string, shift = 0): OwnColumn => ({ head, path, as: "derived", shift });

function conductor(i: number): OwnColumn[] {
  const path = `model.conductors.${i}`;
  return [
    text(`model conductor ${i + 1} form`, `${path}.form`),
    number(`model conductor ${i + 1} R0 [Ω/km]`, `${path}.r0OhmPerM`, 3),
    number(`model conductor ${i + 1} skin corner [krad/s]`, `${path}.skinCornerRadPerS`, -3),
  ];
}

const construction: OwnColumn[] = [
  text("construction kind", "construction.kind"),
  number("construction inner [mm]", "construction.innerMm"),
  number("construction dielectric [mm]", "construction.dielectricMm"),
  number("construction permittivity", "construction.relativePermittivity"),
  number("construction wire [mm]", "construction.wireMm"),
  number("construction spacing [mm]", "construction.spacingMm"),
  number("construction effective permittivity", "construction.effectivePermittivity"),
  number("construction lay [mm]", "construction.layMm"),
  number("construction screen bore [mm]", "construction.screen.innerMm"),
  number("construction tan δ", "construction.lossTangent"),
  number("construction resistivity [nΩ·m]", "construction.conductorResistivityOhmM", 9),
  number("construction strand factor", "construction.strandFactor"),
  number("construction braid factor", "construction.braidFactor"),
  number("construction shield thickness [mm]", "construction.shieldThicknessMm"),
  number("construction outer diameter [mm]", "construction.outerDiameterMm"),
];

const build: OwnColumn[] = [
  text("build conductor", "build.conductor"),
  { head: "build stranded", path: "build.isStranded", as: "flag" },
  text("build dielectric", "build.dielectric"),
  text("build dielectric name", "build.dielectricName"),
  { head: "build screen", path: "build.screen", as: "words" },
  text("build screen name", "build.screenName"),
  text("build jacket", "build.jacket"),
  number("build pairs", "build.pairCount"),
];

const limits: OwnColumn[] = [
  number("highest frequency [MHz]", "limits.maxFrequencyHz", -6),
  number("highest voltage [V]", "limits.maxVoltageV"),
  number("least bend radius [mm]", "limits.minBendMm"),
  number("lowest temperature [°C]", "limits.minTemperatureC"),
  number("highest temperature [°C]", "limits.maxTemperatureC"),
];

export const ownColumns: readonly OwnColumn[] = [
  text("designation", "designation"),
  { head: "aliases", path: "aliases", as: "list" },
  text("name", "name"),
  text("family", "family"),
  text("condition", "condition"),
  text("state", "standing.state"),
  number("revision", "standing.revision"),
  { head: "preferred", path: "standing.preferred", as: "flag" },
  text("successor", "standing.successor.designation"),
  text("equivalence", "standing.successor.equivalence"),
  derived("derived Z0 [Ω]", "derived.z0Ohm"),
  derived("derived VF", "derived.velocityFactor"),
  derived("derived loss at 10 MHz [dB/100 m]", "derived.lossLowDbPer100m"),
  derived("derived loss at 1 GHz [dB/100 m]", "derived.lossHighDbPer100m"),
  ...conductor(0),
  ...conductor(1),
  number("model L [nH/m]", "model.lInfHPerM", 9),
  number("model C [pF/m]", "model.cFPerM", 12),
  number("model tan δ", "model.lossTangent"),
  number("model G [S/m]", "model.g0SPerM"),
  number("model R0 temperature coefficient [1/K]", "model.temperatureCoefficientPerK"),
  json("model loss slopes", "model.lossSlopes"),
  ...limits,
  ...construction,
  ...build,
  json("figures", "figures"),
  json("inputs", "inputs"),
];

/** A list of names in one cell: "thin grey; bench lead", a ";" or "\" inside a name with a "\" before it. */
export function listText(names: readonly string[]): string {
  return names.map((name) => name.replace(/[\\;]/g, "\\$&")).join("; ");
}

export function readList(cell: string): string[] {
  const names = [...cell.matchAll(/(?:\\.|[^\\;])+/gs)].map(([name]) => name.replace(/\\(.)/gs, "$1").trim());
  return names.filter((name) => name !== "");
}
