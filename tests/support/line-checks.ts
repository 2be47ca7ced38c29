/** Reads the check values in tests/fixtures/line and turns their inputs into the engine's shapes. */
import { readFileSync } from "node:fs";
import path from "node:path";
import type { Circuit, ConductorForm, Element, LineModel, Termination } from "@/lib/line/element";
import type { Expected } from "@/tests/support/tolerance";

export interface Check<Inputs> {
  name: string;
  inputs: Inputs;
  expected: Record<string, Expected>;
  bounds?: Record<string, number>;
}

/** The cases of one fixture; `name` without ".json". */
export function checks<Inputs>(name: string): Check<Inputs>[] {
  const file = path.resolve(import.meta.dirname, "../fixtures/line", `${name}.json`);
  return (JSON.parse(readFileSync(file, "utf8")) as { cases: Check<Inputs>[] }).cases;
}

/** The same cases for a single `sqrt` and a single `round` conductor term, named by it. */
export function bothForms<Inputs>(name: string): Check<Inputs>[] {
  return ["sqrt", "round"].flatMap((form) =>
    checks<Inputs>(`${name}.${form}`).map((check) => ({ ...check, name: `${check.name} (${form})` })),
  );
}

export interface CheckCable {
  r0_ohm_per_m: number;
  skin_corner_rad_per_s: number | null;
  linf_h_per_m: number;
  cr_f_per_m: number;
  tan_delta: number;
  g0_s_per_m: number;
  skin_form: ConductorForm;
  temperature_c: number;
  temp_coeff_per_k: number;
}

export function modelOf(cable: CheckCable): LineModel {
  return {
    conductors: [
      cable.skin_corner_rad_per_s === null
        ? { form: "constant", r0OhmPerM: cable.r0_ohm_per_m }
        : { form: cable.skin_form, r0OhmPerM: cable.r0_ohm_per_m, skinCornerRadPerS: cable.skin_corner_rad_per_s },
    ],
    lInfHPerM: cable.linf_h_per_m,
    cFPerM: cable.cr_f_per_m,
    lossTangent: cable.tan_delta,
    g0SPerM: cable.g0_s_per_m,
    temperatureCoefficientPerK: cable.temp_coeff_per_k,
  };
}

export interface CheckTermination {
  type?: "impedance" | "open" | "short" | "series_rc" | "parallel_rl";
  re_ohm?: number;
  im_ohm?: number;
  r_ohm?: number;
  c_f?: number;
  l_h?: number;
}

export function terminationOf(load: CheckTermination): Termination {
  switch (load.type) {
    case "open":
    case "short":
      return { kind: load.type };
    case "series_rc":
      return { kind: "network", topology: "series", rOhm: load.r_ohm!, cF: load.c_f! };
    case "parallel_rl":
      return { kind: "network", topology: "parallel", rOhm: load.r_ohm!, lH: load.l_h! };
    default:
      return { kind: "constant", reOhm: load.re_ohm!, imOhm: load.im_ohm ?? 0 };
  }
}

interface CheckElement {
  type: "cable" | "stub" | "lumped" | "pad" | "connector" | "parallel_identical" | "parallel_cables";
  cable: CheckCable;
  length_m: number;
  connection: "shunt" | "series";
  end: "open" | "short";
  part: "R" | "L" | "C";
  value_ohm?: number;
  value_h?: number;
  value_f?: number;
  q?: number;
  q_frequency_hz: number | null;
  form: "T" | "pi";
  loss_db: number;
  z_ohm: number;
  z_out_ohm?: number;
  a_db: number;
  b_db_per_sqrt_ghz: number;
  count: number;
  branches: { cable: CheckCable; length_m: number }[];
}

export interface CheckCircuit {
  source: CheckTermination;
  elements: CheckElement[];
  load: CheckTermination;
}

export function circuitOf({ source, elements, load }: CheckCircuit): Circuit {
  return { source: terminationOf(source), elements: elements.map(elementOf), load: terminationOf(load) };
}

function elementOf(element: CheckElement): Element {
  const line = () => ({
    line: { model: modelOf(element.cable) },
    lengthM: element.length_m,
    temperatureC: element.cable.temperature_c,
  });
  switch (element.type) {
    case "cable":
      return { kind: "cable", ...line() };
    case "stub":
      return { kind: "stub", ...line(), connection: element.connection, end: element.end };
    case "parallel_identical":
      return { kind: "cable", ...line(), paralleled: element.count };
    case "parallel_cables":
      return {
        kind: "parallel",
        branches: element.branches.map(({ cable, length_m }) => ({
          line: { model: modelOf(cable) },
          lengthM: length_m,
        })),
      };
    case "pad":
      return {
        kind: "pad",
        topology: element.form,
        lossDb: element.loss_db,
        inputOhm: element.z_ohm,
        outputOhm: element.z_out_ohm ?? element.z_ohm,
      };
    case "connector":
      return {
        kind: "joint",
        lossDb: element.a_db,
        lossDbAtOneGhz: element.b_db_per_sqrt_ghz,
        referenceOhm: element.z_ohm,
      };
    case "lumped":
      return partOf(element);
  }
}

function partOf(element: CheckElement): Element {
  const value = { R: { rOhm: element.value_ohm }, L: { lH: element.value_h }, C: { cF: element.value_f } }[
    element.part
  ];
  const q = element.q === undefined || element.q === null ? {} : { q: element.q };
  const qAtHz =
    element.q_frequency_hz === null || element.q_frequency_hz === undefined ? {} : { qAtHz: element.q_frequency_hz };
  return { kind: "part", connection: element.connection, ...value, ...q, ...qAtHz };
}
