/** The quantities a target can be set on that are a question of time: what a run does when its source begins to drive it. */
import { tapDips } from "@/lib/line/bus";
import type { Circuit } from "@/lib/line/element";
import type { Reached } from "@/lib/line/target";
import type { Drive } from "@/lib/line/time/drive";
import { readings, type Readings } from "@/lib/line/time/readings";
import { settledLevels } from "@/lib/line/time/settled";
import { timeResponse } from "@/lib/line/time/time-response";
import { usualWindow } from "@/lib/line/time/usual-window";

/** Values of the window that are asked for; the response is worked out finer where edges need it. */
const points = 2049;

/**
 * Readings at the load.
 * @throws RangeError where the run cannot be driven: see `timeResponse`
 */
export function readingsAtLoad(circuit: Circuit, drive: Drive, temperatureC: number): Readings {
  const shown = { windowS: usualWindow(circuit, drive), points };
  const planes = [circuit.elements.length];
  const response = timeResponse(circuit, drive, shown, { planes, temperatureC });
  const [level] = settledLevels(circuit, planes, temperatureC);
  return readings(response.planes[0]!, drive, level!);
}

/** The least and the greatest dip of the run's taps, or why there is none. Throws as `readingsAtLoad`. */
export function dipsOfTaps(circuit: Circuit, drive: Drive, temperatureC: number): Reached | string {
  const dips = tapDips(circuit, drive, { temperatureC }).map(({ dip }) => dip);
  if (dips.length === 0) return "The run has no tap.";
  const reached = { least: Math.min(...dips), greatest: Math.max(...dips) };
  return Number.isNaN(reached.least) ? "No step comes by one of the taps within the window." : reached;
}
