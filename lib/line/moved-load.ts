/** A load that is moved by its reflection. */
import { isSteady, type CircuitPlace } from "@/lib/line/circuit-path";
import { abs, arg, polar } from "@/lib/line/complex";
import type { Circuit, Termination } from "@/lib/line/element";
import { impedanceOfReflection, portReflection } from "@/lib/line/reflection";
import { terminationPort } from "@/lib/line/termination";

/**
 * Puts the load that has a reflection, in the run's reference: magnitude and angle as the paths say, and as drawn where
 * none does.
 * @returns nothing to do where no path names the reflection
 * @throws RangeError, in words, when the load is moved in two ways, when what is left open changes with frequency, or
 * the run has no reference
 */
export function loadMover(circuit: Circuit, places: readonly CircuitPlace[]): ((values: ArrayLike<number>) => void)[] {
  const find = (figure: string) => places.findIndex((place) => place.kind === "reflection" && place.figure === figure);
  const [magnitude, phase] = [find("reflectionMagnitude"), find("reflectionPhase")];
  if (magnitude < 0 && phase < 0) return [];
  if (places.some((place) => place.kind === "figure" && place.touched === "load"))
    throw new RangeError("loadMover: the load is moved by its reflection or by its own figures, not by both");
  const drawn = drawnReflection(circuit);
  if (!drawn && (magnitude < 0 || phase < 0))
    throw new RangeError(
      "loadMover: of a load that changes with frequency both reflectionMagnitude and reflectionPhase must be named",
    );
  const { reflectionMagnitude = 0, reflectionPhase = 0 } = drawn ?? {};
  return [
    (values) => {
      const gamma = polar(
        magnitude < 0 ? reflectionMagnitude : values[magnitude]!,
        phase < 0 ? reflectionPhase : values[phase]!,
      );
      circuit.load = terminationOf(impedanceOfReflection(gamma, requiredReference(circuit)));
    },
  ];
}

/**
 * Magnitude and angle of the load's reflection as drawn, in the run's reference.
 * @returns undefined for a load that changes with frequency
 * @throws RangeError when the run has no reference
 */
export function drawnReflection(
  circuit: Circuit,
): { reflectionMagnitude: number; reflectionPhase: number } | undefined {
  if (!isSteady(circuit.load)) return undefined;
  const { v, i } = terminationPort(circuit.load, { re: 0, im: 0 });
  const gamma = portReflection(v, i, { re: requiredReference(circuit), im: 0 });
  return { reflectionMagnitude: Math.min(1, abs(gamma)), reflectionPhase: arg(gamma) };
}

function requiredReference({ referenceOhm, source }: Circuit): number {
  const reference = referenceOhm ?? (source.kind === "constant" ? source.reOhm : NaN);
  if (reference > 0) return reference;
  throw new RangeError("loadMover: referenceOhm is needed for a reflection where the source has no steady resistance");
}

function terminationOf({ re, im }: { re: number; im: number }): Termination {
  return re === Infinity ? { kind: "open" } : { kind: "constant", reOhm: Math.max(0, re), imOhm: im };
}
