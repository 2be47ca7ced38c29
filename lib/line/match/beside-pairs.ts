import type { ParallelElement } from "@/lib/line/element";
import { add, divide, multiply, negate, ONE, scale, subtract, tanh, type Complex } from "@/lib/line/complex";
import {
  cutText,
  leadName,
  lengthNotes,
  placeText,
  type DesignLine,
  type DesignPoint,
} from "@/lib/line/match/design-point";
import type { Proposal } from "@/lib/line/match/match-request";
import { along, loadPair, withLossShare, type Pair } from "@/lib/line/match/pair";
import { seriesSection } from "@/lib/line/match/series-section";
import { solveLengths, type Lengths, type Network } from "@/lib/line/match/solve-lengths";
import { lengthText, ohmText } from "@/lib/line/match/wording";

/** Pairs that are solved with their loss: the shortest in wavelengths, which also keep the widest band. */
const mostPairs = 24;

interface Plan {
  first: DesignLine;
  second: DesignLine;
  /** wavelengths: of the feeder, then of each cable */
  lengths: [number, number];
}

/** Impedance of two different cables side by side, ohm. */
const besideOhm = (a: DesignLine, b: DesignLine) => 1 / (1 / a.zc.re + 1 / b.zc.re);

/**
 * Two different cables side by side as a series section, both of the same electrical length: of all pairs the closed form
 * is worked out, and the 24 shortest are solved with their loss.
 */
export function besidePairs(point: DesignPoint, feeder: DesignLine): Proposal[] {
  const { load, request, lines } = point;
  const plans = lines.flatMap((first, k) =>
    lines.slice(k + 1).flatMap((second) => {
      const section = { load, lineOhm: feeder.zc.re, sectionOhm: besideOhm(first, second) };
      const ways = seriesSection({ ...section, targetOhm: request.targetOhm });
      return ways.map(({ distance, length }): Plan => ({ first, second, lengths: [distance, length] }));
    }),
  );
  const total = ({ lengths }: Plan) => lengths[0] + lengths[1];
  const shortest = plans.sort((a, b) => total(a) - total(b)).slice(0, mostPairs);
  return shortest.flatMap((plan) =>
    solved(point, feeder, plan).map((lengths) => proposal(point, feeder, plan, lengths)),
  );
}

function solved(point: DesignPoint, feeder: DesignLine, { first, second, lengths }: Plan): Lengths[] {
  const load = loadPair(point);
  const ratio = second.wavelengthM / first.wavelengthM;
  const network: Network = (share) => {
    const [main, a, b] = [feeder, first, second].map((line) => withLossShare(line, share));
    return (d, l) => alongBeside(along(load, main!, d), [a!, l], [b!, l * ratio]);
  };
  const start: Lengths = [lengths[0] * feeder.wavelengthM, lengths[1] * first.wavelengthM];
  const found = solveLengths(point, network, [start], [feeder.wavelengthM / 2, first.wavelengthM / 2]);
  return found.filter(([, length]) => length > 0);
}

/**
 * A pair of voltage and current seen through two lengths of different line side by side: their admittances add.
 * Source: Y11 = coth γl/Zc and Y12 = −1/(Zc·sinh γl) of a length of line, D. M. Pozar, Microwave Engineering, 4th ed.,
 * table 4.2; 1/sinh² = coth² − 1.
 */
function alongBeside({ v, i }: Pair, ...branches: [DesignLine, number][]): Pair {
  let own: Complex = { re: 0, im: 0 };
  let across: Complex = { re: 0, im: 0 };
  for (const [{ gamma, zc }, length] of branches) {
    const half = tanh(scale(gamma, length / 2));
    // coth x = (1 + t²)/2t and 1/sinh x = (1 − t²)/2t of t = tanh x/2
    const under = multiply(scale(half, 2), zc);
    own = add(own, divide(add(ONE, multiply(half, half)), under));
    across = subtract(across, divide(subtract(ONE, multiply(half, half)), under));
  }
  const v1 = divide(negate(add(i, multiply(own, v))), across);
  return { v: v1, i: add(multiply(own, v1), multiply(across, v)) };
}

function proposal(point: DesignPoint, feeder: DesignLine, plan: Plan, [distance, length]: Lengths): Proposal {
  const { first, second } = plan;
  const other = (length * second.wavelengthM) / first.wavelengthM;
  const section: ParallelElement = {
    kind: "parallel",
    name: "Section",
    branches: [
      { line: first.line, lengthM: length },
      { line: second.line, lengthM: other },
    ],
  };
  const hasLead = distance > 0;
  const lead = { kind: "cable", name: leadName(point, "Section"), line: feeder.line, lengthM: distance } as const;
  return {
    method: "parallelCables",
    title: `Two different cables in parallel, ${lengthText(length)} of ${first.label} beside ${lengthText(other)} of ${second.label} ${placeText(point, distance)}`,
    elements: [section, ...(hasLead ? [lead] : [])],
    needs: [
      "2 junctions of 2 cables",
      `${cutText(point, length)} of ${first.label} and ${cutText(point, other)} of ${second.label} for the section`,
      ...(hasLead ? [`${cutText(point, distance)} of ${feeder.label} to ${point.words.place}`] : []),
    ],
    notes: [
      ...lengthNotes(point, [first, second, ...(hasLead ? [feeder] : [])]),
      `The cables side by side make ${ohmText(besideOhm(first, second))}; each is as long in wavelengths as the other.`,
    ],
  };
}
