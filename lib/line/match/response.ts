import { abs, type Complex } from "@/lib/line/complex";
import { DB_PER_NEPER } from "@/lib/line/constants";
import type { Element, Termination } from "@/lib/line/element";
import { prepareElements } from "@/lib/line/element-two-port";
import { portReflection } from "@/lib/line/reflection";
import { terminationPort } from "@/lib/line/termination";
import { throughTwoPort } from "@/lib/line/two-port";

export interface Response {
  /** |Γ| against the target, 0 to 1 */
  magnitude: number;
  /** available power of a source of the target's resistance over power in the load, dB; Infinity where none arrives */
  lossDb: number;
}

/** A network's response at one frequency, hertz. */
export type Respond = (frequency: number) => Response;

/**
 * A matching network and its load as a function of frequency, with the two-ports every run is made of. The same
 * figures as the sweep of a run whose source is the target's resistance, without the planes between.
 * @param elements - from the target side to the load
 * @param targetOhm - above 0
 * @throws RangeError when an element is impossible, and when called outside the samples of a sampled load
 */
export function responder(
  elements: readonly Element[],
  load: Termination,
  targetOhm: number,
  temperatureC?: number,
): Respond {
  const source = { re: targetOhm, im: 0 };
  const prepared = prepareElements({ elements: [...elements] }, temperatureC);
  return (frequency) => {
    const s = { re: 0, im: 2 * Math.PI * frequency };
    const end = terminationPort(load, s);
    let port = end;
    let scale = 0;
    for (let k = prepared.length - 1; k >= 0; k--) {
      const twoPort = prepared[k]!(s);
      port = throughTwoPort(twoPort, port);
      scale += twoPort.logScale;
    }
    const arrived = end.v.re * end.i.re + end.v.im * end.i.im;
    const driveRe = port.v.re + targetOhm * port.i.re;
    const driveIm = port.v.im + targetOhm * port.i.im;
    const available = (driveRe * driveRe + driveIm * driveIm) / (4 * targetOhm);
    return {
      magnitude: abs(portReflection(port.v, port.i, source)),
      lossDb: arrived > 0 ? Math.max(0, 10 * Math.log10(available / arrived) + scale * DB_PER_NEPER) : Infinity,
    };
  };
}

/**
 * Complex reflection against the target at one frequency, for solving and trimming.
 * @param frequency - hertz, where the load is known
 * @throws RangeError as `responder`
 */
export function reflectionOf(
  elements: readonly Element[],
  { load, targetOhm, temperatureC }: { load: Termination; targetOhm: number; temperatureC?: number },
  frequency: number,
): Complex {
  const s = { re: 0, im: 2 * Math.PI * frequency };
  const prepared = prepareElements({ elements: [...elements] }, temperatureC);
  const port = prepared.reduceRight((seen, at) => throughTwoPort(at(s), seen), terminationPort(load, s));
  return portReflection(port.v, port.i, { re: targetOhm, im: 0 });
}
