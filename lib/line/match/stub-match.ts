import type { Element } from "@/lib/line/element";
import {
  cutText,
  leadName,
  lengthNotes,
  placeText,
  type DesignLine,
  type DesignPoint,
} from "@/lib/line/match/design-point";
import type { Outcome, Proposal } from "@/lib/line/match/match-request";
import { singleStub, type StubEnd } from "@/lib/line/match/single-stub";
import { along, loadPair, stubPair, withBranch, withLossShare } from "@/lib/line/match/pair";
import { solveLengths, type Lengths, type Network } from "@/lib/line/match/solve-lengths";
import { trimNotes } from "@/lib/line/match/trim";
import { lengthText, listText, ohmText } from "@/lib/line/match/wording";

type Connection = "shunt" | "series";

/**
 * One stub on the feeder, of every line given, open and shorted, both solutions of each: the lossless closed form, then
 * solved again with the lines' own loss.
 */
export function stubMatches(point: DesignPoint, connection: Connection): Outcome {
  const { feeder, lines } = point;
  if (!feeder || lines.length === 0) return { proposals: [], why: "No line was named to cut a stub from." };
  const proposals = lines.flatMap((line) =>
    (["short", "open"] as const).flatMap((end) =>
      solutions(point, feeder, line, connection, end).map((lengths) =>
        proposal(point, feeder, line, connection, end, lengths),
      ),
    ),
  );
  return { proposals, why: proposals.length === 0 ? reason(point, feeder, connection) : "" };
}

function solutions(
  point: DesignPoint,
  feeder: DesignLine,
  stub: DesignLine,
  connection: Connection,
  end: StubEnd,
): Lengths[] {
  const halfWaves: Lengths = [feeder.wavelengthM / 2, stub.wavelengthM / 2];
  const starts = closedForm(point, feeder, stub.zc.re, connection, end).map(({ distance, length }): Lengths => [
    distance * feeder.wavelengthM,
    length * stub.wavelengthM,
  ]);
  const load = loadPair(point);
  const network: Network = (share) => {
    const [main, side] = [withLossShare(feeder, share), withLossShare(stub, share)];
    return (d, l) => withBranch(connection, along(load, main, d), stubPair(side, l, end));
  };
  return solveLengths(point, network, starts, halfWaves);
}

function closedForm(point: DesignPoint, feeder: DesignLine, stubOhm: number, connection: Connection, end: StubEnd) {
  const { load, request } = point;
  return singleStub({ load, lineOhm: feeder.zc.re, stubOhm, targetOhm: request.targetOhm, connection, end });
}

function proposal(
  point: DesignPoint,
  feeder: DesignLine,
  stub: DesignLine,
  connection: Connection,
  end: StubEnd,
  [distance, length]: Lengths,
): Proposal {
  const build = (lengthM: number): Element[] => [
    { kind: "stub", name: "Stub", connection, end, line: stub.line, lengthM },
    ...(distance > 0
      ? [{ kind: "cable" as const, name: leadName(point, "Stub"), line: feeder.line, lengthM: distance }]
      : []),
  ];
  const kind = `${end === "short" ? "Shorted" : "Open"} stub${connection === "series" ? " in series" : ""}`;
  const where = placeText(point, distance);
  return {
    method: connection === "shunt" ? "shuntStub" : "seriesStub",
    title: `${kind}, ${lengthText(length)} of ${stub.label} ${where}`,
    elements: build(length),
    needs: needs(point, feeder, stub, connection, end, distance, length),
    notes: [
      ...lengthNotes(point, distance > 0 ? [stub, feeder] : [stub]),
      ...trimNotes(point, "stub", build, length),
      ...(connection === "series"
        ? ["A series stub interrupts one conductor: of a coaxial stub the screen is live at the joint."]
        : []),
    ],
  };
}

function needs(
  point: DesignPoint,
  feeder: DesignLine,
  stub: DesignLine,
  connection: Connection,
  end: StubEnd,
  distance: number,
  length: number,
): string[] {
  return [
    connection === "shunt" ? "1 tee" : "1 series joint, insulated",
    end === "short" ? "1 soldered short" : "1 insulated open end",
    `${cutText(point, length)} of ${stub.label} for the stub`,
    ...(distance > 0 ? [`${cutText(point, distance)} of ${feeder.label} to ${point.words.place}`] : []),
  ];
}

function reason(point: DesignPoint, feeder: DesignLine, connection: Connection): string {
  const target = ohmText(point.request.targetOhm);
  const isReached = closedForm(point, feeder, feeder.zc.re, connection, "short").length > 0;
  if (!isReached) {
    const quantity = connection === "shunt" ? "conductance" : "resistance";
    return `With this ${point.words.matched}, ${feeder.label} of ${ohmText(feeder.zc.re)} nowhere shows the ${quantity} of ${target}, so a stub cannot complete it.`;
  }
  const names = listText(point.lines.map((line) => line.label));
  return `With the loss of ${names}, no pair of lengths under a half wave brings the ${point.words.matched} to ${target}.`;
}
