/** What targets cost beside a sweep. Pure. */
import type { Drive } from "@/lib/line/time/drive";
import type { Target } from "@/lib/line/target";
import type { Circuit } from "@/lib/runs/circuit-schema";

/** A standing wave at a frequency is about this many sweeps there, a response over time this many at one frequency. */
const waveWork = 20;
const timeWork = 3000;

/**
 * How many steps through an element at a frequency the targets take beside one sweep, as measured.
 * @param frequencies - how many
 */
export function targetWork(
  { elements }: Pick<Circuit, "elements">,
  targets: readonly Target[],
  { drive }: { drive?: Drive | undefined },
  frequencies: number,
): number {
  const pieces = elements.length + 1;
  const taps = elements.filter((element) => element.kind === "stub").length;
  const inTime = ["overshoot", "settling", "delay", "level"];
  const waves = targets.filter(({ quantity }) => quantity === "voltage").length * waveWork * frequencies;
  if (!drive) return pieces * waves;
  const readings = targets.some(({ quantity }) => inTime.includes(quantity)) ? 1 : 0;
  const dips = targets.filter(({ quantity }) => quantity === "tapDip").length * (2 + taps / 4);
  return pieces * (waves + (readings + dips) * timeWork);
}
