/** A run at direct current, in the shape of the wire. Pure. */
import type { z } from "zod";
import type { DcRequest, dcAnswerSchema } from "@/lib/compute/dc/schema";
import { wireNumber, wireNumbers } from "@/lib/compute/wire";
import { directCurrent } from "@/lib/line/dc";
import type { Circuit } from "@/lib/line/element";

/** @throws RangeError where the engine refuses */
export function dcAnswer(circuit: Circuit, asked: Omit<DcRequest, "circuit">): z.infer<typeof dcAnswerSchema> {
  const dc = directCurrent(circuit, asked);
  return {
    loopResistanceOhm: wireNumber(dc.loopResistanceOhm),
    supplyCurrentA: wireNumber(dc.supplyCurrentA),
    points: dc.points.map(({ at, element, nodeVoltageV, ...point }) => ({
      at,
      ...(element !== undefined && { element }),
      ohmMeterReadsOhm: wireNumber(point.ohmMeterReadsOhm),
      voltageV: wireNumber(point.voltageV),
      ...(nodeVoltageV !== undefined && { nodeVoltageV: wireNumber(nodeVoltageV) }),
      dissipatedW: wireNumber(point.dissipatedW),
    })),
    elementDissipatedW: wireNumbers(dc.elementDissipatedW),
    notes: circuit.elements.flatMap(({ kind }, index) =>
      kind === "transformer"
        ? [
            `Element ${index} is an ideal transformer, which passes direct current; a real one blocks it, and a meter reads its winding.`,
          ]
        : [],
    ),
  };
}
