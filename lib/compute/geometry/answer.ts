/** A construction as the wire has it -> the engine's, and what the engine says of it -> the wire. Pure. */
import type { Construction } from "@/lib/cables/schema";
import type { GeometryAnswer, GeometryRequest } from "@/lib/compute/geometry/schema";
import { wireNumber } from "@/lib/compute/wire";
import { perMetre } from "@/lib/line/cable";
import { coaxGeometry, type Geometry, type GeometryNote, pairGeometry, USUAL_SHIELD_WALL } from "@/lib/line/geometry";

const mm = (value: number) => value / 1000;
const mmIfGiven = (value: number | undefined) => (value === undefined ? undefined : mm(value));

/** @throws RangeError where the engine refuses */
export function geometryOf(construction: Construction): Geometry {
  const { lossTangent, conductorResistivityOhmM: resistivity } = construction;
  if (construction.kind === "pair")
    return pairGeometry({
      wire: mm(construction.wireMm),
      spacing: mm(construction.spacingMm),
      permittivity: construction.effectivePermittivity,
      lossTangent,
      lay: mmIfGiven(construction.layMm),
      resistivity,
      screenBore: mmIfGiven(construction.screen?.innerMm),
    });
  return coaxGeometry({
    inner: mm(construction.innerMm),
    bore: mm(construction.dielectricMm),
    permittivity: construction.relativePermittivity,
    lossTangent,
    resistivity,
    strandFactor: construction.strandFactor,
    braidFactor: construction.braidFactor,
    shieldWall: mmIfGiven(construction.shieldThicknessMm),
  });
}

const sentences: Record<GeometryNote, string> = {
  shieldWallTaken: `The shield's thickness is not given; a wall of ${USUAL_SHIELD_WALL * 1000} mm was taken.`,
  proximityPoor: "The wires are closer than 1.5 diameters; the proximity of their currents is told poorly.",
  screenLossInWires: "The screen's high-frequency loss stands in the wires' term; at dc the screen carries no current.",
  screenFormulaRough: "The screen is close to the wires; the formula for the screened pair is rough there.",
};

/** What a construction's figures take for granted, in sentences. */
export function geometryNotes(notes: readonly GeometryNote[]): string[] {
  return notes.map((note) => sentences[note]);
}

export function geometryAnswer({ construction, frequencyHz }: GeometryRequest): GeometryAnswer {
  const geometry = geometryOf(construction);
  const omega = 2 * Math.PI * (frequencyHz ?? 0);
  return {
    model: geometry.model,
    z0Ohm: geometry.z0,
    velocityFactor: geometry.velocityFactor,
    capacitanceFPerM: geometry.capacitance,
    inductanceHPerM: geometry.inductance,
    cutoffHz: wireNumber(geometry.cutoff),
    r0OhmPerM: geometry.r0,
    ...(frequencyHz !== undefined && {
      rOhmPerM: perMetre(geometry.model, { re: 0, im: omega }).z.re,
      highFrequencyROhmPerM: geometry.highFrequencyResistance(frequencyHz),
    }),
    notes: geometryNotes(geometry.notes),
  };
}
