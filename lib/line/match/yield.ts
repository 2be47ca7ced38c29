import type { Element } from "@/lib/line/element";
import { requireTolerance, withLooseResistors, type CutTolerance } from "@/lib/line/match/at-limits";
import { uniformDraws } from "@/lib/line/match/draw";
import type { Band } from "@/lib/line/match/extreme";
import { madeNetwork } from "@/lib/line/match/made-network";
import type { Ends } from "@/lib/line/match/response";
import { tellingFrequencies } from "@/lib/line/match/telling";
import { magnitudeOfReturnLoss } from "@/lib/line/reflection";

/** Makings drawn: a yield of 90 % is then known to ±2.6 % (two standard deviations). */
export const yieldDraws = 500;
const seed = 1;

/**
 * Share of networks made within the tolerance that keep the asked return loss at the band's telling frequencies. Each
 * length and value is drawn evenly within its limits, each by itself; the same draws for every network, so that two of
 * them compare.
 * @param elements - the network alone, from the target side to the load
 * @returns percent, 0 to 100; 0 or 100 where nothing can be off
 * @throws RangeError when a tolerance is out of its range or an element is impossible
 */
export function yieldPercent(elements: readonly Element[], tolerance: CutTolerance, ends: Ends, band: Band): number {
  requireTolerance("yieldPercent", tolerance);
  const network = withLooseResistors(elements, tolerance);
  const frequencies = tellingFrequencies(network, ends, band);
  const { figures, magnitude } = madeNetwork(network, tolerance, ends, frequencies);
  const limit = magnitudeOfReturnLoss(band.returnLossDb) * (1 + rounding);
  const shares = new Float64Array(figures);
  const keeps = () => {
    for (let k = 0; k < frequencies.length; k++) if (!(magnitude(k, shares) <= limit)) return false;
    return true;
  };
  if (figures === 0) return keeps() ? 100 : 0;
  const draw = uniformDraws(seed);
  let kept = 0;
  for (let n = 0; n < yieldDraws; n++) {
    for (let j = 0; j < figures; j++) shares[j] = draw();
    if (keeps()) kept += 1;
  }
  return (100 * kept) / yieldDraws;
}

/** A limit that is met exactly must not be missed by the last digit. */
const rounding = 1e-9;
