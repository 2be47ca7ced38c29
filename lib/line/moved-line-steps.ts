/** Cables and stubs that move, over many frequencies at once. */
import type { CableElement, StubElement } from "@/lib/line/element";
import { lineColumns, setLine, warmRatios, type LineColumns, type WarmRatios } from "@/lib/line/line-columns";
import type { MovedRun, MovedStep } from "@/lib/line/moved-steps";
import { atTemperature } from "@/lib/line/temperature";
import { normalise, stepAlongLine, waveColumns, type WaveColumns } from "@/lib/line/wave-columns";

/** Keeps the columns of a laid line at what it is now. */
function follower(laid: CableElement | StubElement, { temperatureC, columns }: MovedRun): () => LineColumns {
  const line: LineColumns = lineColumns(columns);
  const warmFor = temperatureFollower(laid, temperatureC);
  return () => {
    setLine(line, laid.line.model, warmFor());
    return line;
  };
}

/** What temperature does depends on three figures, and is worked out anew only when one of them has moved. */
function temperatureFollower(laid: CableElement | StubElement, runC: number): () => WarmRatios {
  const known = { temperatureC: NaN, coefficient: NaN as number | undefined, slopes: "" };
  let ratios: WarmRatios;
  return () => {
    const { model } = laid.line;
    const temperatureC = laid.temperatureC ?? runC;
    const slopes = model.lossSlopes ? JSON.stringify(model.lossSlopes) : "";
    const isKnown =
      known.temperatureC === temperatureC &&
      known.coefficient === model.temperatureCoefficientPerK &&
      known.slopes === slopes;
    if (!isKnown) {
      Object.assign(known, { temperatureC, coefficient: model.temperatureCoefficientPerK, slopes });
      ratios = warmRatios(atTemperature(model, temperatureC));
    }
    return ratios;
  };
}

function requireLength(length: number): number {
  if (length >= 0 && length < Infinity) return length;
  throw new RangeError(`cableStep: lengthM must be at least 0, got ${length}`);
}

export function cableStep(cable: CableElement, run: MovedRun): MovedStep {
  const follow = follower(cable, run);
  const apply = (wave: WaveColumns) => {
    stepAlongLine(follow(), requireLength(cable.lengthM), cable.paralleled ?? 1, wave);
    normalise(wave);
  };
  return { isFixed: false, apply };
}

/** A stub with an open or a shorted end. */
export function stubStep(stub: StubElement, run: MovedRun): MovedStep {
  const follow = follower(stub, run);
  const port = waveColumns(run.columns.omega.length);
  const isOpen = stub.end === "open";
  const branch = stub.connection === "shunt" ? acrossLine : inLine;
  const apply = (wave: WaveColumns) => {
    port.vRe.fill(isOpen ? 1 : 0);
    port.iRe.fill(isOpen ? 0 : 1);
    for (const column of [port.vIm, port.iIm, port.scale]) column.fill(0);
    stepAlongLine(follow(), requireLength(stub.lengthM), stub.paralleled ?? 1, port);
    branch(port, wave);
    normalise(wave);
  };
  return { isFixed: false, apply };
}

/** i + v·(i/v of the branch); a branch of 0 Ω lets nothing through. */
function acrossLine(port: WaveColumns, { vRe, vIm, iRe, iIm, scale }: WaveColumns): void {
  for (let k = 0; k < vRe.length; k++) {
    const size = port.vRe[k]! * port.vRe[k]! + port.vIm[k]! * port.vIm[k]!;
    if (size === 0) {
      [iRe[k], iIm[k]] = isNothing(vRe[k]!, vIm[k]!) ? [1, 0] : [vRe[k]!, vIm[k]!];
      [vRe[k], vIm[k], scale[k]] = [0, 0, Infinity];
      continue;
    }
    const re = (port.iRe[k]! * port.vRe[k]! + port.iIm[k]! * port.vIm[k]!) / size;
    const im = (port.iIm[k]! * port.vRe[k]! - port.iRe[k]! * port.vIm[k]!) / size;
    iRe[k]! += re * vRe[k]! - im * vIm[k]!;
    iIm[k]! += re * vIm[k]! + im * vRe[k]!;
  }
}

/** v + i·(v/i of the branch); an open branch lets nothing through. */
function inLine(port: WaveColumns, { vRe, vIm, iRe, iIm, scale }: WaveColumns): void {
  for (let k = 0; k < vRe.length; k++) {
    const size = port.iRe[k]! * port.iRe[k]! + port.iIm[k]! * port.iIm[k]!;
    if (size === 0) {
      [vRe[k], vIm[k]] = isNothing(iRe[k]!, iIm[k]!) ? [1, 0] : [iRe[k]!, iIm[k]!];
      [iRe[k], iIm[k], scale[k]] = [0, 0, Infinity];
      continue;
    }
    const re = (port.vRe[k]! * port.iRe[k]! + port.vIm[k]! * port.iIm[k]!) / size;
    const im = (port.vIm[k]! * port.iRe[k]! - port.vRe[k]! * port.iIm[k]!) / size;
    vRe[k]! += re * iRe[k]! - im * iIm[k]!;
    vIm[k]! += re * iIm[k]! + im * iRe[k]!;
  }
}

function isNothing(re: number, im: number): boolean {
  return re === 0 && im === 0;
}
