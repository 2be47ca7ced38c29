/** Resistive pads between two resistances, T and pi: exact, in the next E24 values, and where the power goes. Pure. */
import { fault, found, quantity, type Outcome, type Values } from "@/lib/calculators/input";
import { inWords, decibels } from "@/lib/format/quantity";
import type { PadElement } from "@/lib/line/element";
import { minimumPadLossDb, padResistors, type PadResistors } from "@/lib/line/pad";
import { padPowers, standardPad, type PadFigures, type PadTopology } from "@/lib/line/pad-parts";

const resistance = { isPositive: true, most: 1e6 } as const;

export const padInputs = {
  loss: quantity("loss", "Loss", "10", { isNotNegative: true, most: 150 }),
  source: quantity("resistance", "Source side", "50", resistance),
  load: quantity("resistance", "Load side", "50", resistance),
  power: quantity("power", "Power into the pad", "1 W", { isNotNegative: true, most: 1e9 }),
};

/** One way of building the pad. A resistor of Infinity is left out, one of 0 is a wire. */
export interface PadBuild {
  resistors: PadResistors;
  powersW: [number, number, number];
  loadW: number;
}

export interface PadShape {
  topology: PadTopology;
  exact: PadBuild;
  standard: PadBuild & { figures: PadFigures };
}

export interface PadResult {
  leastDb: number;
  /** at the least loss only two resistors are left */
  isLeast: boolean;
  shapes: [PadShape, PadShape];
}

/** A loss typed with two decimals this close to the least means it, dB. */
const slackDb = 0.005;

export function pad(values: Values<typeof padInputs>): Outcome<PadResult> {
  const { source, load, power } = values;
  const leastDb = minimumPadLossDb(source, load);
  if (values.loss < leastDb - slackDb)
    return fault("loss", `At least ${inWords(decibels(leastDb))} between these two resistances.`);
  const isLeast = source !== load && values.loss <= leastDb + slackDb;
  const lossDb = isLeast ? leastDb : values.loss;
  const shape = (topology: PadTopology): PadShape => {
    const element: PadElement = { kind: "pad", topology, lossDb, inputOhm: source, outputOhm: load };
    const standard = standardPad(element);
    return {
      topology,
      exact: built(topology, padResistors(element), load, power),
      standard: { ...built(topology, standard.resistors, load, power), figures: standard.figures },
    };
  };
  return found({ leastDb, isLeast, shapes: [shape("T"), shape("pi")] });
}

function built(topology: PadTopology, resistors: PadResistors, loadOhm: number, watts: number): PadBuild {
  const { resistorsW, loadW } = padPowers(topology, resistors, loadOhm, watts);
  return { resistors, powersW: resistorsW, loadW };
}
