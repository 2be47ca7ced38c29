/** What the source's e.m.f. does: edges, pulses, bit patterns, in time and as a function of s. */
import type { LaplaceGrid } from "@/lib/line/time/laplace-grid";

/** `sineSquared` has a raised cosine for a slope; `raisedCosine` is one itself. */
export type EdgeShape = "sineSquared" | "raisedCosine";

interface Edged {
  amplitudeV: number;
  /** full 0–100 % time of the edge, second, above 0 */
  riseS: number;
  /** default sineSquared */
  edge?: EdgeShape;
}

/** `widthS` runs from the start of the rise to the start of the fall; a bit starts with its edge, and the last one stays. */
export type Drive =
  | ({ kind: "step" } & Edged)
  | ({ kind: "pulse"; widthS: number } & Edged)
  | ({ kind: "bits"; bits: string; bitS: number } & Edged);

/** An edge: when it starts, second, and how far the e.m.f. goes, volt. */
export interface Transition {
  atS: number;
  jumpV: number;
}

/** Every edge of a drive in order. Before the first bit the e.m.f. is 0. */
export function transitions(drive: Drive): Transition[] {
  const { amplitudeV } = drive;
  if (drive.kind === "step") return [{ atS: 0, jumpV: amplitudeV }];
  if (drive.kind === "pulse")
    return [
      { atS: 0, jumpV: amplitudeV },
      { atS: drive.widthS, jumpV: -amplitudeV },
    ];
  const levels = [...drive.bits].map(Number);
  return levels.flatMap((level, n) => {
    const jump = level - (levels[n - 1] ?? 0);
    return jump === 0 ? [] : [{ atS: n * drive.bitS, jumpV: jump * amplitudeV }];
  });
}

/** E.m.f. per volt at a part of the edge's time; 0 before it, 1 after it. */
export function edgeAt(shape: EdgeShape, part: number): number {
  if (!(part > 0)) return 0;
  if (part >= 1) return 1;
  if (shape === "raisedCosine") return (1 - Math.cos(Math.PI * part)) / 2;
  return part - Math.sin(2 * Math.PI * part) / (2 * Math.PI);
}

/** Part of the edge's time at which it has come to a fraction, 0 to 1, of its height. */
export function edgePart(shape: EdgeShape, fraction: number): number {
  let [low, high] = [0, 1];
  for (let n = 0; n < 60; n++) {
    const middle = (low + high) / 2;
    if (edgeAt(shape, middle) < fraction) low = middle;
    else high = middle;
  }
  return (low + high) / 2;
}

/** Source e.m.f. at a time, volt. */
export function emfAt(drive: Drive, timeS: number): number {
  const shape = drive.edge ?? "sineSquared";
  return transitions(drive).reduce(
    (sum, { atS, jumpV }) => sum + jumpV * edgeAt(shape, (timeS - atS) / drive.riseS),
    0,
  );
}

/** Where the e.m.f. ends up, volt. */
export function finalEmf(drive: Drive): number {
  return transitions(drive).reduce((sum, { jumpV }) => sum + jumpV, 0);
}

/** @throws RangeError when a time or the pattern is impossible */
export function requireDrive(where: string, drive: Drive): void {
  const positive = (name: string, value: number) => {
    if (!(value > 0 && value < Infinity)) throw new RangeError(`${where}: ${name} must be positive, got ${value}`);
  };
  if (!Number.isFinite(drive.amplitudeV))
    throw new RangeError(`${where}: amplitudeV must be finite, got ${drive.amplitudeV}`);
  positive("riseS", drive.riseS);
  if (drive.kind === "pulse") positive("widthS", drive.widthS);
  if (drive.kind !== "bits") return;
  positive("bitS", drive.bitS);
  if (!/^[01]+$/.test(drive.bits)) throw new RangeError(`${where}: bits must be 0s and 1s, got ${drive.bits}`);
}

