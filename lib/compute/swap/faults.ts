/** Whether a request to swap goes together, how much work it asks, and which cables are not tried. Pure. */
import type { Cable } from "@/lib/cables/schema";
import { sweepFaults } from "@/lib/compute/faults";
import { frequenciesOf } from "@/lib/compute/frequencies";
import { targetFaults } from "@/lib/compute/path-faults";
import { isPlace } from "@/lib/compute/swap/places";
import { targetWork } from "@/lib/compute/target-work";
import type { SwapAsked } from "@/lib/compute/swap/schema";
import type { Circuit } from "@/lib/line/element";
import { frequenciesWithBands } from "@/lib/line/target";
import type { CircuitFault } from "@/lib/runs/circuit";

/** Elements times frequencies times cables. */
const mostPoints = 25_000_000;

/**
 * @param circuit - its lines found
 * @param cables - how many are to be tried
 * @returns paths from the request's root
 */
export function swapFaults(circuit: Circuit, request: SwapAsked, cables: number): CircuitFault[] {
  const { paths, targets } = request;
  const frequencies = Array.from(frequenciesWithBands(frequenciesOf(request), targets));
  const places = paths.flatMap((path, n) => {
    if (paths.indexOf(path) < n) return [{ path: `paths.${n}`, message: "This place is named twice." }];
    return isPlace(circuit, path)
      ? []
      : [{ path: `paths.${n}`, message: "No cable stands there that could be swapped." }];
  });
  const faults = [...sweepFaults(request.circuit, frequencies, []), ...places];
  if (faults.length > 0) return faults;
  const pieces = circuit.elements.length + 1;
  const steps = pieces * frequencies.length + targetWork(request.circuit, targets, request, frequencies.length);
  if (cables * steps > mostPoints)
    return [
      {
        path: "circuit.elements",
        message: `${cables} cables in a run of ${circuit.elements.length} elements at ${frequencies.length} frequencies is too much for one request; ask for fewer frequencies.`,
      },
    ];
  return targetFaults(circuit, targets, { ...request, frequencies });
}

/** What the places ask of a cable at most. */
export interface Hardest {
  frequencyHz: number;
  hottestC: number;
  coldestC: number;
}

export function hardest({ elements }: Circuit, request: SwapAsked): Hardest {
  const temperatures = request.paths.map((path) => {
    const element = elements[Number(path.split(".")[1])];
    return (element && "temperatureC" in element ? element.temperatureC : undefined) ?? request.temperatureC;
  });
  return {
    frequencyHz: frequenciesOf(request).reduce((most, each) => Math.max(most, each), 0),
    hottestC: Math.max(...temperatures),
    coldestC: Math.min(...temperatures),
  };
}

/** Why a usable cable is not put in; undefined where it is. */
export function whyNotTried({ state, condition, limits }: Cable, place: Hardest): string | undefined {
  const { maxFrequencyHz = Infinity, maxTemperatureC = Infinity, minTemperatureC = -Infinity } = limits;
  if (state === "restricted") return `Restricted: ${condition ?? "no condition stated."}`;
  if (place.frequencyHz > maxFrequencyHz) return `Stated up to ${maxFrequencyHz} Hz only.`;
  if (place.hottestC > maxTemperatureC) return `Stated up to ${maxTemperatureC} °C only.`;
  return place.coldestC < minTemperatureC ? `Stated down to ${minTemperatureC} °C only.` : undefined;
}
