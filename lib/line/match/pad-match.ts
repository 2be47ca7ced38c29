import { abs } from "@/lib/line/complex";
import type { Element, PadElement, PartElement } from "@/lib/line/element";
import { cutText, leadName, lengthNotes, placeText, type DesignPoint } from "@/lib/line/match/design-point";
import { bandOf, bandSamples } from "@/lib/line/match/extreme";
import type { Outcome, Proposal } from "@/lib/line/match/match-request";
import { padAsParts } from "@/lib/line/match/pad-as-parts";
import { realPlaces, type RealPlace } from "@/lib/line/match/real-place";
import { decibelText, figure, ohmText } from "@/lib/line/match/wording";
import { minimumPadLossDb, padResistors, type PadResistors } from "@/lib/line/pad";
import { standardPad } from "@/lib/line/pad-parts";
import { portReflection, returnLossDb } from "@/lib/line/reflection";

/** Resistances within this ratio of each other need no pad between them. */
const equal = 1e-4;

/** A pad that would add less than this to the return loss, dB, is not worth soldering. */
const leastPadDb = 0.1;

/**
 * Resistive pads, each as calculated and in E24 values: the least loss between the target and a resistance that the
 * feeder shows, which matches; and the pad of the target's own resistance that is just lossy enough to hide the
 * reflection of what is matched, whatever it is, over the whole band.
 */
export function padMatches(point: DesignPoint): Outcome {
  const { request, words } = point;
  const { targetOhm, returnLossDb: asked } = request;
  const least = realPlaces(point)
    .filter(({ resistanceOhm }) => Math.abs(Math.log(resistanceOhm / targetOhm)) > equal)
    .map((place) => ({ place, pad: leastPad(targetOhm, place.resistanceOhm) }));
  const alone = aloneDb(point);
  const here: RealPlace = { distance: 0, resistanceOhm: targetOhm };
  // A wave crosses the pad twice.
  const even =
    asked - alone > leastPadDb ? [{ place: here, pad: padOf((asked - alone) / 2, targetOhm, targetOhm) }] : [];
  const proposals = [...least, ...even].flatMap(({ pad, place }) => [
    proposal(point, pad, place, false),
    proposal(point, pad, place, true),
  ]);
  return {
    proposals,
    why: `The ${words.matched} already keeps ${decibelText(alone)} over the band, so no pad is needed.`,
  };
}

function padOf(lossDb: number, inputOhm: number, outputOhm: number): PadElement {
  return { kind: "pad", name: "Pad", topology: "T", lossDb, inputOhm, outputOhm };
}

function leastPad(inputOhm: number, outputOhm: number): PadElement {
  return padOf(minimumPadLossDb(inputOhm, outputOhm), inputOhm, outputOhm);
}

/** Least return loss of what is matched alone over the band, dB. */
function aloneDb({ request, seen }: DesignPoint): number {
  const target = { re: request.targetOhm, im: 0 };
  const sizes = bandSamples(bandOf(request)).map((frequency) => {
    const { v, i } = seen(frequency).port;
    return abs(portReflection(v, i, target));
  });
  return returnLossDb(Math.max(...sizes));
}

function proposal(point: DesignPoint, pad: PadElement, place: RealPlace, isStandard: boolean): Proposal {
  const { feeder } = point;
  const isEven = pad.inputOhm === pad.outputOhm;
  const resistorsOhm = isStandard ? standardPad(pad).resistors : padResistors(pad);
  const network: (PadElement | PartElement)[] = isStandard ? padAsParts(resistorsOhm, "T") : [pad];
  const lead: Element[] =
    feeder && place.distance > 0
      ? [{ kind: "cable", name: leadName(point, "Section"), line: feeder.line, lengthM: place.distance }]
      : [];
  const values = resistorsOhm.map((ohm) => (ohm === 0 ? "a wire" : resistorText(ohm, isStandard))).join(" – ");
  return {
    method: "pad",
    title: `${isEven ? "Even pad" : "Least-loss pad"}, ${decibelText(pad.lossDb)}, ${isStandard ? "E24 values " : ""}${values} ${placeText(point, place.distance)}`,
    elements: [...network, ...lead],
    resistorsOhm,
    needs: [
      ...padAsParts(resistorsOhm, "T").map(({ rOhm = 0 }) => `1 resistor ${resistorText(rOhm, isStandard)}`),
      ...(feeder && lead.length > 0
        ? [`${cutText(point, place.distance)} of ${feeder.label} to ${point.words.place}`]
        : []),
    ],
    notes: [...padNotes(point, pad, isStandard), ...(feeder && lead.length > 0 ? lengthNotes(point, [feeder]) : [])],
  };
}

const resistorText = (ohm: number, isStandard: boolean) => figure(ohm, "Ω", isStandard ? 2 : 3);

function padNotes({ request, words }: DesignPoint, pad: PadElement, isStandard: boolean): string[] {
  const pi: PadResistors = padResistors({ ...pad, topology: "pi" });
  const arms = pi.map((ohm) => (ohm === Infinity ? "none" : ohmText(ohm))).join(" – ");
  const passes = 100 * 10 ** (-pad.lossDb / 10);
  return [
    ...(isStandard ? [`Standard E24 values; the exact ones are ${padResistors(pad).map(ohmText).join(" – ")}.`] : []),
    "T from the source side: series, across, series.",
    ...(isStandard ? [] : [`As a pi, across – series – across, it is ${arms}.`]),
    pad.inputOhm === pad.outputOhm
      ? `It hides the reflection of the ${words.matched} instead of matching it, and passes ${passes.toFixed(0)}\u00a0% of the power.`
      : `No resistive pad between ${ohmText(request.targetOhm)} and ${ohmText(pad.outputOhm)} loses less; it passes ${passes.toFixed(0)}\u00a0% of the power.`,
  ];
}
