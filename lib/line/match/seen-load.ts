import { nominalFigures } from "@/lib/line/cable";
import type { Element, Line, Termination } from "@/lib/line/element";
import { prepareElements } from "@/lib/line/element-two-port";
import { terminationPort, type Port } from "@/lib/line/termination";
import { throughTwoPort } from "@/lib/line/two-port";

/** What closes a matching network at one frequency. */
export interface SeenLoad {
  /** the load's own voltage and current */
  end: Port;
  /** the same where the network ends, over e^{logScale} */
  port: Port;
  /** neper, at least 0 */
  logScale: number;
}

/** What closes a network as a function of frequency, hertz. */
export type SeenLoadAt = (frequency: number) => SeenLoad;

/** The load, and what stands between it and the network. */
export interface Behind {
  load: Termination;
  /** from the network to the load */
  behind?: readonly Element[];
  temperatureC?: number;
}

/** Frequencies kept: those at which every candidate is judged come among the first. */
const mostKept = 4096;

const axis = (frequency: number) => ({ re: 0, im: 2 * Math.PI * frequency });

/**
 * A load as the network sees it, through whatever stands behind the network.
 * @param before - the line that leads to the network: joints at the head of `behind` take their impedance from it, as
 *   they do in a run
 * @param referenceOhm - for joints where there is no cable at all, above 0
 * @throws RangeError when an element is impossible, and when called outside the samples of a sampled termination
 */
export function seenLoad({ load, behind = [], temperatureC }: Behind, referenceOhm: number, before?: Line): SeenLoadAt {
  if (behind.length === 0)
    return (frequency) => {
      const end = terminationPort(load, axis(frequency));
      return { end, port: end, logScale: 0 };
    };
  const lead: Element[] = before ? [{ kind: "cable", line: before, lengthM: 0 }] : [];
  const prepared = prepareElements({ elements: [...lead, ...behind], referenceOhm }, temperatureC).slice(lead.length);
  const kept = new Map<number, SeenLoad>();
  const through = (frequency: number): SeenLoad => {
    const s = axis(frequency);
    const end = terminationPort(load, s);
    return prepared.reduceRight<SeenLoad>(
      (seen, at) => {
        const twoPort = at(s);
        return { end, port: throughTwoPort(twoPort, seen.port), logScale: seen.logScale + twoPort.logScale };
      },
      { end, port: end, logScale: 0 },
    );
  };
  return (frequency) => {
    const known = kept.get(frequency);
    if (known) return known;
    const seen = through(frequency);
    if (kept.size < mostKept) kept.set(frequency, seen);
    return seen;
  };
}

/**
 * The least distance between two ripples of what stands behind, hertz: a wave's way to and fro through all of its
 * cables, taps included. Infinity where it has none.
 */
export function rippleHz({ behind = [] }: Pick<Behind, "behind">): number {
  const pieces = behind.flatMap((element) => {
    if (element.kind === "parallel") return element.branches;
    return element.kind === "cable" || element.kind === "stub" ? [element] : [];
  });
  const delayS = pieces.reduce((sum, { line, lengthM }) => sum + lengthM * nominalFigures(line.model).delay, 0);
  return 1 / (2 * delayS);
}

/** The measured one-ports among the load and what stands behind. */
function samplesOf({ load, behind = [] }: Behind): Extract<Termination, { kind: "sampled" }>[] {
  const ends = behind.flatMap((element): Termination[] => {
    if (element.kind === "shunt") return [element.termination];
    return element.kind === "stub" && typeof element.end !== "string" ? [element.end] : [];
  });
  return [...ends, load].filter((each) => each.kind === "sampled");
}

/** The frequencies, hertz, over which everything behind the network is known, and those of its samples. */
export function knownRange(request: Behind): { knownHz: [number, number]; besidesHz: number[] } {
  const all = samplesOf(request).map(({ frequenciesHz }) => frequenciesHz);
  const from = Math.max(0, ...all.map((frequencies) => frequencies[0] ?? Infinity));
  const to = Math.min(Infinity, ...all.map((frequencies) => frequencies.at(-1) ?? 0));
  return { knownHz: [from, to], besidesHz: all.flat() };
}
