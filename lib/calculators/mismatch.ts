/** One mismatch in all its figures, what it does to power, voltage and current, and how a line hides it. Pure. */
import {
  chosen,
  found,
  quantity,
  typed,
  type Outcome,
  type Reader,
  type Texts,
  type Values,
} from "@/lib/calculators/input";
import type { Read } from "@/lib/format/read-quantity";
import { abs, complex, type Complex } from "@/lib/line/complex";
import {
  powersOnLine,
  ratingShares,
  rippleDb,
  voltageMaximumAt,
  waveExtremes,
  type Extremes,
  type WavePowers,
} from "@/lib/line/mismatched-power";
import {
  impedanceOfReflection,
  magnitudeOfReturnLoss,
  magnitudeOfVswr,
  mismatchedLineLossDb,
  mismatchLossDb,
  reflection,
  returnLossDb,
  vswr,
} from "@/lib/line/reflection";

/** "1.5", "1.5:1", "1.5 to 1". */
function readVswr(text: string, { readQuantity }: Reader): Read<number> {
  const read = readQuantity("number", text.replace(/\s*(?::|to)\s*1\s*$/i, ""));
  if (!read.ok) return { ok: false, message: `“${text.trim()}” is not a VSWR. Try 1.5 or 1.5:1.` };
  return read.value >= 1 ? read : { ok: false, message: "At least 1." };
}

function readLoad(text: string, { readImpedance }: Reader): Read<Complex> {
  const read = readImpedance(text);
  return read.ok && read.value.re < 0 ? { ok: false, message: "The resistance cannot be negative." } : read;
}

const when = (given: string) => (texts: Texts) => texts.given === given;

export const mismatchInputs = {
  given: chosen("Known", "vswr", [
    ["vswr", "VSWR"],
    ["returnLoss", "Return loss"],
    ["gamma", "Reflection coefficient"],
    ["load", "Load impedance"],
  ]),
  vswr: typed("VSWR", "1.5", readVswr, { isShown: when("vswr") }),
  returnLoss: quantity("loss", "Return loss", "14", { isNotNegative: true, most: 300, isShown: when("returnLoss") }),
  gamma: quantity("number", "Reflection, |Γ|", "0.2", { least: 0, most: 1, isShown: when("gamma") }),
  load: typed("Load impedance", "75", readLoad, { unit: "Ω", width: "wide", isShown: when("load") }),
  reference: quantity("resistance", "Line impedance", "50", { isPositive: true, most: 1e6 }),
  loss: quantity("loss", "Matched loss", "0", { isNotNegative: true, most: 300 }),
  power: quantity("power", "Near-end power", "100 W", { isNotNegative: true, most: 1e12 }),
  as: chosen("which is", "forward", [
    ["forward", "forward power"],
    ["net", "net power"],
  ]),
};

/** What a meter reads at one plane. */
export interface PlaneReading extends WavePowers {
  vswr: number;
  returnLossDb: number;
  extremes: Extremes;
}

export interface MismatchResult {
  /** at the load; its angle is only known where the load is */
  gamma: Complex | null;
  magnitude: number;
  mismatchLossDb: number;
  /** the two resistances of this VSWR, ohm */
  resistances: { high: number; low: number };
  near: PlaneReading;
  load: PlaneReading;
  /** matched loss and what standing waves add */
  totalLossDb: number;
  extraLossDb: number;
  rating: { net: number; forward: number };
  /** between two such mismatches with the line between them */
  rippleDb: number;
  /** wavelengths from the load; null where the load's angle is not known or nothing is reflected */
  maximumAt: number | null;
}

export function mismatch(values: Values<typeof mismatchInputs>): Outcome<MismatchResult> {
  const { reference, loss, power, as } = values;
  const gamma = values.given === "load" ? reflection(values.load, complex(reference)) : null;
  const magnitude = Math.min(1, gamma ? abs(gamma) : magnitudeGiven(values));
  const powers = powersOnLine(magnitude, loss, { watts: power, kind: as });
  // A load that reflects everything takes nothing, however little the line loses.
  const totalLossDb = magnitude === 1 ? Infinity : mismatchedLineLossDb(magnitude, loss);
  return found({
    gamma,
    magnitude,
    mismatchLossDb: mismatchLossDb(magnitude),
    resistances: {
      high: impedanceOfReflection(complex(magnitude), reference).re,
      low: impedanceOfReflection(complex(-magnitude), reference).re,
    },
    near: planeReading(powers.near, reference),
    load: planeReading(powers.load, reference),
    totalLossDb,
    extraLossDb: totalLossDb - loss,
    rating: ratingShares(magnitude),
    rippleDb: rippleDb(magnitude, magnitude, loss),
    maximumAt: gamma && magnitude > 0 ? voltageMaximumAt(gamma) : null,
  });
}

function magnitudeGiven(values: Values<typeof mismatchInputs>): number {
  if (values.given === "returnLoss") return magnitudeOfReturnLoss(values.returnLoss);
  return values.given === "gamma" ? values.gamma : magnitudeOfVswr(values.vswr);
}

function planeReading(waves: WavePowers, z0: number): PlaneReading {
  return {
    ...waves,
    vswr: vswr(waves.magnitude),
    returnLossDb: returnLossDb(waves.magnitude),
    extremes: waveExtremes(waves.forwardW, waves.magnitude, z0),
  };
}
