/** Whether what an entry states agrees with itself and with the model that runs are worked out with. Pure. */
import { lossTable, tableRange } from "@/lib/cables/loss-rows";
import { lossDbPer100m } from "@/lib/cables/model";
import type { Cable, Figure } from "@/lib/cables/schema";
import { nominalFigures } from "@/lib/line/cable";
import { coaxCutoff } from "@/lib/line/coax-cutoff";
import { agreementLimits, agreementOf, figuresFromTwo, type PerLengthQuantity } from "@/lib/line/per-length";
import { modelAt } from "@/lib/cables/warm-model";

/** One way to the impedance, with how far the tolerances of its figures let it reach; ohm. */
export interface ImpedanceRoute {
  route: "stated" | "capacitanceAndVelocity" | "model";
  z0Ohm: number;
  fromOhm: number;
  toOhm: number;
}

export type Verdict = "fine" | "look" | "contradiction";

export interface Check {
  check: "triangle" | "model" | "lossTable" | "cutoff";
  verdict: Verdict;
  /** per cent; of the cut-off: by how much it lies above the highest rated frequency */
  percent: number;
  /** of the cut-off: where it lies, hertz */
  frequencyHz?: number;
}

export interface AgreementOfEntry {
  routes: ImpedanceRoute[];
  checks: Check[];
  /** the one figure that does not fit the others, where there is exactly one */
  oddOneOut: PerLengthQuantity | undefined;
}

const perLength: Record<string, PerLengthQuantity> = {
  z0Ohm: "z0",
  velocityFactor: "velocityFactor",
  cFPerM: "capacitance",
  lInfHPerM: "inductance",
  delaySPerM: "delay",
};

type StatedFigure = Pick<Figure, "valueSi" | "toleranceSi">;

/** What the entry states of its own accord; what was worked out from it cannot bear witness. */
export function statedFigures(figures: readonly Figure[]): Map<PerLengthQuantity, StatedFigure> {
  const stated = new Map<PerLengthQuantity, StatedFigure>();
  for (const { quantity, kind, valueSi, toleranceSi } of figures) {
    const name = Object.hasOwn(perLength, quantity) ? perLength[quantity] : undefined;
    const isWitness = kind === "nominal" || kind === "typical" || kind === "measured";
    if (name && isWitness && valueSi > 0 && !stated.has(name)) stated.set(name, { valueSi, toleranceSi });
  }
  return stated;
}

/** Limits as the house has them: rounding explains 3 per cent, 6 per cent is a contradiction. */
function verdictOf(deviation: number): Verdict {
  if (deviation <= agreementLimits.fine) return "fine";
  return deviation <= agreementLimits.look ? "look" : "contradiction";
}

function ends({ valueSi, toleranceSi = 0 }: StatedFigure): [number, number] {
  return [Math.max(valueSi - toleranceSi, valueSi * 1e-6), valueSi + toleranceSi];
}

function routesOf(stated: Map<PerLengthQuantity, StatedFigure>, modelOhm: number): ImpedanceRoute[] {
  const [z0, capacitance, velocity] = [stated.get("z0"), stated.get("capacitance"), stated.get("velocityFactor")];
  const routes: ImpedanceRoute[] = [];
  if (z0) {
    const [fromOhm, toOhm] = ends(z0);
    routes.push({ route: "stated", z0Ohm: z0.valueSi, fromOhm, toOhm });
  }
  if (capacitance && velocity) {
    const impedance = (c: number, v: number) =>
      figuresFromTwo({ quantity: "capacitance", value: c }, { quantity: "velocityFactor", value: v })?.z0 ?? NaN;
    const [cLow, cHigh] = ends(capacitance);
    const [vLow, vHigh] = ends(velocity);
    routes.push({
      route: "capacitanceAndVelocity",
      z0Ohm: impedance(capacitance.valueSi, velocity.valueSi),
      fromOhm: impedance(cHigh, vHigh),
      toOhm: impedance(cLow, vLow),
    });
  }
  routes.push({ route: "model", z0Ohm: modelOhm, fromOhm: modelOhm, toOhm: modelOhm });
  return routes;
}

const check = (name: Check["check"], deviation: number): Check => ({
  check: name,
  verdict: verdictOf(Math.abs(deviation)),
  percent: 100 * deviation,
});

/** The largest deviation, with its sign; undefined of nothing. */
function furthest(deviations: readonly number[]): number | undefined {
  return deviations.length === 0 ? undefined : deviations.reduce((a, b) => (Math.abs(b) > Math.abs(a) ? b : a));
}

function modelChecks(
  { model, figures }: Pick<Cable, "model" | "figures">,
  stated: Map<PerLengthQuantity, StatedFigure>,
) {
  const ofModel = nominalFigures(model);
  const apart = furthest([...stated].map(([quantity, { valueSi }]) => ofModel[quantity] / valueSi - 1));
  const table = lossTable(figures);
  const errors = (tableRange(table) ? table.points : []).flatMap(
    ({ frequencyHz, lossDbPer100m: given, temperatureC }) => {
      const warm = modelAt(model, temperatureC);
      return warm ? [lossDbPer100m(warm.model, frequencyHz) / given - 1] : [];
    },
  );
  const squares = errors.reduce((sum, error) => sum + error * error, 0);
  return [
    ...(apart === undefined ? [] : [check("model", apart)]),
    ...(errors.length === 0 ? [] : [check("lossTable", Math.sqrt(squares / errors.length))]),
  ];
}

/** A coaxial cable must not be rated up to where its second mode begins. */
function cutoffCheck({ construction, limits }: Pick<Cable, "construction" | "limits">): Check[] {
  if (construction?.kind !== "coax" || limits.maxFrequencyHz === undefined) return [];
  const { innerMm, dielectricMm, relativePermittivity } = construction;
  if (!(dielectricMm > innerMm && relativePermittivity >= 1)) return [];
  const frequencyHz = coaxCutoff(innerMm / 1000, dielectricMm / 1000, relativePermittivity);
  const above = frequencyHz / limits.maxFrequencyHz - 1;
  return [{ check: "cutoff", verdict: above > 0 ? "fine" : "contradiction", percent: 100 * above, frequencyHz }];
}

export function agreementOfEntry(
  cable: Pick<Cable, "model" | "figures" | "construction" | "limits">,
): AgreementOfEntry {
  const stated = statedFigures(cable.figures);
  const agreement = agreementOf([...stated].map(([quantity, { valueSi }]) => ({ quantity, value: valueSi })));
  const triangle = furthest(agreement?.compared.map(({ deviation }) => deviation) ?? []);
  return {
    routes: routesOf(stated, nominalFigures(cable.model).z0),
    checks: [
      ...(triangle === undefined ? [] : [check("triangle", triangle)]),
      ...modelChecks(cable, stated),
      ...cutoffCheck(cable),
    ],
    oddOneOut: agreement?.oddOneOut,
  };
}
