/** The inputs of an entry of which only its figures are stored, as those that were brought in are. Pure. */
import type { EntryInputs } from "@/lib/cables/inputs";
import { lossTable } from "@/lib/cables/loss-rows";
import type { Figure } from "@/lib/cables/schema";

const nominalKinds: readonly Figure["kind"][] = ["nominal", "typical"];

/** The figure of a quantity that its source states. */
function stated(figures: readonly Figure[], quantity: string): Figure | undefined {
  return figures.find((figure) => figure.quantity === quantity && nominalKinds.includes(figure.kind));
}

function nominalOf(figures: readonly Figure[]): NonNullable<EntryInputs["nominal"]> {
  const [z0, velocity, c] = ["z0Ohm", "velocityFactor", "cFPerM"].map((quantity) => stated(figures, quantity));
  const others = {
    lInfHPerM: stated(figures, "lInfHPerM"),
    loopResistanceOhmPerM: stated(figures, "r0OhmPerM"),
    conductorResistanceOhmPerM: stated(figures, "conductorOhmPerM"),
    lossTangent: stated(figures, "lossTangent"),
  };
  const values = {
    ...{ z0Ohm: z0?.valueSi, z0ToleranceOhm: z0?.toleranceSi, velocityFactor: velocity?.valueSi },
    ...{ velocityFactorTolerance: velocity?.toleranceSi, cFPerM: c?.valueSi, cToleranceFPerM: c?.toleranceSi },
    ...Object.fromEntries(Object.entries(others).map(([name, figure]) => [name, figure?.valueSi])),
  };
  return Object.fromEntries(Object.entries(values).filter(([, value]) => value !== undefined));
}

/** Sources in words become titles; what kind they are nobody said, so they count as data sheets. */
const sourceOf = (figure: Figure | undefined) =>
  figure && { sources: figure.provenance ?? { kind: "dataSheet" as const, title: figure.source.slice(0, 200) } };

export function inputsOfFigures(figures: readonly Figure[]): EntryInputs {
  const nominal = nominalOf(figures);
  const { points } = lossTable(figures);
  const isMeasured = points.length > 0 && points.every(({ kind }) => kind === "measured");
  const kind = isMeasured ? "measured" : points.every(({ kind: each }) => each === "typical") ? "typical" : "nominal";
  const ofNominal = sourceOf(stated(figures, "z0Ohm") ?? stated(figures, "velocityFactor"));
  const ofTable = sourceOf(figures.find(({ quantity, kind: each }) => quantity === "lossDbPerM" && each === kind));
  return {
    ...(Object.keys(nominal).length > 0 && { nominal }),
    ...(points.length > 0 && {
      lossTable: {
        ...{ temperatureC: points[0]?.temperatureC ?? 20, kind },
        rows: points.map(({ frequencyHz, lossDbPer100m }) => ({
          frequencyHz,
          lossDbPerM: Number((lossDbPer100m / 100).toPrecision(12)),
        })),
      },
    }),
    ...((ofNominal ?? ofTable) && {
      sources: {
        ...(ofNominal && { nominal: ofNominal.sources }),
        ...(ofTable && { lossTable: ofTable.sources }),
      },
    }),
  };
}
