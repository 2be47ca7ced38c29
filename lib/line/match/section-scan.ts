import { add, complex, divide, log, multiply, ONE, scale, subtract, type Complex } from "@/lib/line/complex";
import type { DesignLine, DesignPoint } from "@/lib/line/match/design-point";
import { along, loadPair } from "@/lib/line/match/pair";
import type { Lengths } from "@/lib/line/match/solve-lengths";

const steps = 240;

/**
 * Where lengths of a real section may be found, by walking along the feeder: at each place the section that completes the
 * match has one complex length, and where that comes near to being real there may be a solution. It needs no lossless
 * solution to start from: loss brings some into being and does away with others.
 * @param count - identical lengths of the section's line side by side
 * @returns starts for a solver, metre of feeder and of section; some lead nowhere, some to the same place
 */
export function sectionScan(point: DesignPoint, feeder: DesignLine, line: DesignLine, count: number): Lengths[] {
  const step = feeder.wavelengthM / 2 / steps;
  const needed = (k: number) => lengthNeeded(point, feeder, line, count, k * step);
  const starts: Lengths[] = [];
  let [before, here] = [needed(-1), needed(0)];
  for (let k = 0; k <= steps; k++) {
    const after = needed(k + 1);
    if (here.re >= 0 && Math.sign(here.im) !== Math.sign(after.im)) starts.push([(k + 0.5) * step, here.re]);
    // Two solutions may lie between two places: the length is then nearly real at both and turns back.
    const isTurning = Math.abs(here.im) <= Math.min(Math.abs(before.im), Math.abs(after.im));
    if (here.re >= 0 && isTurning) starts.push([(k - 0.3) * step, here.re], [(k + 0.3) * step, here.re]);
    [before, here] = [here, after];
  }
  return starts;
}

/**
 * The complex length, metre, of the section that would show the target at a distance; real part within its half wave.
 * Source: Zin = Zs·(Z + Zs·t)/(Zs + Z·t), t = tanh γl, solved for t with Zin the target.
 */
function lengthNeeded(
  point: DesignPoint,
  feeder: DesignLine,
  line: DesignLine,
  count: number,
  distance: number,
): Complex {
  const { v, i } = along(loadPair(point), feeder, distance);
  const section = scale(line.zc, 1 / count);
  const target = complex(point.request.targetOhm);
  const over = multiply(section, subtract(multiply(target, i), v));
  const under = subtract(multiply(multiply(section, section), i), multiply(target, v));
  const t = divide(over, under);
  const angle = log(divide(add(ONE, t), subtract(ONE, t)));
  // The logarithm gives −π/2 to π/2 of phase; a length below 0 is the same a half wave on.
  const length = divide(scale(angle, 0.5), line.gamma);
  if (length.re >= 0) return length;
  return divide(complex(angle.re / 2, angle.im / 2 + Math.PI), line.gamma);
}
