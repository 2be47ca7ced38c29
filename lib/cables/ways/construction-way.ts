/** What a construction says of its cable. Pure. */
import type { Build, Construction, Family } from "@/lib/cables/schema";
import { propagated, within } from "@/lib/cables/ways/estimate";
import { loopOf, withLoop } from "@/lib/cables/ways/loss-way";
import { unlessRefused } from "@/lib/cables/ways/unless-refused";
import { usualSpreads } from "@/lib/cables/ways/usual-spreads";
import type { WayResult } from "@/lib/cables/ways/way";
import { geometryNotes, geometryOf } from "@/lib/compute/geometry/answer";
import type { LineModel } from "@/lib/line/element";
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

/** Copper in the circle round a strand of round wires: 7 of 9 for seven of them, a little less for more. */
const strandFill = 0.77;
/** A strand is longer than its cable by its lay. */
const strandLay = 1.02;

/**
 * Dc resistance of a conductor over that of a solid one of its diameter: by the cross-section its words state, else by how
 * full a strand usually is. Loss at high frequency is not changed by it.
 */
function strandedTimes(construction: Construction, build: Build | null | undefined): number {
  const diameter = construction.kind === "coax" ? construction.innerMm : construction.wireMm;
  const stated = Number(/(\d+(?:\.\d+)?)\s*mm²/.exec(build?.conductor ?? "")?.[1]);
  if (stated > 0) return (Math.PI * diameter ** 2) / 4 / stated;
  return build?.isStranded ? strandLay / strandFill : 1;
}

/** A model whose conductor, or wires, have so many times the dc resistance and the same loss at high frequency. */
function stranded(model: LineModel, times: number, kind: Construction["kind"]): LineModel {
  const [first, ...rest] = model.conductors;
  if (!first || times === 1) return model;
  const conductors = kind === "pair" ? model.conductors : [first];
  const loop = conductors.reduce((sum, { r0OhmPerM }) => sum + r0OhmPerM, 0);
  return { ...model, conductors: [...withLoop(conductors, loop * times), ...(kind === "pair" ? [] : rest)] };
}

/** The resistance of the inner conductor, or of one wire with its lay, ohm per metre of cable. */
function conductorResistance(kind: Construction["kind"], model: LineModel): number {
  return (model.conductors[0]?.r0OhmPerM ?? NaN) / (kind === "pair" ? 2 : 1);
}

/** @param build - for the make of the conductor; without it a solid one */
export function constructionWay(construction: Construction, family: Family, build?: Build | null): WayResult {
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
  const times = strandedTimes(construction, build);
  const withStrands = (line: LineModel) => stranded(line, times, construction.kind);
  return {
    z0: of(({ z0 }) => z0),
    velocityFactor: of(({ velocityFactor }) => velocityFactor),
    capacitance: of(({ capacitance }) => capacitance),
    inductance: of(({ inductance }) => inductance),
    loopResistance: of(({ model }) => loopOf(withStrands(model))),
    conductorResistance: of(({ model }) => conductorResistance(construction.kind, withStrands(model))),
    lossTangent: construction.lossTangent,
    model: withStrands(geometry.model),
    notes: geometryNotes(geometry.notes),
  };
}
