/** What a metre of line is, from the cross-section of its construction. */
import { nominalFigures } from "@/lib/line/cable";
import { coaxCutoff } from "@/lib/line/coax-cutoff";
import { requirePositive, roundConductor, surfaceResistance, tubeConductor } from "@/lib/line/conductor-shape";
import { COPPER_RESISTIVITY, EPSILON0, MU0 } from "@/lib/line/constants";
import type { LineModel } from "@/lib/line/element";

/** Why a figure is not wholly the construction's own. */
export type GeometryNote = "shieldWallTaken" | "proximityPoor" | "screenLossInWires" | "screenFormulaRough";

export interface Geometry {
  model: LineModel;
  /** √(L∞/C), ohm */
  z0: number;
  /** of the lossless line, over the speed of light */
  velocityFactor: number;
  /** F/m */
  capacitance: number;
  /** L∞, H/m */
  inductance: number;
  /** loop, ohm per metre of cable */
  r0: number;
  /** frequency above which a coaxial line carries a second mode, hertz; Infinity for a pair, which has none of that kind */
  cutoff: number;
  /** series resistance far above the skin corners as its closed form has it, ohm per metre, at a frequency in hertz */
  highFrequencyResistance: (frequency: number) => number;
  notes: GeometryNote[];
}

/** Wall of a shield of which only the bore is known, metre: a foil with its braid, a usual figure of common practice. */
export const USUAL_SHIELD_WALL = 0.15e-3;

export interface CoaxConstruction {
  /** diameter of the inner conductor, metre, above 0 */
  inner: number;
  /** diameter over the insulation, the bore of the outer conductor, metre, above inner */
  bore: number;
  /** relative, of the insulation, at least 1 */
  permittivity: number;
  /** of the insulation, at least 0 */
  lossTangent?: number;
  /** of both conductors, ohm metre, above 0; default copper */
  resistivity?: number;
  /** high-frequency resistance of the inner conductor over that of a smooth wire; default 1 */
  strandFactor?: number;
  /** high-frequency resistance of the outer conductor over that of a smooth tube; default 1 */
  braidFactor?: number;
  /** wall of the outer conductor, metre; default 0.15 mm, and then the answer says so */
  shieldWall?: number;
}

/**
 * A coaxial line: L∞ = μ0/2π·ln(D/d), C = 2πε0εr/ln(D/d), `round` inner and `sheet` outer conductor;
 * high-frequency R = (Rs/π)·(strand/d + braid/D).
 * @throws RangeError when a figure is out of range
 * Source: D. M. Pozar, Microwave Engineering, 4th ed., table 2.1, coaxial line.
 */
export function coaxGeometry(construction: CoaxConstruction): Geometry {
  const { inner, bore, permittivity, lossTangent = 0, resistivity = COPPER_RESISTIVITY, shieldWall } = construction;
  const { strandFactor = 1, braidFactor = 1 } = construction;
  requirePositive("coaxGeometry", { inner, bore, permittivity, resistivity, strandFactor, braidFactor });
  requireLossTangent("coaxGeometry", lossTangent);
  const cutoff = coaxCutoff(inner, bore, permittivity);
  const ratio = Math.log(bore / inner);
  const conductors = [
    roundConductor(inner, resistivity, strandFactor),
    tubeConductor(bore, shieldWall ?? USUAL_SHIELD_WALL, resistivity, braidFactor),
  ];
  const model: LineModel = {
    conductors,
    lInfHPerM: (MU0 / (2 * Math.PI)) * ratio,
    cFPerM: (2 * Math.PI * EPSILON0 * permittivity) / ratio,
    lossTangent,
  };
  return {
    ...figuresOf(model),
    cutoff,
    highFrequencyResistance: (frequency) =>
      (surfaceResistance(frequency, resistivity) / Math.PI) * (strandFactor / inner + braidFactor / bore),
    notes: shieldWall === undefined ? ["shieldWallTaken"] : [],
  };
}

export interface PairConstruction {
  /** diameter of each wire, metre, above 0 */
  wire: number;
  /** between the wires' centres, metre, above wire */
  spacing: number;
  /** relative, as the field sees the insulation and the air together, at least 1 */
  permittivity: number;
  lossTangent?: number;
  /** metre of cable for one full turn of the pair, above 0; absent for wires that run straight */
  lay?: number;
  resistivity?: number;
  /** bore of a round screen over the pair, metre */
  screenBore?: number;
}

/** How a pair's cross-section acts: L∞ = (μ0/π)·x, C = πε0ε/x, R = (2Rs/πd)·p. */
interface Shape {
  x: number;
  p: number;
}

/**
 * Two round wires alone: x = acosh(s/d), p = (s/d)/√((s/d)² − 1).
 * Source: S. Ramo, J. R. Whinnery and T. Van Duzer, Fields and Waves in Communication Electronics, 3rd ed., table 5.11b;
 * J. R. Carson, Wave propagation over parallel wires: the proximity effect, Phil. Mag. 41 (1921) 607.
 */
function bareShape(wire: number, spacing: number): Shape {
  const ratio = spacing / wire;
  return { x: Math.acosh(ratio), p: ratio / Math.sqrt((ratio - 1) * (ratio + 1)) };
}

