import type { Circuit } from "@/lib/line/element";
import type { Drive } from "@/lib/line/time/drive";
import { readings, type ReadingOptions, type Readings } from "@/lib/line/time/readings";
import { settledLevels } from "@/lib/line/time/settled";
import { timeResponse } from "@/lib/line/time/time-response";
import { usualWindow } from "@/lib/line/time/usual-window";

export interface StepFigureOptions extends ReadingOptions {
  /** plane at which to read: 0 the source, n before element n; default the load */
  plane?: number;
  /** second; default `usualWindow` */
  windowS?: number;
  /** °C, for elements without one of their own; default 20 */
  temperatureC?: number;
}

/**
 * Delay, rise, overshoot, settling and settled level at one place of a run: what a target in time is held against.
 * @throws RangeError as `timeResponse` and `readings`
 */
export function stepFigures(circuit: Circuit, drive: Drive, options: StepFigureOptions = {}): Readings {
  const { plane = circuit.elements.length, temperatureC = 20, ...asked } = options;
  const windowS = options.windowS ?? usualWindow(circuit, drive);
  const { planes } = timeResponse(circuit, drive, { windowS, points: 2 }, { planes: [plane], temperatureC });
  const [level] = settledLevels(circuit, [plane], temperatureC);
  return readings(planes[0]!, drive, level!, asked);
}
