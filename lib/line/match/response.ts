import { abs, type Complex } from "@/lib/line/complex";
import { DB_PER_NEPER } from "@/lib/line/constants";
import type { Element } from "@/lib/line/element";
import { prepareElements } from "@/lib/line/element-two-port";
import type { SeenLoadAt } from "@/lib/line/match/seen-load";
import { portReflection } from "@/lib/line/reflection";
import type { Port } from "@/lib/line/termination";
import { throughTwoPort } from "@/lib/line/two-port";

export interface Response {
  /** |Γ| against the target, 0 to 1 */
  magnitude: number;
  /** available power of a source of the target's resistance over power in the load, dB; Infinity where none arrives */
  lossDb: number;
  /** the same over the power that leaves the network toward the load; that of `lossDb` where nothing stands between */
  matchLossDb: number;
}

/** A network's response at one frequency, hertz. */
export type Respond = (frequency: number) => Response;

/** What a network stands between. */
export interface Ends {
  seen: SeenLoadAt;
  /** ohm, above 0 */
  targetOhm: number;
  temperatureC?: number;
}

const powerOf = ({ v, i }: Port) => v.re * i.re + v.im * i.im;

/**
 * A matching network between a target and what it sees, as a function of frequency, with the two-ports every run is
 * made of. The same figures as the sweep of a run whose source is the target's resistance, without the planes between.
 * @param elements - from the target side to the load
 * @throws RangeError when an element is impossible, and when called where what is seen is not known
 */
export function responder(elements: readonly Element[], { seen, targetOhm, temperatureC }: Ends): Respond {
  const source = { re: targetOhm, im: 0 };
  const prepared = prepareElements({ elements: [...elements] }, temperatureC);
  return (frequency) => {
    const s = { re: 0, im: 2 * Math.PI * frequency };
    const { end, port: first, logScale } = seen(frequency);
    let port = first;
    let scale = 0;
    for (let k = prepared.length - 1; k >= 0; k--) {
      const twoPort = prepared[k]!(s);
      port = throughTwoPort(twoPort, port);
      scale += twoPort.logScale;
    }
    const driveRe = port.v.re + targetOhm * port.i.re;
    const driveIm = port.v.im + targetOhm * port.i.im;
    const available = (driveRe * driveRe + driveIm * driveIm) / (4 * targetOhm);
    const matchLossDb = lossDb(available, powerOf(first), scale);
    return {
      magnitude: abs(portReflection(port.v, port.i, source)),
      lossDb: first === end ? matchLossDb : lossDb(available, powerOf(end), scale + logScale),
      matchLossDb,
    };
  };
}

/** @param scale - neper, by which the available power's voltage is larger than it stands here */
function lossDb(available: number, arrived: number, scale: number): number {
  return arrived > 0 ? Math.max(0, 10 * Math.log10(available / arrived) + scale * DB_PER_NEPER) : Infinity;
}

/**
 * Complex reflection against the target at one frequency, for solving and trimming.
 * @param frequency - hertz, where what is seen is known
 * @throws RangeError as `responder`
 */
export function reflectionOf(
  elements: readonly Element[],
  { seen, targetOhm, temperatureC }: Ends,
  frequency: number,
): Complex {
  const s = { re: 0, im: 2 * Math.PI * frequency };
  const prepared = prepareElements({ elements: [...elements] }, temperatureC);
  const port = prepared.reduceRight((behind, at) => throughTwoPort(at(s), behind), seen(frequency).port);
  return portReflection(port.v, port.i, { re: targetOhm, im: 0 });
}
