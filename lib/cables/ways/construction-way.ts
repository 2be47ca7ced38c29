/** What a construction says of its cable. Pure. */
import type { Construction, Family } from "@/lib/cables/schema";
import { propagated, within } from "@/lib/cables/ways/estimate";
import { unlessRefused } from "@/lib/cables/ways/unless-refused";
import { usualSpreads } from "@/lib/cables/ways/usual-spreads";
import type { WayResult } from "@/lib/cables/ways/way";
import { geometryNotes, geometryOf } from "@/lib/compute/geometry/answer";
import { roundConductor } from "@/lib/line/conductor-shape";
import type { Geometry } from "@/lib/line/geometry";

/** The construction with its two sizes and its permittivity replaced. */
function resized(construction: Construction, inner: number, outer: number, permittivity: number): Construction {
  return construction.kind === "coax"
    ? { ...construction, innerMm: inner, dielectricMm: outer, relativePermittivity: permittivity }
    : { ...construction, wireMm: inner, spacingMm: outer, effectivePermittivity: permittivity };
}

/** Why a construction cannot be, a sentence; null where it can. */
function impossible(construction: Construction): string | null {
  if (construction.kind === "coax") {
    const { innerMm, dielectricMm, relativePermittivity } = construction;
    if (!(dielectricMm > innerMm)) return "The dielectric must be wider than the inner conductor.";
    return relativePermittivity >= 1 ? null : "The permittivity is at least 1.";
  }
  const { wireMm, spacingMm, effectivePermittivity, screen } = construction;
  if (!(spacingMm > wireMm)) return "The wires touch: the spacing is between their centres.";
  if (screen && !(screen.innerMm > spacingMm + wireMm)) return "The wires do not fit into the screen.";
  return effectivePermittivity >= 1 ? null : "The permittivity is at least 1.";
}

/** The resistance of the inner conductor, or of one wire with its lay, ohm per metre of cable. */
function conductorResistance(construction: Construction, { r0, model }: Geometry): number {
  if (construction.kind === "pair") return r0 / 2;
  const resistivity = construction.conductorResistivityOhmM;
  return model.conductors[0]?.r0OhmPerM ?? roundConductor(construction.innerMm / 1000, resistivity).r0OhmPerM;
}

export function constructionWay(construction: Construction, family: Family): WayResult {
  const refusal = impossible(construction);
  if (refusal !== null) return { refusal, notes: [] };
  const [inner, outer, permittivity] =
    construction.kind === "coax"
      ? [construction.innerMm, construction.dielectricMm, construction.relativePermittivity]
      : [construction.wireMm, construction.spacingMm, construction.effectivePermittivity];
  const from = [
    within(inner, usualSpreads.dimension),
    within(outer, usualSpreads.dimension),
    within(permittivity, usualSpreads.permittivity[family]),
  ];
  const of = (figure: (geometry: Geometry) => number) =>
    propagated((...sizes) => {
      const [a = NaN, b = NaN, c = NaN] = sizes;
      const moved = resized(construction, a, b, c);
      return impossible(moved) === null ? (unlessRefused(() => figure(geometryOf(moved))) ?? NaN) : NaN;
    }, from);
  const geometry = unlessRefused(() => geometryOf(construction));
  if (!geometry) return { refusal: "A cable of this construction cannot be worked out.", notes: [] };
  const { model, notes } = geometry;
  return {
    z0: of(({ z0 }) => z0),
    velocityFactor: of(({ velocityFactor }) => velocityFactor),
    capacitance: of(({ capacitance }) => capacitance),
    inductance: of(({ inductance }) => inductance),
    loopResistance: of(({ r0 }) => r0),
    conductorResistance: of((moved) => conductorResistance(construction, moved)),
    lossTangent: construction.lossTangent,
    model,
    notes: geometryNotes(notes),
  };
}
