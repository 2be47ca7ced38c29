import { abs, divide } from "@/lib/line/complex";
import type { DesignPoint } from "@/lib/line/match/design-point";
import { along, loadPair } from "@/lib/line/match/pair";
import { realPoints } from "@/lib/line/match/quarter-wave";
import { withoutReactance } from "@/lib/line/match/without-reactance";

/** A place where what is matched is a resistance. */
export interface RealPlace {
  /** metre of feeder, load to here */
  distance: number;
  resistanceOhm: number;
}

/** A reactance below this share of an impedance counts as none. */
const noReactance = 1e-9;

/**
 * The places within a half wave where the feeder, with its loss, shows what is matched as a resistance; the load itself
 * where that is one.
 * @returns none where there is no feeder to bring a complex load to a resistance
 */
export function realPlaces(point: DesignPoint): RealPlace[] {
  const { feeder, load } = point;
  const isReal = Math.abs(load.im) <= noReactance * abs(load);
  const here = isReal ? [{ distance: 0, resistanceOhm: load.re }] : [];
  if (!feeder) return here;
  const halfWave = feeder.wavelengthM / 2;
  const seen = (distance: number) => {
    const { v, i } = along(loadPair(point), feeder, distance);
    return divide(v, i);
  };
  const reactance = (distance: number) => {
    const { re, im } = seen(distance);
    return im / Math.hypot(re, im);
  };
  const places = realPoints(load, feeder.zc.re).flatMap(({ distance }): RealPlace[] => {
    if (isReal && distance === 0) return [];
    const solved = withoutReactance(reactance, distance * feeder.wavelengthM, halfWave / 10);
    const place = solved < 0 ? solved + halfWave : solved;
    // Where the loss leaves no resistance near the lossless place there is nothing to build on.
    return Math.abs(reactance(place)) < 1e-6 ? [{ distance: place, resistanceOhm: seen(place).re }] : [];
  });
  return [...here, ...places].sort((a, b) => a.distance - b.distance);
}
