/** A bus: a trunk with taps. A tap is a shunt stub whose far end is the node. */
import type { Circuit, Element } from "@/lib/line/element";
import type { Drive } from "@/lib/line/time/drive";
import { lattice } from "@/lib/line/time/lattice";
import { tapPlanes, timeResponse } from "@/lib/line/time/time-response";
import { usualWindow } from "@/lib/line/time/usual-window";

export interface LoadedLine {
  /** ohm */
  impedance: number;
  /** what loading makes of the delay: √(1 + Cn/(C·d)) */
  slowing: number;
}

/**
 * Impedance and slowing of a trunk that nodes load evenly, for edges long beside the spacing.
 * @param z0 - of the trunk, ohm, above 0
 * @param capacitance - of the trunk, F/m, above 0
 * @param nodeCapacitance - of a node with its drop, farad, at least 0
 * @param spacing - metre from node to node, above 0
 * @throws RangeError when one is out of range
 * Source: Z = Z0/√(1 + Cn/(C·d)), the node's capacitance spread over its share of the line; H. W. Johnson and M.
 * Graham, High-Speed Digital Design, section 4.4.
 */
export function loadedLine(z0: number, capacitance: number, nodeCapacitance: number, spacing: number): LoadedLine {
  for (const [name, value] of Object.entries({ z0, capacitance, spacing }))
    if (!(value > 0 && value < Infinity)) throw new RangeError(`loadedLine: ${name} must be positive, got ${value}`);
  if (!(nodeCapacitance >= 0 && nodeCapacitance < Infinity))
    throw new RangeError(`loadedLine: nodeCapacitance must be at least 0, got ${nodeCapacitance}`);
  const slowing = Math.sqrt(1 + nodeCapacitance / (capacitance * spacing));
  return { impedance: z0 / slowing, slowing };
}

export interface TapDip {
  /** index of the tap in the circuit's elements */
  element: number;
  /** largest shortfall against the same bus without taps, per unit of the step that comes by first */
  dip: number;
  /** when it is that large, second from the start of the drive */
  atS: number;
}

/**
 * How far each tap pulls the trunk's voltage down as an edge comes by: the largest shortfall there against the same bus
 * without taps, over the step that the lossless bus without taps brings there first.
 * @param circuit - taps are its shunt stubs; without one there is no dip
 * @param drive - of the source's e.m.f.
 * @param options - window in second (default: `usualWindow`), temperature in °C where elements have none of their own
 * @returns one a tap, from source to load; a dip is NaN where no step comes by within the window
 * @throws RangeError as `timeResponse`
 */
export function tapDips(
  circuit: Circuit,
  drive: Drive,
  options: { windowS?: number; temperatureC?: number } = {},
): TapDip[] {
  const planes = tapPlanes(circuit);
  if (planes.length === 0) return [];
  const windowS = options.windowS ?? usualWindow(circuit, drive);
  const bare = withoutTaps(circuit);
  const shown = { windowS, points: 2 };
  const { temperatureC = 20 } = options;
  const loaded = timeResponse(circuit, drive, shown, { planes, temperatureC });
  const free = timeResponse(bare, drive, shown, { planes, temperatureC });
  const { fronts } = lattice(bare, drive, windowS);
  return planes.map((element, n) => {
    const incident = fronts.find(({ node }) => node === `taps.${n}`)?.amplitudeV ?? NaN;
    const worst = largestShortfall(free.planes[n]!.values, loaded.planes[n]!.values, Math.sign(incident));
    return { element, dip: worst.volt / Math.abs(incident), atS: worst.index * free.stepS };
  });
}

/** The same bus with nothing at its taps, which keep their places. */
export function withoutTaps(circuit: Circuit): Circuit {
  const elements = circuit.elements.map((element): Element =>
    element.kind === "stub" && element.connection === "shunt" ? { ...element, lengthM: 0, end: "open" } : element,
  );
  return { ...circuit, elements };
}

function largestShortfall(free: Float64Array, loaded: Float64Array, side: number): { volt: number; index: number } {
  let worst = { volt: 0, index: 0 };
  for (let n = 0; n < free.length; n++) {
    const volt = side * (free[n]! - loaded[n]!);
    if (volt > worst.volt) worst = { volt, index: n };
  }
  return worst;
}
