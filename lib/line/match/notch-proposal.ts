import type { Element } from "@/lib/line/element";
import {
  cutText,
  leadName,
  lengthNotes,
  placeText,
  type DesignLine,
  type DesignPoint,
} from "@/lib/line/match/design-point";
import type { Proposal } from "@/lib/line/match/match-request";
import type { StubEnd } from "@/lib/line/match/single-stub";
import { trimNotes } from "@/lib/line/match/trim";
import { figure, frequencyText, lengthText } from "@/lib/line/match/wording";

export interface NotchStubs {
  feeder: DesignLine;
  line: DesignLine;
  notchHz: number;
  end: StubEnd;
  /** metre */
  length: number;
  second: StubEnd;
  secondLength: number;
  /** of feeder to what is matched */
  distance: number;
}

/** Longer than calculated by this to begin with: more than velocity factors of one type vary. */
const cutLonger = 0.03;

const endWord = { open: "open", short: "shorted" };

/** A notch stub and its second stub as elements, with what they need. */
export function notchProposal(point: DesignPoint, stubs: NotchStubs): Proposal {
  const { feeder, line, notchHz, end, length, second, secondLength, distance } = stubs;
  const across = { kind: "stub", connection: "shunt", line: line.line } as const;
  const build = (lengthM: number): Element[] => [
    { ...across, name: "Notch stub", end, lengthM: length },
    { ...across, name: "Second stub at the tee", end: second, lengthM },
    ...(distance > 0
      ? [{ kind: "cable" as const, name: leadName(point, "Stub"), line: feeder.line, lengthM: distance }]
      : []),
  ];
  return {
    method: "notchStub",
    title: `Notch stub for ${frequencyText(notchHz)}, ${endWord[end]} ${lengthText(length)} and ${endWord[second]} ${lengthText(secondLength)} of ${line.label} ${placeText(point, distance)}`,
    elements: build(secondLength),
    needs: [
      "1 cross, or 2 tees joined",
      ...[end, second].map((each) => (each === "short" ? "1 soldered short" : "1 insulated open end")),
      `${cutText(point, length)} of ${line.label} for the notch`,
      `${cutText(point, secondLength)} of ${line.label} for the second stub`,
      ...(distance > 0 ? [`${cutText(point, distance)} of ${feeder.label} to ${point.words.place}`] : []),
    ],
    notes: [
      notchTrim(stubs),
      ...lengthNotes(point, distance > 0 ? [line, feeder] : [line]),
      ...trimNotes(point, "second stub", build, secondLength),
    ],
  };
}

/** A notch stands where its stub is as long as its wave: frequency and length go inversely. */
function notchTrim({ length, notchHz }: NotchStubs): string {
  const off = length < 0.5 ? 0.001 : 0.01;
  const moved = figure((notchHz * off) / length, "Hz");
  return `Trim the notch first: cut it ${lengthText(length * (1 + cutLonger))}, 3\u00a0% long, then each ${lengthText(off)} off moves the notch up by ${moved}; 1\u00a0% of velocity factor is ${figure(notchHz / 100, "Hz")} of notch.`;
}
