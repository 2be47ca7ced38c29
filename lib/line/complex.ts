/** Complex arithmetic on plain immutable pairs. Convention of the whole engine: e^{+jωt}. */
export interface Complex {
  readonly re: number;
  readonly im: number;
}

export const ZERO: Complex = { re: 0, im: 0 };
export const ONE: Complex = { re: 1, im: 0 };

export function complex(re: number, im = 0): Complex {
  return { re, im };
}

/** The number of the given magnitude and angle in radians. */
export function polar(magnitude: number, angle: number): Complex {
  return { re: magnitude * Math.cos(angle), im: magnitude * Math.sin(angle) };
}

export function add(a: Complex, b: Complex): Complex {
  return { re: a.re + b.re, im: a.im + b.im };
}

export function subtract(a: Complex, b: Complex): Complex {
  return { re: a.re - b.re, im: a.im - b.im };
}

export function multiply(a: Complex, b: Complex): Complex {
  return { re: a.re * b.re - a.im * b.im, im: a.re * b.im + a.im * b.re };
}

/** a / b without intermediate overflow. Source: R. L. Smith, Algorithm 116, Comm. ACM 5 (1962) 435. */
export function divide(a: Complex, b: Complex): Complex {
  if (Math.abs(b.re) >= Math.abs(b.im)) {
    const r = b.im / b.re;
    const d = b.re + b.im * r;
    return { re: (a.re + a.im * r) / d, im: (a.im - a.re * r) / d };
  }
  const r = b.re / b.im;
  const d = b.re * r + b.im;
  return { re: (a.re * r + a.im) / d, im: (a.im * r - a.re) / d };
}

export function scale(a: Complex, factor: number): Complex {
  return { re: a.re * factor, im: a.im * factor };
}

export function negate(a: Complex): Complex {
  return { re: -a.re, im: -a.im };
}

export function conjugate(a: Complex): Complex {
  return { re: a.re, im: -a.im };
}

export function reciprocal(a: Complex): Complex {
  return divide(ONE, a);
}

/** |a|, without overflow or underflow. */
export function abs(a: Complex): number {
  return Math.hypot(a.re, a.im);
}

/** |a|². */
export function abs2(a: Complex): number {
  return a.re * a.re + a.im * a.im;
}

/** Angle in radians, −π to π. */
export function arg(a: Complex): number {
  return Math.atan2(a.im, a.re);
}

/** Principal square root: real part at least 0. The larger component is found by addition only, so nothing cancels. */
export function sqrt(a: Complex): Complex {
  const magnitude = abs(a);
  if (magnitude === 0) return ZERO;
  const larger = Math.sqrt((magnitude + Math.abs(a.re)) / 2);
  const smaller = a.im / (2 * larger);
  if (a.re >= 0) return { re: larger, im: smaller };
  return { re: Math.abs(smaller), im: a.im < 0 ? -larger : larger };
}

export function exp(a: Complex): Complex {
  return polar(Math.exp(a.re), a.im);
}

/** Principal logarithm: imaginary part −π to π. */
export function log(a: Complex): Complex {
  return { re: Math.log(abs(a)), im: arg(a) };
}

/** tanh, finite for any real part (it tends to ±1). */
export function tanh(a: Complex): Complex {
  const sign = a.re < 0 ? -1 : 1;
  const decay = Math.exp(-2 * Math.abs(a.re));
  const e = polar(decay, -2 * sign * a.im);
  const t = divide({ re: 1 - e.re, im: -e.im }, { re: 1 + e.re, im: e.im });
  return { re: sign * t.re, im: sign * t.im };
}

export function isFinite(a: Complex): boolean {
  return Number.isFinite(a.re) && Number.isFinite(a.im);
}
