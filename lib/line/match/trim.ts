import type { Element } from "@/lib/line/element";
import type { DesignPoint } from "@/lib/line/match/design-point";
import { reflectionOf } from "@/lib/line/match/response";
import { knownRange } from "@/lib/line/match/seen-load";
import { figure, lengthText } from "@/lib/line/match/wording";

/** Fraction of the design frequency over which the reflection's slope is taken. */
const beside = 1e-5;

/**
 * How the best frequency moves when a length is trimmed, hertz per metre taken off, to first order: with Γ = 0 at the
 * design frequency, |Γf·δf + Γl·δl| is least at δf = −Re(Γf*·Γl)/|Γf|²·δl.
 * @param build - the network with its trimmed length, metre, more than 0
 * @returns undefined where the reflection does not depend on frequency
 */
function trimSlope(
  { request, seen }: DesignPoint,
  build: (length: number) => Element[],
  length: number,
): number | undefined {
  const { designHz } = request;
  const ends = { ...request, seen };
  const [df, dl] = [beside * designHz, 1e-4 * length];
  const up = reflectionOf(build(length), ends, designHz + df);
  const down = reflectionOf(build(length), ends, designHz - df);
  const long = reflectionOf(build(length + dl), ends, designHz);
  const short = reflectionOf(build(length - dl), ends, designHz);
  const byF = { re: (up.re - down.re) / (2 * df), im: (up.im - down.im) / (2 * df) };
  const byL = { re: (long.re - short.re) / (2 * dl), im: (long.im - short.im) / (2 * dl) };
  const size = byF.re * byF.re + byF.im * byF.im;
  const slope = (byF.re * byL.re + byF.im * byL.im) / size;
  return Number.isFinite(slope) ? slope : undefined;
}

/**
 * `trimSlope` where it can be told: of a length that is there, with the load known beside the design frequency.
 * @returns hertz per metre taken off; undefined where it cannot be told, or nothing moves
 */
export function trimPerMetre(
  point: DesignPoint,
  build: (length: number) => Element[],
  length: number,
): number | undefined {
  const { knownHz } = knownRange(point.request);
  const { designHz } = point.request;
  if (length === 0 || designHz * (1 - beside) < knownHz[0] || designHz * (1 + beside) > knownHz[1]) return undefined;
  const slope = trimSlope(point, build, length);
  return slope === 0 ? undefined : slope;
}

/** The note that says which way to trim; none where it cannot be told. */
export function trimNotes(
  point: DesignPoint,
  what: string,
  build: (length: number) => Element[],
  length: number,
): string[] {
  const slope = trimPerMetre(point, build, length);
  if (slope === undefined) return [];
  const off = length < 0.5 ? 0.001 : 0.01;
  const moved = figure(Math.abs(slope) * off, "Hz");
  return [`${lengthText(off)} off the ${what} moves the best frequency ${slope > 0 ? "up" : "down"} by ${moved}.`];
}
