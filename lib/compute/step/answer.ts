/** A circuit driven by a step, a pulse or bits -> the answer of `lib/line`, in the shape of the wire. Pure. */
import type { StepAnswer, StepRequest } from "@/lib/compute/step/schema";
import { wireNumber } from "@/lib/compute/wire";
import { tapDips } from "@/lib/line/bus";
import type { Circuit } from "@/lib/line/element";
import { lattice } from "@/lib/line/time/lattice";
import { readings, type Readings } from "@/lib/line/time/readings";
import { settledLevels } from "@/lib/line/time/settled";
import { tapPlanes, timeResponse, type Signal } from "@/lib/line/time/time-response";

/** @throws RangeError where the engine refuses */
export function stepAnswer(circuit: Circuit, asked: Omit<StepRequest, "circuit">): StepAnswer {
  const { drive, windowS, points, temperatureC, delayFraction, thresholdV, settlingBand } = asked;
  const planes = [0, circuit.elements.length, ...tapPlanes(circuit)];
  const response = timeResponse(circuit, drive, { windowS, points }, { planes, temperatureC });
  const levels = settledLevels(circuit, planes, temperatureC);
  const options = { fraction: delayFraction, band: settlingBand, ...(thresholdV !== undefined && { thresholdV }) };
  const shown = (signal: Signal) =>
    Array.from({ length: points }, (_, k) => wireNumber(signal.values[k * response.every]!));
  const read = (n: number) => wireReadings(readings(response.planes[n]!, drive, levels[n]!, options));
  const taps = planes.slice(2).map((_, n) => n + 2);
  const [source, load] = response.planes;
  return {
    timeS: Array.from({ length: points }, (_, k) => (k * windowS) / (points - 1)),
    sourceNodeV: shown(source!),
    loadNodeV: shown(load!),
    tapNodesV: taps.map((n) => shown(response.planes[n]!)),
    ...lattice(circuit, drive, windowS),
    readings: read(1),
    tapReadings: taps.map(read),
    ...(asked.tapDips && { tapDips: dipsOf(circuit, asked) }),
  };
}

function wireReadings({ delayS, reachedS, riseS, overshoot, settlingS, settledV }: Readings) {
  return {
    delayS: wireNumber(delayS),
    reachedS: wireNumber(reachedS),
    riseS: wireNumber(riseS),
    overshoot: wireNumber(overshoot),
    settlingS: wireNumber(settlingS),
    settledV: wireNumber(settledV),
  };
}

function dipsOf(circuit: Circuit, { drive, windowS, temperatureC }: Omit<StepRequest, "circuit">) {
  return tapDips(circuit, drive, { windowS, temperatureC }).map(({ element, dip, atS }) => ({
    element,
    dip: wireNumber(dip),
    atS: wireNumber(atS),
  }));
}
