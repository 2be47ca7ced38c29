import type { Element } from "@/lib/line/element";
import { cutText, lengthNotes, placeText, type DesignLine, type DesignPoint } from "@/lib/line/match/design-point";
import type { Proposal } from "@/lib/line/match/match-request";
import { along, loadPair, withLossShare } from "@/lib/line/match/pair";
import { seriesSection } from "@/lib/line/match/series-section";
import { solveLengths, type Lengths, type Network } from "@/lib/line/match/solve-lengths";
import { trimNotes } from "@/lib/line/match/trim";
import { lengthText } from "@/lib/line/match/wording";

/** Pairs that are solved with their loss: the shortest in wavelengths, which also keep the widest band. */
const mostPairs = 24;

interface Plan {
  /** next to the target */
  near: DesignLine;
  /** next to what is matched */
  far: DesignLine;
  /** wavelengths of their own lines: far, then near */
  lengths: [number, number];
}

/**
 * Two cables one after the other between the target and what is matched, neither of them the feeder: of all ordered pairs
 * the closed form is worked out, and the 24 shortest are solved with their loss.
 */
export function cablePairs(point: DesignPoint): Proposal[] {
  const plans = allPlans(point);
  const total = ({ lengths }: Plan) => lengths[0] + lengths[1];
  const shortest = plans.sort((a, b) => total(a) - total(b)).slice(0, mostPairs);
  return shortest.flatMap((plan) => solved(point, plan).map((lengths) => proposal(point, plan, lengths)));
}

function allPlans({ load, request, lines, feeder }: DesignPoint): Plan[] {
  const { targetOhm } = request;
  const others = lines.filter((line) => line.label !== feeder?.label);
  return others.flatMap((far) =>
    others.flatMap((near) => {
      if (near === far) return [];
      const ways = seriesSection({ load, lineOhm: far.zc.re, sectionOhm: near.zc.re, targetOhm });
      return ways.map(({ distance, length }): Plan => ({ near, far, lengths: [distance, length] }));
    }),
  );
}

function solved(point: DesignPoint, { near, far, lengths }: Plan): Lengths[] {
  const start: Lengths = [lengths[0] * far.wavelengthM, lengths[1] * near.wavelengthM];
  const load = loadPair(point);
  const network: Network = (share) => {
    const [first, second] = [withLossShare(far, share), withLossShare(near, share)];
    return (d, l) => along(along(load, first, d), second, l);
  };
  const found = solveLengths(point, network, [start], [far.wavelengthM / 2, near.wavelengthM / 2]);
  return found.filter(([d, l]) => d > 0 && l > 0);
}

function proposal(point: DesignPoint, { near, far }: Plan, [distance, length]: Lengths): Proposal {
  const build = (lengthM: number): Element[] => [
    { kind: "cable", name: "Section 1", line: near.line, lengthM },
    { kind: "cable", name: "Section 2", line: far.line, lengthM: distance },
  ];
  return {
    method: "seriesSection",
    title: `Two cables in series, ${lengthText(length)} of ${near.label} then ${lengthText(distance)} of ${far.label} ${placeText(point, 0)}`,
    elements: build(length),
    needs: [
      "3 joints",
      `${cutText(point, length)} of ${near.label} toward the target`,
      `${cutText(point, distance)} of ${far.label} toward ${point.words.place}`,
    ],
    notes: [...lengthNotes(point, [near, far]), ...trimNotes(point, "first section", build, length)],
  };
}
