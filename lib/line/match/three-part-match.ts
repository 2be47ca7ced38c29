import type { DesignPoint } from "@/lib/line/match/design-point";
import {
  ladderElements,
  ladderNotes,
  partNeed,
  partsQ,
  seriesRung,
  shuntRung,
  standardLadder,
  valueText,
  type Ladder,
} from "@/lib/line/match/ladder";
import type { Outcome, Proposal } from "@/lib/line/match/match-request";
import { leastQ, threeParts, type ThreePartTopology, type ThreeParts } from "@/lib/line/match/three-parts";
import { listText, ohmText } from "@/lib/line/match/wording";

/** Where the request names no Q: so much more than the L-section's, and at least this. */
const usualFactor = 1.5;
const leastUsualQ = 2;

/** Pi networks of the asked Q, every choice of coils and capacitors, and each again with E24 values. */
export function piNetworks(point: DesignPoint): Outcome {
  return networks(point, "pi");
}

/** T networks of the asked Q, every choice of coils and capacitors, and each again with E24 values. */
export function tNetworks(point: DesignPoint): Outcome {
  return networks(point, "T");
}

/** Three parts leave one freedom: the Q at the middle resistance, asked for or 1.5 times that of an L-section. */
function networks(point: DesignPoint, topology: ThreePartTopology): Outcome {
  const { load, request } = point;
  const { targetOhm } = request;
  const least = leastQ(load, targetOhm, topology);
  const networkQ = request.networkQ ?? Math.max(leastUsualQ, usualFactor * least);
  const solutions = threeParts(load, targetOhm, topology, networkQ, partsQ(request));
  const proposals = solutions.flatMap((solution) => {
    const exact = ladderOf(solution, topology, point);
    const standard = standardLadder(point, exact);
    const make = (ladder: Ladder, standardOf?: Ladder) => proposal(point, topology, networkQ, ladder, standardOf);
    return [make(exact), ...(standard ? [make(standard, exact)] : [])];
  });
  return { proposals, why: proposals.length === 0 ? reason(point, topology, networkQ, least) : "" };
}

function ladderOf(solution: ThreeParts, topology: ThreePartTopology, { request }: DesignPoint): Ladder {
  const { atLoad, middle, atTarget } = solution;
  const { designHz } = request;
  const across = (b: number) => shuntRung(b, designHz, partsQ(request));
  const along = (x: number) => seriesRung(x, designHz);
  return topology === "pi"
    ? [across(atTarget), along(middle), across(atLoad)]
    : [along(atTarget), across(middle), along(atLoad)];
}

function proposal(
  point: DesignPoint,
  topology: ThreePartTopology,
  networkQ: number,
  ladder: Ladder,
  standardOf?: Ladder,
): Proposal {
  const { request } = point;
  const isStandard = standardOf !== undefined;
  const values = listText(ladder.map((rung) => valueText(rung, isStandard)));
  const kinds = `${topology === "pi" ? "Pi" : "T"} ${ladder.map(({ part }) => part).join("–")}`;
  return {
    method: topology === "pi" ? "piNetwork" : "tNetwork",
    title: `${kinds}${isStandard ? ", E24 values" : ","} ${values}`,
    elements: ladderElements(ladder, request),
    needs: ladder.map((part) => partNeed(part, request, isStandard)),
    notes: [
      ...(standardOf
        ? [`Standard E24 values; the exact ones are ${listText(standardOf.map((rung) => valueText(rung)))}.`]
        : []),
      `Parts are named from the source side; the loaded Q at the middle resistance is ${networkQ.toFixed(2)}.`,
      ...ladderNotes(ladder, point, isStandard),
    ],
  };
}

function reason({ request, words }: DesignPoint, topology: ThreePartTopology, networkQ: number, least: number): string {
  const what = topology === "pi" ? "pi" : "T";
  const target = ohmText(request.targetOhm);
  if (!(networkQ > least))
    return `A ${what} between this ${words.matched} and ${target} needs a Q above ${least.toFixed(2)}, that of the L-section; asked was ${networkQ.toFixed(2)}.`;
  return `With the loss of its parts no ${what} of Q ${networkQ.toFixed(2)} brings the ${words.matched} to ${target}.`;
}
