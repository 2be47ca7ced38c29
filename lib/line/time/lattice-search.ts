/** Follows wave fronts from junction to junction in order of time; waves that meet in one moment become one. */
import type { Transition } from "@/lib/line/time/drive";
import { scatter, type LineEnd, type Scattered } from "@/lib/line/time/junction";
import type { LatticeGraph } from "@/lib/line/time/lattice-graph";
import { WaveQueue, type Passage, type Wave } from "@/lib/line/time/wave-queue";

/** A jump of a node's voltage. */
export interface Found {
  timeS: number;
  node: string;
  amplitudeV: number;
  passage: Passage;
  /** of the strongest wave in it, volt */
  strongest: number;
}

/** Waves followed at most. */
const mostFollowed = 30_000;
/** What rounding leaves of a reflection that is none, per wave. */
const rounding = 1e-12;

/** A wave on a line, from where it begins to where it arrives; waves that share both are one. */
export interface Ray {
  /** which line of the graph */
  line: number;
  /** whether it goes from the line's source side to the other */
  isForward: boolean;
  startS: number;
  endS: number;
  /** height of the front, volt */
  volt: number;
}

export class LatticeSearch {
  found: Found[] = [];
  rays: Ray[] = [];
  /** waves that were not followed: too weak, or too many */
  left = 0;
  private waiting = new WaveQueue();
  private scattered = new Map<LineEnd | "source", Scattered>();
  /** fronts of the moment that is being worked on, by node */
  private now = new Map<string, Found>();

  /**
   * @param windowS - second, fronts up to here
   * @param limits - `floor`: waves below it are not followed, volt; `sameS`: what is closer in time is one moment
   */
  constructor(
    private readonly graph: LatticeGraph,
    private readonly windowS: number,
    private readonly limits: { floor: number; sameS: number },
  ) {}

  /**
   * Sends out edges and follows them.
   * @returns whether all could be followed to the end of the window
   */
  follow(edges: Transition[]): boolean {
    const waitingEdges = [...edges];
    for (let followed = 0; followed < mostFollowed;) {
      const edge = waitingEdges[0];
      const next = this.waiting.first;
      if (edge === undefined && next === undefined) return true;
      const timeS = Math.min(edge?.atS ?? Infinity, next?.atS ?? Infinity);
      const untilS = timeS + this.limits.sameS;
      while (waitingEdges[0] !== undefined && waitingEdges[0].atS <= untilS)
        this.pass(this.graph.source, "source", timeS, waitingEdges.shift()!.jumpV, undefined);
      for (const wave of this.arriving(untilS)) {
        this.rays.push(this.rayOf(wave));
        this.pass(this.graph.ends[wave.end]!, wave.end, timeS, wave.volt, wave.after);
        followed++;
      }
      this.found.push(...this.now.values());
      this.now.clear();
    }
    this.left += this.waiting.length + waitingEdges.length;
    return false;
  }

  /** Waves that arrive until a time, those on the same line end as one. */
  private arriving(untilS: number): Wave[] {
    const merged = new Map<LineEnd, Wave & { strongest: number }>();
    while ((this.waiting.first?.atS ?? Infinity) <= untilS) {
      const wave = this.waiting.pop()!;
      const known = merged.get(wave.end);
      const strength = Math.abs(wave.volt);
      if (known === undefined) {
        merged.set(wave.end, { ...wave, strongest: strength });
        continue;
      }
      known.volt += wave.volt;
      if (strength > known.strongest) {
        known.strongest = strength;
        known.after = wave.after;
      }
    }
    return [...merged.values()];
  }

  private rayOf({ end, atS, volt }: Wave): Ray {
    const line = end >> 1;
    const startS = atS - this.graph.lines[line]!.delayS;
    return { line, isForward: end % 2 === 1, startS, endS: atS, volt };
  }

  private pass(junction: number, from: LineEnd | "source", timeS: number, volt: number, after?: Passage): void {
    if (from !== "source" && Math.abs(volt) <= this.limits.floor) {
      this.left++;
      return;
    }
    const { place } = this.graph.junctions[junction]!;
    const passage: Passage = { place, passed: after === undefined ? 0 : after.passed + 1 };
    if (after !== undefined) passage.from = after;
    const { waves, nodes } = this.scatteredBy(junction, from);
    for (const { name, volt: jump } of nodes)
      if (Math.abs(jump) > rounding) this.jump(name, timeS, jump * volt, passage, Math.abs(volt));
    for (const wave of waves) if (Math.abs(wave.volt) > rounding) this.send(wave.end, timeS, wave.volt * volt, passage);
  }

  private jump(node: string, timeS: number, amplitudeV: number, passage: Passage, strength: number): void {
    const known = this.now.get(node);
    if (known === undefined) {
      this.now.set(node, { timeS, node, amplitudeV, passage, strongest: strength });
      return;
    }
    known.amplitudeV += amplitudeV;
    if (strength <= known.strongest) return;
    known.strongest = strength;
    known.passage = passage;
  }

  private send(end: LineEnd, timeS: number, volt: number, after: Passage): void {
    const atS = timeS + this.graph.lines[end >> 1]!.delayS;
    if (atS <= this.windowS) this.waiting.push({ end: end ^ 1, atS, volt, after });
  }

  private scatteredBy(junction: number, from: LineEnd | "source"): Scattered {
    const known = this.scattered.get(from);
    if (known) return known;
    const impedanceOf = (end: LineEnd) => this.graph.lines[end >> 1]!.impedance;
    const scattered = scatter(this.graph.junctions[junction]!, impedanceOf, from);
    this.scattered.set(from, scattered);
    return scattered;
  }
}
