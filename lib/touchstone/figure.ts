/** Figures in text, exact and fast: a file has millions of them. */

const isDigit = (code: number) => code >= 48 && code <= 57;

/** 10^0 to 10^22, all exact in double precision. */
const powersOfTen = Float64Array.from({ length: 23 }, (_, n) => Number(`1e${n}`));

/** What a stretch of text says as a number; `figure` fills it in. */
export interface Figure {
  value: number;
  fault: "notANumber" | "notFinite" | undefined;
}

const slow = /^[+-]?(\d+\.?\d*|\.\d+)([eE][+-]?\d+)?$/;
const endless = /^[+-]?(inf|infinity|nan)$/i;

/**
 * Reads text[from, to) as a decimal number, correctly rounded. A mantissa of up to 15 digits with a power of ten of at
 * most 22 is one exact operation; anything else goes the general way.
 * Source: W. D. Clinger, How to read floating point numbers accurately, PLDI 1990, the fast path.
 */
export function readFigure(text: string, from: number, to: number, into: Figure): void {
  let at = from;
  const sign = text.charCodeAt(at);
  if (sign === 43 || sign === 45) at++;
  let mantissa = 0;
  let digits = 0;
  let scale = 0;
  let code = at < to ? text.charCodeAt(at) : 0;
  for (; isDigit(code); code = ++at < to ? text.charCodeAt(at) : 0, digits++) mantissa = mantissa * 10 + code - 48;
  if (code === 46) {
    code = ++at < to ? text.charCodeAt(at) : 0;
    for (; isDigit(code); code = ++at < to ? text.charCodeAt(at) : 0, digits++, scale--)
      mantissa = mantissa * 10 + code - 48;
  }
  if (at < to && digits > 0 && (code === 69 || code === 101)) {
    const power = readPower(text, at + 1, to);
    if (Number.isNaN(power)) return readSlowly(text.slice(from, to), into);
    scale += power;
    at = to;
  }
  if (at < to || digits === 0 || digits > 15 || scale > 22 || scale < -22)
    return readSlowly(text.slice(from, to), into);
  const value = scale < 0 ? mantissa / powersOfTen[-scale]! : mantissa * powersOfTen[scale]!;
  into.value = sign === 45 ? -value : value;
  into.fault = undefined;
}

/** A whole power of at most three digits; NaN for anything else. */
function readPower(text: string, from: number, to: number): number {
  const sign = text.charCodeAt(from);
  const start = sign === 43 || sign === 45 ? from + 1 : from;
  if (start >= to || to - start > 3) return NaN;
  let power = 0;
  for (let at = start; at < to; at++) {
    const code = text.charCodeAt(at);
    if (!isDigit(code)) return NaN;
    power = power * 10 + code - 48;
  }
  return sign === 45 ? -power : power;
}

function readSlowly(text: string, into: Figure): void {
  into.value = slow.test(text) ? Number(text) : NaN;
  if (endless.test(text) || Math.abs(into.value) === Infinity) into.fault = "notFinite";
  else into.fault = Number.isNaN(into.value) ? "notANumber" : undefined;
}
