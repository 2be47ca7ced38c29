import { abs, divide, reciprocal } from "@/lib/line/complex";
import { phaseAt, type DesignLine, type DesignPoint } from "@/lib/line/match/design-point";
import { impedanceAlong, reflectionAgainst } from "@/lib/line/match/line-angle";
import type { Outcome } from "@/lib/line/match/match-request";
import { notchProposal, type NotchStubs } from "@/lib/line/match/notch-proposal";
import { along, loadPair, stubPair, withBranch, withLossShare } from "@/lib/line/match/pair";
import { singleStub, stubLength, type StubEnd } from "@/lib/line/match/single-stub";
import { solveLengths, type Lengths, type Network } from "@/lib/line/match/solve-lengths";
import { withoutReactance } from "@/lib/line/match/without-reactance";
import { frequencyText, listText, ohmText } from "@/lib/line/match/wording";
import { portReflection, returnLossDb } from "@/lib/line/reflection";

/** A stub that without loss has over this many times its line's admittance at the design frequency leaves nothing to pass. */
const shorting = 100;

const ends: readonly StubEnd[] = ["open", "short"];

interface Notch {
  feeder: DesignLine;
  line: DesignLine;
  end: StubEnd;
  /** metre; a quarter wave open, a half wave shorted, at the notch */
  length: number;
  /** of it alone at the design frequency, siemens */
  susceptanceS: number;
}

/**
 * A stub that shorts the line at the notch frequency, and a second one at the same tee that takes away what the first
 * adds at the design frequency, together with what a single-stub match there would. What is matched well enough already
 * gets the pair at its own place, and the pair then adds as little reflection as its loss allows.
 */
export function notchStubs(point: DesignPoint): Outcome {
  const { feeder, lines, request } = point;
  const { notchHz, designHz } = request;
  if (notchHz === undefined) return { proposals: [], why: "No notch frequency was named." };
  if (!feeder || lines.length === 0) return { proposals: [], why: "No line was named to cut a stub from." };
  const all = lines.flatMap((line) => ends.map((end) => notchOf(point, feeder, line, end, notchHz)));
  const able = all.filter((notch) => !isShortAtDesign(notch));
  const proposals = able.flatMap((notch) =>
    ends.flatMap((second) =>
      [...besideMatched(point, notch, second), ...matching(point, notch, second)].map(([distance, length]) =>
        notchProposal(point, { ...notch, notchHz, second, secondLength: length, distance } satisfies NotchStubs),
      ),
    ),
  );
  const at = frequencyText(designHz);
  const why =
    able.length === 0
      ? `A stub that shorts ${frequencyText(notchHz)} shorts ${at} too.`
      : `No pair of stubs of ${listText(lines.map(({ label }) => label))} at one tee brings the ${point.words.matched} to ${ohmText(request.targetOhm)} at ${at}.`;
  return { proposals, why: proposals.length === 0 ? why : "" };
}

function notchOf(point: DesignPoint, feeder: DesignLine, line: DesignLine, end: StubEnd, notchHz: number): Notch {
  const length = (end === "open" ? Math.PI / 2 : Math.PI) / phaseAt(line, point.request, notchHz);
  const { v, i } = stubPair(line, length, end);
  return { feeder, line, end, length, susceptanceS: divide(i, v).im };
}

/** Whether the stub shorts the design frequency as it does the notch: what a lossy stub shows there is no measure. */
function isShortAtDesign({ line, end, length }: Notch): boolean {
  const tangent = Math.abs(Math.tan(line.gamma.im * length));
  return (end === "open" ? tangent : 1 / tangent) > shorting;
}

/** The pair at the place of what keeps the asked return loss already: the second stub cancels the first. */
function besideMatched(point: DesignPoint, notch: Notch, second: StubEnd): Lengths[] {
  const { load, request } = point;
  const { line, susceptanceS } = notch;
  const target = { re: request.targetOhm, im: 0 };
  if (returnLossDb(abs(reflectionAgainst(load, request.targetOhm))) < request.returnLossDb) return [];
  const start = stubLength(-susceptanceS, 1 / line.zc.re, second === "open") * line.wavelengthM;
  const first = withBranch("shunt", loadPair(point), stubPair(line, notch.length, notch.end));
  // What the pair changes is a susceptance: it is gone where the reflection is again as far from real as without it.
  const alone = reflectionAgainst(load, request.targetOhm).im;
  const excess = (length: number) => {
    const { v, i } = withBranch("shunt", first, stubPair(line, length, second));
    return portReflection(v, i, target).im - alone;
  };
  const length = withoutReactance(excess, start, line.wavelengthM / 20);
  return length > 0 ? [[0, length]] : [];
}

/** The pair as a single-stub match, every solution. */
function matching(point: DesignPoint, { feeder, line, end, length, susceptanceS }: Notch, second: StubEnd): Lengths[] {
  const { load, request } = point;
  const { targetOhm } = request;
  const plan = { load, lineOhm: feeder.zc.re, targetOhm, stubOhm: line.zc.re, connection: "shunt" as const };
  const starts = singleStub({ ...plan, end: second }).map(({ distance }): Lengths => {
    const seen = reciprocal(impedanceAlong(load, feeder.zc.re, distance)).im;
    const rest = stubLength(-seen - susceptanceS, 1 / line.zc.re, second === "open");
    return [distance * feeder.wavelengthM, rest * line.wavelengthM];
  });
  const pair = loadPair(point);
  const network: Network = (share) => {
    const [main, side] = [withLossShare(feeder, share), withLossShare(line, share)];
    const first = stubPair(side, length, end);
    return (d, l) => withBranch("shunt", withBranch("shunt", along(pair, main, d), first), stubPair(side, l, second));
  };
  const halfWaves: Lengths = [feeder.wavelengthM / 2, line.wavelengthM / 2];
  return solveLengths(point, network, starts, halfWaves).filter(([, each]) => each > 0);
}