/**
 * Two round wires in a round screen, driven against each other, p = s/d and q = s/D:
 * x = ln(2p·(1 − q²)/(1 + q²)) − (1 + 4p²)/(16p⁴)·(1 − 4q²). Resistance follows from how x changes as every surface
 * gives way: p·∂x/∂p for the wires, −(d/D)·q·∂x/∂q for the screen. Held against a field solution by line charges, for
 * a bore of at least two spacings: x within 2.1 % for s/d from 1.6, within 0.7 % from 2.5; resistance, for a bore of at
 * least 2.5 spacings, within 1.8 % for s/d from 1.8.
 * Source: Reference Data for Radio Engineers, 5th ed., chapter 22, shielded balanced pair; after E. I. Green, F. A. Leibe
 * and H. E. Curtis, Bell System Technical Journal 15 (1936) 248; H. A. Wheeler, Formulas for the skin effect,
 * Proc. IRE 30 (1942) 412, incremental inductance.
 */
function screenedShape(wire: number, spacing: number, bore: number): Shape {
  const p = spacing / wire;
  const q2 = (spacing / bore) ** 2;
  const near = (1 + 4 * p * p) / (16 * p ** 4);
  const ofWires = 1 + ((1 + 2 * p * p) / (4 * p ** 4)) * (1 - 4 * q2);
  const ofScreen = (wire / bore) * q2 * (4 / (1 - q2 * q2) - 8 * near);
  return { x: Math.log((2 * p * (1 - q2)) / (1 + q2)) - near * (1 - 4 * q2), p: ofWires + ofScreen };
}

/**
 * A pair of round wires, alone or in a round screen. Lay multiplies R, L and C per metre of cable by
 * k = √(1 + (πs/lay)²) and divides the velocity factor; impedance stays. The screen carries no current at dc: its
 * high-frequency loss is put into the wires' term, so that dc resistance stays true.
 * @throws RangeError when a figure is out of range, or the wires do not fit into the screen
 * Source: see `bareShape` and `screenedShape`; the lay factor is the length of a helix.
 */
export function pairGeometry(construction: PairConstruction): Geometry {
  const { wire, spacing, permittivity, lossTangent = 0, lay, resistivity = COPPER_RESISTIVITY } = construction;
  requirePositive("pairGeometry", { wire, spacing, resistivity, lay: lay ?? 1 });
  requireLossTangent("pairGeometry", lossTangent);
  if (!(permittivity >= 1 && permittivity < Infinity))
    throw new RangeError(`pairGeometry: permittivity must be at least 1, got ${permittivity}`);
  if (!(spacing > wire)) throw new RangeError(`pairGeometry: spacing must be above ${wire}, got ${spacing}`);
  const { shape, notes } = shapeOf(construction);
  const layFactor = lay === undefined ? 1 : Math.sqrt(1 + ((Math.PI * spacing) / lay) ** 2);
  const term = roundConductor(wire, resistivity, shape.p);
  const model: LineModel = {
    conductors: [{ ...term, r0OhmPerM: 2 * layFactor * term.r0OhmPerM }],
    lInfHPerM: (layFactor * MU0 * shape.x) / Math.PI,
    cFPerM: (layFactor * Math.PI * EPSILON0 * permittivity) / shape.x,
    lossTangent,
  };
  return {
    ...figuresOf(model),
    cutoff: Infinity,
    highFrequencyResistance: (frequency) =>
      ((2 * layFactor * surfaceResistance(frequency, resistivity)) / (Math.PI * wire)) * shape.p,
    notes,
  };
}

/** Below this spacing over diameter the proximity of the wires is told poorly. */
const poorSpacing = 1.5;
/** Below this bore over spacing the screened pair's formula is off by more than two per cent in resistance. */
const tightScreen = 2.5;

function shapeOf({ wire, spacing, screenBore }: PairConstruction): { shape: Shape; notes: GeometryNote[] } {
  const isClose = spacing / wire < poorSpacing;
  const notes: GeometryNote[] = isClose ? ["proximityPoor"] : [];
  if (screenBore === undefined) return { shape: bareShape(wire, spacing), notes };
  if (!(screenBore > spacing + wire))
    throw new RangeError(`pairGeometry: screenBore must be above ${spacing + wire}, got ${screenBore}`);
  const isTight = isClose || screenBore < tightScreen * spacing;
  const shape = screenedShape(wire, spacing, screenBore);
  return { shape, notes: [...notes, "screenLossInWires", ...(isTight ? ["screenFormulaRough" as const] : [])] };
}

function requireLossTangent(where: string, lossTangent: number): void {
  if (!(lossTangent >= 0 && lossTangent < Infinity))
    throw new RangeError(`${where}: lossTangent must be at least 0, got ${lossTangent}`);
}

function figuresOf(model: LineModel) {
  const { z0, velocityFactor, capacitance, inductance } = nominalFigures(model);
  const r0 = model.conductors.reduce((sum, { r0OhmPerM }) => sum + r0OhmPerM, 0);
  return { model, z0, velocityFactor, capacitance, inductance, r0 };
}
