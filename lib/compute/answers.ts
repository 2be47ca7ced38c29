/** Requests whose lines are found -> answers of `lib/line`, in the shapes of the wire. Pure. */
import type { z } from "zod";
import { type Frequencies, frequenciesOf } from "@/lib/compute/frequencies";
import type {
  lineAnswerSchema,
  ProfileRequest,
  profileAnswerSchema,
  SweepRequest,
  sweepAnswerSchema,
} from "@/lib/compute/schema";
import { wireComplex, wireNumber, wireNumbers } from "@/lib/compute/wire";
import type { Circuit, LineModel } from "@/lib/line/element";
import { lineFigures } from "@/lib/line/line-figures";
import { sweep } from "@/lib/line/run";
import { standingWave } from "@/lib/line/standing-wave";

/** @throws RangeError where the engine refuses, as do all here */
export function lineAnswer(
  model: LineModel,
  asked: Frequencies & { temperatureC: number },
): z.infer<typeof lineAnswerSchema> {
  const frequenciesHz = frequenciesOf(asked);
  const figures = lineFigures(model, frequenciesHz, asked.temperatureC);
  return {
    frequenciesHz,
    rOhmPerM: wireNumbers(figures.rOhmPerM),
    lHPerM: wireNumbers(figures.lHPerM),
    gSPerM: wireNumbers(figures.gSPerM),
    cFPerM: wireNumbers(figures.cFPerM),
    zcOhm: wireComplex(figures.zcOhm),
    attenuationDbPerM: wireNumbers(figures.attenuationDbPerM),
    phaseRadPerM: wireNumbers(figures.phaseRadPerM),
    phaseVelocityMPerS: wireNumbers(figures.phaseVelocityMPerS),
    velocityFactor: wireNumbers(figures.velocityFactor),
    groupDelaySPerM: wireNumbers(figures.groupDelaySPerM),
  };
}

type Conditions<Request> = Omit<Request, "circuit">;

export function sweepAnswer(circuit: Circuit, asked: Conditions<SweepRequest>): z.infer<typeof sweepAnswerSchema> {
  const { temperatureC, planes } = asked;
  const frequenciesHz = frequenciesOf(asked);
  const result = sweep(circuit, frequenciesHz, { temperatureC, planes });
  return {
    frequenciesHz,
    inputImpedanceOhm: wireComplex(result.inputImpedance),
    reflection: wireComplex(result.reflection),
    returnLossDb: wireNumbers(result.returnLossDb),
    vswr: wireNumbers(result.vswr),
    loadReflection: wireComplex(result.loadReflection),
    transducerLossDb: wireNumbers(result.transducerLossDb),
    matchedLossDb: wireNumbers(result.matchedLossDb),
    mismatchLossDb: wireNumbers(result.mismatchLossDb),
    extraLossDb: wireNumbers(result.extraLossDb),
    groupDelayS: wireNumbers(result.groupDelayS),
    elementLossDb: result.elementLossDb.map(wireNumbers),
    atPlanes: result.atPlanes.map(({ plane, impedance, reflection, returnLossDb, vswr }) => ({
      plane,
      impedanceOhm: wireComplex(impedance),
      reflection: wireComplex(reflection),
      returnLossDb: wireNumbers(returnLossDb),
      vswr: wireNumbers(vswr),
    })),
  };
}

export function profileAnswer(
  circuit: Circuit,
  asked: Conditions<ProfileRequest>,
): z.infer<typeof profileAnswerSchema> {
  const { frequencyHz, availablePowerW, pointsPerElement, temperatureC } = asked;
  const wave = standingWave(circuit, frequencyHz, availablePowerW, { pointsPerElement, temperatureC });
  return {
    positionM: Array.from(wave.positionM),
    voltageV: wireNumbers(wave.voltageV),
    currentA: wireNumbers(wave.currentA),
    maxVoltageV: wireNumber(wave.maxVoltageV),
    maxVoltageAtM: wireNumber(wave.maxVoltageAtM),
    maxCurrentA: wireNumber(wave.maxCurrentA),
    maxCurrentAtM: wireNumber(wave.maxCurrentAtM),
    elements: wave.elements.map(({ dissipatedW }) => ({ dissipatedW: wireNumber(dissipatedW) })),
    loadPowerW: wireNumber(wave.loadPowerW),
  };
}
