/** A run as far as its targets need it worked out: one sweep a band, and a standing wave only for a voltage. Pure. */
import type { Circuit } from "@/lib/line/element";
import { standingWave, type StandingWave } from "@/lib/line/standing-wave";
import type { Conditions } from "@/lib/runs/analysis";
import type { Judgeable } from "@/lib/runs/targets";
import { type Band, type WorstOver, worstOver } from "@/lib/runs/worst-over";

const hasResistance = ({ source }: Circuit) =>
  source.kind === "constant" ? source.reOhm > 0 : source.kind === "network" && (source.rOhm ?? 0) > 0;

/** Nothing is worked out before it is asked for, and nothing twice. */
export function judgeable(circuit: Circuit, conditions: Conditions): Judgeable {
  const { designHz, bandHz, availablePowerW, temperatureC } = conditions;
  const band: Band = bandHz ?? [designHz, designHz];
  const swept = new Map<string, WorstOver>();
  let wave: StandingWave | null | undefined;
  const over = (other: Band) => {
    const key = other.join(" ");
    const worst = swept.get(key) ?? worstOver(circuit, other, temperatureC);
    swept.set(key, worst);
    return worst;
  };
  return {
    band,
    worstOver: over,
    get worst() {
      return over(band);
    },
    get wave() {
      if (wave !== undefined) return wave;
      // The greatest voltage is found between the points too, so two an element will do.
      const options = { temperatureC, pointsPerElement: 2 };
      const isKnown = availablePowerW !== null && hasResistance(circuit);
      wave = isKnown ? standingWave(circuit, designHz, availablePowerW, options) : null;
      return wave;
    },
  };
}
