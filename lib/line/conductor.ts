import { quotient, root, steady, sum, times, type Analytic } from "@/lib/line/analytic";
import { evenHyperbolic } from "@/lib/line/hyperbolic";
import type { Complex } from "@/lib/line/complex";
import type { Conductor } from "@/lib/line/element";

/**
 * Series impedance of one conductor term, the external inductance not included.
 * Every form tends to r0 at dc; all but `constant` tend to r0·√(s/ωs), so R → r0·√(ω/2ωs), far above the corner.
 * Internal inductance at dc is r0/(2ωs), for a sheet r0/(3ωs).
 * @param term - form, dc resistance in ohm per metre (at least 0), skin corner ωs in rad/s (above 0, not for `constant`)
 * @param s - complex frequency, rad/s; real part at least 0, 0 itself included
 * @returns ohm per metre, with its derivative by s
 * @throws RangeError when a form that needs a skin corner has none above 0
 * Source: `sheet`: plane wave into a conductor of finite thickness, S. Ramo, J. R. Whinnery and T. Van Duzer, Fields and
 * Waves in Communication Electronics, 3rd ed., section 3.17; `round`: rational approximation of the Bessel quotient
 * √p·I0(2√p)/I1(2√p) for p = s·μ0·a²/4ρ with both limits exact (R within 1.3 %, internal L within 2.0 %);
 * `sqrt`: the simplest term with both limits.
 */
export function conductorImpedance(term: Conductor, s: Complex): Analytic {
  if (term.form === "constant" || term.r0OhmPerM === 0) return steady(term.r0OhmPerM);
  const corner = term.skinCornerRadPerS;
  if (corner === undefined || !(corner > 0))
    throw new RangeError(`conductorImpedance: skinCornerRadPerS must be positive for ${term.form}, got ${corner}`);
  const p: Analytic = { re: s.re / corner, im: s.im / corner, slopeRe: 1 / corner, slopeIm: 0 };
  return times(relativeImpedance(term.form, p), term.r0OhmPerM);
}

/** Impedance over dc resistance, as a function of p = s/ωs. */
function relativeImpedance(form: "round" | "sheet" | "sqrt", p: Analytic): Analytic {
  if (form === "sqrt") return root(onePlus(p));
  return form === "round" ? round(p) : sheet(p);
}

function onePlus(p: Analytic): Analytic {
  return { re: 1 + p.re, im: p.im, slopeRe: p.slopeRe, slopeIm: p.slopeIm };
}

/** 1 + (p/2) / (1 + 2p / (5 + √(49 + 16p))). */
function round(p: Analytic): Analytic {
  const inner = root({ re: 49 + 16 * p.re, im: 16 * p.im, slopeRe: 16 * p.slopeRe, slopeIm: 16 * p.slopeIm });
  const denominator = onePlus(quotient(times(p, 2), sum(steady(5), inner)));
  return onePlus(quotient(times(p, 0.5), denominator));
}

/** q·coth q with q = √p. */
function sheet(p: Analytic): Analytic {
  const q = root(p);
  const { cosh, sinhc } = evenHyperbolic(p, q.re, q.im);
  return quotient(cosh, sinhc);
}
