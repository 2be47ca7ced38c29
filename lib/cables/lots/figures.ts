/** What was measured of a lot -> figures of an entry. Pure. */
import type { NewLot } from "@/lib/cables/lots/schema";
import type { Figure } from "@/lib/cables/schema";
import { asTypedLoss, capital } from "@/lib/cables/lots/words";

export function figuresOfLot(lot: NewLot): Figure[] {
  const { z0Ohm, velocityFactor, loopResistanceOhmPerM, losses, temperatureC } = lot;
  const source = capital(lot.method || `lot ${lot.lot}, measured ${lot.measuredAt}`);
  const measured = (quantity: string, valueSi: number, asTyped: string): Figure => ({
    ...{ quantity, valueSi, asTyped, kind: "measured", temperatureC, source },
  });
  return [
    ...(z0Ohm === undefined ? [] : [measured("z0Ohm", z0Ohm, `${z0Ohm} Ω`)]),
    ...(velocityFactor === undefined ? [] : [measured("velocityFactor", velocityFactor, `${velocityFactor}`)]),
    ...(loopResistanceOhmPerM === undefined
      ? []
      : [
          measured(
            "r0OhmPerM",
            loopResistanceOhmPerM,
            `${Number((loopResistanceOhmPerM * 1000).toPrecision(12))} Ω/km loop`,
          ),
        ]),
    ...losses.map(({ frequencyHz, lossDbPerM }) => ({
      ...measured("lossDbPerM", lossDbPerM, asTypedLoss(lossDbPerM, frequencyHz)),
      fromHz: frequencyHz,
      toHz: frequencyHz,
    })),
  ];
}
