import type { Element } from "@/lib/line/element";
import { cutText, lengthNotes, placeText, type DesignLine, type DesignPoint } from "@/lib/line/match/design-point";
import { conductanceAt, doubleStub, largestConductance, nearestPlaces } from "@/lib/line/match/double-stub";
import type { Outcome, Proposal } from "@/lib/line/match/match-request";
import { along, loadPair, stubPair, withBranch, withLossShare } from "@/lib/line/match/pair";
import type { StubEnd } from "@/lib/line/match/single-stub";
import { solveLengths, type Lengths, type Network } from "@/lib/line/match/solve-lengths";
import { trimNotes } from "@/lib/line/match/trim";
import { lengthText, listText, ohmText, waveText } from "@/lib/line/match/wording";

/** Wavelengths of the feeder where the request names none: far enough for short stubs, a wide reach, little band lost. */
const usualSpacing = 1 / 8;

interface Places {
  /** wavelengths of the feeder */
  firstDistance: number;
  spacing: number;
}

/**
 * Two stubs across the feeder at given places, of every line given, both open or both shorted, both solutions of each:
 * the lossless closed form, then solved again with the lines' own loss.
 */
export function doubleStubMatches(point: DesignPoint): Outcome {
  const { feeder, lines, request } = point;
  if (!feeder || lines.length === 0) return { proposals: [], why: "No line was named to cut a stub from." };
  const places: Places = {
    firstDistance: request.firstDistanceWavelengths ?? 0,
    spacing: request.spacingWavelengths ?? usualSpacing,
  };
  const proposals = lines.flatMap((line) =>
    (["short", "open"] as const).flatMap((end) =>
      solutions(point, feeder, line, end, places).map((lengths) => proposal(point, feeder, line, end, places, lengths)),
    ),
  );
  return { proposals, why: proposals.length === 0 ? reason(point, feeder, places) : "" };
}

const planOf = ({ load, request }: DesignPoint, feeder: DesignLine, places: Places) => ({
  load,
  lineOhm: feeder.zc.re,
  targetOhm: request.targetOhm,
  ...places,
});

function solutions(point: DesignPoint, feeder: DesignLine, stub: DesignLine, end: StubEnd, places: Places): Lengths[] {
  const halfWave = stub.wavelengthM / 2;
  const starts = doubleStub({ ...planOf(point, feeder, places), stubOhm: stub.zc.re, end }).map(
    ({ first, second }): Lengths => [first * stub.wavelengthM, second * stub.wavelengthM],
  );
  const load = loadPair(point);
  const network: Network = (share) => {
    const [main, side] = [withLossShare(feeder, share), withLossShare(stub, share)];
    const before = along(load, main, places.firstDistance * feeder.wavelengthM);
    return (first, second) => {
      const between = withBranch("shunt", before, stubPair(side, first, end));
      const after = along(between, main, places.spacing * feeder.wavelengthM);
      return withBranch("shunt", after, stubPair(side, second, end));
    };
  };
  return solveLengths(point, network, starts, [halfWave, halfWave]);
}

function proposal(
  point: DesignPoint,
  feeder: DesignLine,
  stub: DesignLine,
  end: StubEnd,
  { firstDistance, spacing }: Places,
  [first, second]: Lengths,
): Proposal {
  const [lead, apart] = [firstDistance * feeder.wavelengthM, spacing * feeder.wavelengthM];
  const onFeeder = { kind: "cable", line: feeder.line } as const;
  const across = { kind: "stub", connection: "shunt", end, line: stub.line } as const;
  const build = (lengthM: number): Element[] => [
    { ...across, name: "Second stub", lengthM },
    { ...onFeeder, name: "Stub to stub", lengthM: apart },
    { ...across, name: "First stub", lengthM: first },
    ...(lead > 0
      ? [{ ...onFeeder, name: point.request.behind?.length ? "Stub to run" : "Stub to load", lengthM: lead }]
      : []),
  ];
  const kind = end === "short" ? "Two shorted stubs" : "Two open stubs";
  return {
    method: "doubleStub",
    title: `${kind}, ${lengthText(first)} and ${lengthText(second)} of ${stub.label}, ${lengthText(apart)} apart, the first ${placeText(point, lead)}`,
    elements: build(second),
    needs: [
      "2 tees",
      end === "short" ? "2 soldered shorts" : "2 insulated open ends",
      `${cutText(point, first)} and ${cutText(point, second)} of ${stub.label} for the stubs`,
      `${cutText(point, apart)} of ${feeder.label} between them`,
      ...(lead > 0 ? [`${cutText(point, lead)} of ${feeder.label} to ${point.words.place}`] : []),
    ],
    notes: [
      `The stubs stand ${waveText(spacing)} of ${feeder.label} apart; the places stay where they are, the stubs alone are trimmed.`,
      ...lengthNotes(point, [stub, feeder]),
      ...trimNotes(point, "second stub", build, second),
    ],
  };
}

/** In the forbidden region: how far in, and the nearest places out of it. */
function reason(point: DesignPoint, feeder: DesignLine, places: Places): string {
  const plan = planOf(point, feeder, places);
  const target = ohmText(plan.targetOhm);
  const [line, { matched }] = [plan.lineOhm, point.words];
  const conductance = conductanceAt(plan.load, line, places.firstDistance);
  const most = largestConductance(line, plan.targetOhm, places.spacing);
  if (conductance <= most)
    return `With the loss of ${listText(point.lines.map(({ label }) => label))}, no pair of stubs under a half wave brings the ${matched} to ${target}.`;
  const nearest = nearestPlaces({ ...plan, stubOhm: line, end: "short" });
  const ways = [
    ...(nearest.spacing === undefined ? [] : [`${waveText(nearest.spacing)} between the stubs`]),
    ...(nearest.firstDistance === undefined
      ? []
      : [`the first stub ${waveText(nearest.firstDistance)} from ${point.words.place}`]),
  ];
  const over = `this ${matched} shows ${(conductance * line).toFixed(3)} of the conductance of ${feeder.label} at the first stub, over the ${(most * line).toFixed(3)} that stubs ${waveText(places.spacing)} apart can match`;
  return `Forbidden region: ${over}. ${ways.length > 0 ? `The nearest that works: ${listText(ways, "or")}.` : `No place on ${feeder.label} works.`}`;
}
