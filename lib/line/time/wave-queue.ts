/** Waves on their way, the one that arrives first in front. */

export interface Wave {
  /** line end at which it arrives */
  end: number;
  /** second */
  atS: number;
  volt: number;
  /** the front it comes from */
  after: Passage;
}

/** A place a front has passed, and how it came there. */
export interface Passage {
  place: string;
  /** how many places before it */
  passed: number;
  from?: Passage;
}

/** A binary heap. Source: J. W. J. Williams, Algorithm 232, Comm. ACM 7 (1964) 347. */
export class WaveQueue {
  private heap: Wave[] = [];

  get length(): number {
    return this.heap.length;
  }

  get first(): Wave | undefined {
    return this.heap[0];
  }

  push(wave: Wave): void {
    const { heap } = this;
    let at = heap.push(wave) - 1;
    while (at > 0) {
      const above = (at - 1) >> 1;
      if (wave.atS >= heap[above]!.atS) break;
      heap[at] = heap[above]!;
      at = above;
    }
    heap[at] = wave;
  }

  pop(): Wave | undefined {
    const { heap } = this;
    const top = heap[0];
    const last = heap.pop();
    if (top === undefined || last === undefined || heap.length === 0) return top;
    let at = 0;
    for (;;) {
      let below = 2 * at + 1;
      if (below >= heap.length) break;
      if (below + 1 < heap.length && heap[below + 1]!.atS < heap[below]!.atS) below++;
      if (heap[below]!.atS >= last.atS) break;
      heap[at] = heap[below]!;
      at = below;
    }
    heap[at] = last;
    return top;
  }
}
