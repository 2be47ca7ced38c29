/**
 * Stock materials of cables, with where each figure comes from. A figure recalled without its page at hand is marked
 * `memory`, as are those that depend on the make.
 */
export type Seen = "text" | "secondary" | "memory";

export interface Insulation {
  id: string;
  name: string;
  /** relative permittivity, usual range */
  permittivity: readonly [number, number];
  /** at radio frequencies, usual range; absent where the source gives none */
  lossTangent?: readonly [number, number];
  source: string;
  seen: Seen;
}

const ellingson = "S. W. Ellingson, Electromagnetics, Vol. 2, Virginia Tech 2020, appendix A.1";
const handbook = "table of dielectrics in a radio engineers' handbook";

export const insulations: readonly Insulation[] = [
  { id: "air", name: "air", permittivity: [1.0006, 1.001], lossTangent: [0, 0], source: handbook, seen: "secondary" },
  {
    id: "solidPe",
    name: "solid polyethylene",
    permittivity: [2.26, 2.3],
    lossTangent: [2e-4, 5e-4],
    source: ellingson,
    seen: "text",
  },
  {
    id: "foamPe",
    name: "foamed polyethylene",
    permittivity: [1.4, 1.6],
    lossTangent: [2e-4, 5e-4],
    source: "common practice; depends on the share of gas",
    seen: "memory",
  },
  {
    id: "ptfe",
    name: "PTFE",
    permittivity: [2, 2.1],
    lossTangent: [2e-4, 2e-4],
    source: `${ellingson}; ${handbook}`,
    seen: "text",
  },
  { id: "fep", name: "FEP", permittivity: [2.1, 2.1], lossTangent: [7e-4, 7e-4], source: handbook, seen: "memory" },
  { id: "polypropylene", name: "polypropylene", permittivity: [2.3, 2.3], source: ellingson, seen: "text" },
  { id: "polystyrene", name: "polystyrene", permittivity: [2.6, 2.6], source: ellingson, seen: "text" },
  {
    id: "pvc",
    name: "PVC",
    permittivity: [4, 4],
    lossTangent: [0.04, 0.04],
    source: `${handbook}; depends on temperature`,
    seen: "secondary",
  },
  { id: "styrofoam", name: "polystyrene foam", permittivity: [1.1, 1.1], source: ellingson, seen: "text" },
];

export interface Metal {
  id: string;
  name: string;
  /** ohm metre at 20 °C */
  resistivity: number;
  /** per kelvin at 20 °C */
  temperatureCoefficient: number;
  source: string;
  seen: Seen;
}

export const metals: readonly Metal[] = [
  {
    id: "copper",
    name: "annealed copper",
    resistivity: 1.7241e-8,
    temperatureCoefficient: 0.00393,
    source: "IEC 60028: 58 MS/m",
    seen: "secondary",
  },
  {
    id: "aluminium",
    name: "hard-drawn aluminium for conductors",
    resistivity: 2.8264e-8,
    temperatureCoefficient: 0.00403,
    source: "IEC 60889: 61 % of the conductivity of annealed copper",
    seen: "memory",
  },
  {
    id: "silver",
    name: "silver",
    resistivity: 1.59e-8,
    temperatureCoefficient: 0.0038,
    source: "handbook figure",
    seen: "memory",
  },
];

/**
 * Effective diameter of a strand over the diameter across it, by the number of its wires. A strand of this effective
 * diameter has the impedance of the line made with it.
 * Source: a radio engineers' handbook, table of stranded inner conductors; recalled.
 */
export const strandDiameters: readonly { wires: number; factor: number; seen: Seen }[] = [
  { wires: 7, factor: 0.939, seen: "memory" },
  { wires: 19, factor: 0.97, seen: "memory" },
  { wires: 37, factor: 0.98, seen: "memory" },
  { wires: 61, factor: 0.985, seen: "memory" },
  { wires: 91, factor: 0.988, seen: "memory" },
];
