/** A sweep of the wire -> the line the engine finds in it -> the wire. Pure. */
import type { ExtractAnswer, ExtractRequest } from "@/lib/compute/extract/schema";
import { wireComplex, wireNumber, wireNumbers } from "@/lib/compute/wire";
import { digits } from "@/lib/format/quantity";
import { DB_PER_NEPER } from "@/lib/line/constants";
import { extractLine, type ExtractRequest as EngineRequest, type ExtractWarning } from "@/lib/line/extract/extract";
import type { ComplexArray } from "@/lib/line/line-figures";

type WireComplex = { re: number[]; im: number[] };
const complexOf = ({ re, im }: WireComplex): ComplexArray => ({ re: Float64Array.from(re), im: Float64Array.from(im) });

function sweepOf({ twoPort, open, short }: ExtractRequest): EngineRequest["sweep"] {
  if (twoPort) {
    const { referenceOhm, frequenciesHz, s11, s21, s12, s22 } = twoPort;
    const data = { s11: complexOf(s11), s21: complexOf(s21), s12: complexOf(s12), s22: complexOf(s22) };
    return { kind: "twoPort", data: { referenceOhm, frequencies: frequenciesHz, ...data } };
  }
  if (!open || !short) throw new RangeError("sweepOf: neither a two-port sweep nor open and short");
  const data = { open: complexOf(open.reflection), short: complexOf(short.reflection) };
  return { kind: "onePorts", data: { referenceOhm: open.referenceOhm, frequencies: open.frequenciesHz, ...data } };
}

const frequenciesCounted = (count: number) => (count === 1 ? "At 1 frequency" : `At ${count} frequencies`);

/** A warning of an extraction in a sentence. */
export function extractSentence(warning: ExtractWarning): string {
  switch (warning.warning) {
    case "impedanceFromNeighbours":
      return (
        `${frequenciesCounted(warning.count)} the sample is electrically too short, or near a multiple of a ` +
        `${warning.passes === 1 ? "half" : "quarter"} wavelength: the impedance was taken from the neighbours.`
      );
    case "nothingThrough":
      return `${frequenciesCounted(warning.count)} too little comes through the sample to tell its attenuation.`;
    case "turnsFromSlope":
      return `The first frequency was found to have ${warning.turns} whole turns of phase, from the slope; check the velocity.`;
    case "wideSteps":
      return `The phase steps by up to ${digits((warning.largestStep * 180) / Math.PI, 0)}° between neighbours; with wider steps turns would be lost.`;
    case "fasterThanLight":
      return `The velocity factor comes out as ${digits(warning.velocityFactor, 3)}: the length is wrong, or turns of phase are lost between wide steps.`;
    case "notReciprocal":
      return `S21 and S12 differ by up to ${digits(warning.worst, 3)}, which no cable does; their mean was taken.`;
    case "notSymmetric":
      return `S11 and S22 differ by up to ${digits(warning.worst, 3)}: the sample is not uniform, or its connectors differ.`;
    case "notPassive":
      return `${frequenciesCounted(warning.count)} a parameter has a magnitude above 1, which no cable has.`;
    case "aboveCorner":
      return "The sweep begins above the skin corner: dc resistance and corner are not in it, only the loss they make together.";
    case "poorFit":
      return `The model follows the attenuation to ${digits(warning.rmsPercent, 1)} % rms only.`;
  }
}

/** @throws RangeError where the engine refuses */
export function extractAnswer(request: ExtractRequest): ExtractAnswer {
  const { lengthM: length, form, r0OhmPerM: r0 } = request;
  const { measured, model, residuals, warnings } = extractLine({ length, sweep: sweepOf(request), form, r0 });
  return {
    frequenciesHz: Array.from(measured.frequencies),
    zcOhm: wireComplex(measured.zc),
    attenuationDbPerM: wireNumbers(measured.attenuation.map((neper) => neper * DB_PER_NEPER)),
    phaseRadPerM: wireNumbers(measured.phase),
    model,
    residuals: {
      attenuationPercent: wireNumbers(residuals.attenuationPercent),
      phasePercent: wireNumbers(residuals.phasePercent),
      zcPercent: wireNumbers(residuals.zcPercent),
      rmsPercent: wireNumber(residuals.rmsPercent),
    },
    warnings: warnings.map(extractSentence),
  };
}
