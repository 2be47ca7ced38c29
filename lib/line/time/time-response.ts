import type { Circuit } from "@/lib/line/element";
import { driveSpectrum, requireDrive, type Drive } from "@/lib/line/time/drive";
import { laplaceGrid, signalOf, type Shown } from "@/lib/line/time/laplace-grid";
import { runSpectrum } from "@/lib/line/time/run-spectrum";

/** A voltage over time: value n is at n·stepS. */
export interface Signal {
  stepS: number;
  /** volt */
  values: Float64Array;
}

export interface TimeResponse {
  /** finer than what is shown where edges need it; every `every`-th value is shown */
  stepS: number;
  every: number;
  /** one signal a plane, in the order asked */
  planes: Signal[];
}

/** Planes of a run whose voltages are signals of their own: shunt stubs are taps, and their voltage is that of the line there. */
export function tapPlanes<L>({ elements }: Pick<Circuit<L>, "elements">): number[] {
  return elements.flatMap((element, k) => (element.kind === "stub" && element.connection === "shunt" ? [k] : []));
}

/**
 * Voltages along a run after its source has begun to drive it: inverse Laplace transform by a damped FFT.
 * @param circuit - elements from source to load; at rest before the drive begins at t = 0
 * @param drive - of the source's e.m.f.
 * @param shown - window in second, at most 2,048 edges, and how many values of it
 * @param options - planes to look at (0 the source, n before element n; default source and load), temperature in °C
 * where elements have none of their own (default 20)
 * @throws RangeError when the drive, the window or an element is impossible, and for what is known on the imaginary axis
 * only: sampled terminations, constant ones with a reactance, a Q that holds at every frequency
 */
export function timeResponse(
  circuit: Circuit,
  drive: Drive,
  shown: Shown,
  options: { planes?: readonly number[]; temperatureC?: number } = {},
): TimeResponse {
  requireDrive("timeResponse", drive);
  const grid = laplaceGrid(shown, drive.riseS, drive.edge ?? "sineSquared");
  const planes = options.planes ?? [0, circuit.elements.length];
  const emf = driveSpectrum(drive, grid);
  const voltages = runSpectrum(circuit, planes, grid, { temperatureC: options.temperatureC ?? 20, emf });
  const signals = voltages.map(({ re, im }) => ({
    stepS: grid.stepS,
    values: signalOf(re, im, grid, shown.points),
  }));
  return { stepS: grid.stepS, every: grid.every, planes: signals };
}
