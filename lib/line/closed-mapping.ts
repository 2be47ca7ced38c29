import { modelFromNominal } from "@/lib/line/cable";
import { DB_PER_NEPER, SPEED_OF_LIGHT } from "@/lib/line/constants";
import type { ConductorForm, LineModel } from "@/lib/line/element";

/** What is known of a line beside its loss. */
export interface KnownLine {
  /** nominal impedance, ohm, above 0 */
  z0: number;
  /** above 0 */
  velocityFactor: number;
  /** dc loop resistance at 20 °C, ohm per metre, at least 0 */
  r0: number;
}

/**
 * Skin corner of a conductor whose high-frequency loss is k1·√f in a line of low loss: ωs = π·(A·R0/(2·Z0·k1))²,
 * A = 20/ln 10.
 * @param k1 - dB/m per √Hz, at least 0
 * @returns rad/s; Infinity for a conductor without loss in √f, 0 for one without dc resistance
 * Source: α = R/2Z0 of a low-loss line, D. M. Pozar, Microwave Engineering, 4th ed., section 2.7, with
 * R = R0·√(ω/2ωs) far above the corner.
 */
export function skinCornerOf({ z0, r0 }: Pick<KnownLine, "z0" | "r0">, k1: number): number {
  return Math.PI * ((DB_PER_NEPER * r0) / (2 * z0 * k1)) ** 2;
}

/**
 * Loss tangent of a dielectric whose loss is k2·f: tan δ = k2·v/(A·π).
 * @param k2 - dB/m per Hz, at least 0
 * Source: α = β·tan δ/2, D. M. Pozar, as above.
 */
export function lossTangentOf(velocityFactor: number, k2: number): number {
  return (k2 * SPEED_OF_LIGHT * velocityFactor) / (DB_PER_NEPER * Math.PI);
}

/**
 * A model of the loss k1·√f + k2·f at 20 °C. Exact far above the skin corner only: near it the loss of the model is
 * a few per cent away from the table.
 * @param form - of the one conductor term; every form has the same high-frequency limit. A conductor without resistance
 * or without loss in √f is `constant` whatever is asked for
 */
export function modelFromLoss(known: KnownLine, k1: number, k2: number, form: ConductorForm = "sqrt"): LineModel {
  const corner = skinCornerOf(known, k1);
  return modelOf(known, form, corner, lossTangentOf(known.velocityFactor, k2));
}

/** A model of one conductor term; a corner that is none makes it `constant`. */
export function modelOf(known: KnownLine, form: ConductorForm, corner: number, lossTangent: number): LineModel {
  const { z0, velocityFactor, r0 } = known;
  const hasCorner = form !== "constant" && r0 > 0 && corner > 0 && corner < Infinity;
  const conductor = hasCorner
    ? { form, r0OhmPerM: r0, skinCornerRadPerS: corner }
    : { form: "constant" as const, r0OhmPerM: r0 };
  return modelFromNominal({ z0, velocityFactor, conductors: [conductor], lossTangent });
}