/** The drive's Laplace transform over a grid, volt second. */
export function driveSpectrum(drive: Drive, grid: LaplaceGrid): { re: Float64Array; im: Float64Array } {
  const edge = edgeSpectrum(drive.edge ?? "sineSquared", drive.riseS, grid);
  const { everyS, jumps } = evenJumps(drive);
  if (drive.kind === "step") return scaled(edge, drive.amplitudeV);
  const later = delay(grid, everyS);
  for (let k = 0; k < grid.count; k++) {
    const stepRe = later.re[k]!;
    const stepIm = later.im[k]!;
    // Horner: Σ jump·e^{−s·n·every}, last first
    let re = 0;
    let im = 0;
    for (let n = jumps.length - 1; n >= 0; n--) {
      const nextRe = re * stepRe - im * stepIm + jumps[n]!;
      im = re * stepIm + im * stepRe;
      re = nextRe;
    }
    const edgeRe = edge.re[k]!;
    edge.re[k] = edgeRe * re - edge.im[k]! * im;
    edge.im[k] = edgeRe * im + edge.im[k]! * re;
  }
  return edge;
}

function scaled(of: { re: Float64Array; im: Float64Array }, factor: number): { re: Float64Array; im: Float64Array } {
  for (let k = 0; k < of.re.length; k++) {
    of.re[k]! *= factor;
    of.im[k]! *= factor;
  }
  return of;
}

/** How many places of a grid are turned on from one that was worked out, so that rounding stays below 10⁻¹⁴. */
const turnedOn = 64;

/** e^{−s·τ} over a grid, whose places are evenly spaced: each is the one before turned by the same angle. */
function delay({ count, damping, omega }: LaplaceGrid, tau: number): { re: Float64Array; im: Float64Array } {
  const re = new Float64Array(count);
  const im = new Float64Array(count);
  const decay = Math.exp(-damping * tau);
  const apart = (count > 1 ? omega[1]! - omega[0]! : 0) * tau;
  const cos = Math.cos(apart);
  const sin = -Math.sin(apart);
  for (let k = 0; k < count; k++) {
    if (k % turnedOn === 0) {
      re[k] = decay * Math.cos(omega[k]! * tau);
      im[k] = -decay * Math.sin(omega[k]! * tau);
      continue;
    }
    re[k] = re[k - 1]! * cos - im[k - 1]! * sin;
    im[k] = re[k - 1]! * sin + im[k - 1]! * cos;
  }
  return { re, im };
}

/** The jumps of a drive at even distances. */
function evenJumps(drive: Drive): { everyS: number; jumps: number[] } {
  if (drive.kind === "step") return { everyS: 0, jumps: [drive.amplitudeV] };
  if (drive.kind === "pulse") return { everyS: drive.widthS, jumps: [drive.amplitudeV, -drive.amplitudeV] };
  const levels = [...drive.bits].map(Number);
  return {
    everyS: drive.bitS,
    jumps: levels.map((level, n) => (level - (levels[n - 1] ?? 0)) * drive.amplitudeV),
  };
}

/**
 * One edge of 1 V: `sineSquared` Ω²(1 − e^{−s·tr})/(s²(s² + Ω²)·tr) with Ω = 2π/tr, `raisedCosine`
 * Ω²(1 + e^{−s·tr})/(2s(s² + Ω²)) with Ω = π/tr.
 */
function edgeSpectrum(shape: EdgeShape, riseS: number, grid: LaplaceGrid) {
  const { damping, omega, count } = grid;
  const sine = shape === "sineSquared";
  const corner = ((sine ? 2 : 1) * Math.PI) / riseS;
  const square = corner * corner;
  const factor = sine ? -square / riseS : square / 2;
  const { re, im } = delay(grid, riseS);
  for (let k = 0; k < count; k++) {
    const w = omega[k]!;
    const squareRe = damping * damping - w * w;
    const squareIm = 2 * damping * w;
    // denominator: s²(s² + Ω²) or s(s² + Ω²)
    const byRe = sine ? squareRe : damping;
    const byIm = sine ? squareIm : w;
    const downRe = byRe * (squareRe + square) - byIm * squareIm;
    const downIm = byRe * squareIm + byIm * (squareRe + square);
    const upRe = factor * (re[k]! + (sine ? -1 : 1));
    const upIm = factor * im[k]!;
    const perSize = 1 / (downRe * downRe + downIm * downIm);
    re[k] = (upRe * downRe + upIm * downIm) * perSize;
    im[k] = (upIm * downRe - upRe * downIm) * perSize;
  }
  return { re, im };
}
