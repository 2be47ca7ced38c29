import type { DesignPoint } from "@/lib/line/match/design-point";
import { fitLine, idealLine } from "@/lib/line/match/fit-line";
import type { Outcome } from "@/lib/line/match/match-request";
import { realPlaces, type RealPlace } from "@/lib/line/match/real-place";
import { binomialBySmallReflections, equalRippleBySmallReflections } from "@/lib/line/match/small-reflections";
import { binomialTransformer, equalRippleTransformer, type StepTransformer } from "@/lib/line/match/step-transformer";
import { transformerProposal, type TransformerKind } from "@/lib/line/match/transformer-proposal";
import { decibelText, listText, ohmText } from "@/lib/line/match/wording";
import { magnitudeOfReturnLoss } from "@/lib/line/reflection";

/** A cable this near to a section's impedance serves as it: what cables of one type vary among themselves. */
export const fitShare = 0.02;

/** Sections where the request names no number: from two, since one is the quarter-wave section, to what is still built. */
const usualSections = [2, 3, 4, 5];

/** By which the ripple is better than what is asked over the band where the request names none: half the reflection. */
export const rippleMarginDb = 6;

/** Resistances within this ratio of the target need no transformer. */
const equal = 1e-4;

/** Maximally flat transformers of N quarter-wave sections, at every place where the feeder shows a resistance. */
export function binomialMatches(point: DesignPoint): Outcome {
  return transformers(point, "binomial");
}

/** Equal-ripple transformers of N quarter-wave sections, at every place where the feeder shows a resistance. */
export function equalRippleMatches(point: DesignPoint): Outcome {
  return transformers(point, "equalRipple");
}

/**
 * Each section is the cable whose impedance fits, alone or side by side, else an ideal line; each is a quarter wave by
 * its own phase. The synthesis is exact for the resistance that the feeder shows with its loss.
 */
function transformers(point: DesignPoint, kind: TransformerKind): Outcome {
  const { targetOhm, returnLossDb, rippleReturnLossDb = returnLossDb + rippleMarginDb } = point.request;
  const limitDb = kind === "binomial" ? returnLossDb : rippleReturnLossDb;
  const limit = magnitudeOfReturnLoss(limitDb);
  const places = realPlaces(point);
  const steps = places.filter(({ resistanceOhm }) => Math.abs(Math.log(resistanceOhm / targetOhm)) > equal);
  const able = steps.filter((place) => kind === "binomial" || stepOf(point, place) > limit);
  const proposals = able.map((place) => {
    const ratio = place.resistanceOhm / targetOhm;
    const sections = point.request.sections ?? fewest(point, kind, ratio, limit);
    const design = designOf(kind, sections, ratio, limit);
    const lines = design.sectionsOverFirst.map(
      (each) => fitLine(point.lines, each * targetOhm, fitShare) ?? idealLine(point, each * targetOhm),
    );
    const approximate = textbook(kind, sections, ratio, limit);
    return transformerProposal(point, { kind, place, design, limitDb, lines, textbook: approximate });
  });
  return { proposals, why: proposals.length === 0 ? reason(point, places, steps, limit) : "" };
}

function designOf(kind: TransformerKind, sections: number, ratio: number, limit: number): StepTransformer {
  return (kind === "binomial" ? binomialTransformer : equalRippleTransformer)(sections, ratio, limit);
}

function stepOf({ request }: DesignPoint, { resistanceOhm }: RealPlace): number {
  return Math.abs(resistanceOhm - request.targetOhm) / (resistanceOhm + request.targetOhm);
}

/** As few sections as keep the asked return loss over the band where nothing has loss. */
function fewest({ request }: DesignPoint, kind: TransformerKind, ratio: number, limit: number): number {
  const { designHz, bandHz } = request;
  const needed = (2 * Math.max(designHz - bandHz[0], bandHz[1] - designHz)) / designHz;
  const enough = usualSections.find((each) => designOf(kind, each, ratio, limit).fractionalBandwidth >= needed);
  return enough ?? usualSections.at(-1)!;
}

/** Section impedances over the first resistance by small reflections; none where that theory has no answer. */
function textbook(kind: TransformerKind, sections: number, ratio: number, limit: number): number[] {
  if (kind === "binomial") return binomialBySmallReflections(sections, ratio);
  if (!(limit < Math.abs(Math.log(ratio)) / 2)) return [];
  return equalRippleBySmallReflections(sections, ratio, limit).sectionsOverFirst;
}

function reason({ request, words }: DesignPoint, places: RealPlace[], steps: RealPlace[], limit: number): string {
  const { targetOhm } = request;
  const resistances = listText(places.map((each) => ohmText(each.resistanceOhm)));
  if (places.length === 0)
    return `A transformer works between resistances; no line was named that brings the ${words.matched} to one.`;
  if (steps.length === 0) return `The ${words.matched} shows ${resistances}, which already is ${ohmText(targetOhm)}.`;
  const ripple = decibelText(-20 * Math.log10(limit));
  return `The step from ${ohmText(targetOhm)} to ${resistances} reflects no more than the ripple of ${ripple}: no section is needed.`;
}
