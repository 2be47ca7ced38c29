/**
 * Numbers as decimal text with the point moved: "78.5" pF/m is 78.5e-12 F/m exactly as it is written, where multiplying
 * would leave a last digit astray. Pure.
 */

const written = /^([+-]?)(\d*)(?:\.(\d*))?(?:e([+-]?\d+))?$/i;

/** The shortest decimal text of value·10^shift that reads back, by `moved` and -shift, as the very same number. */
export function shiftedText(value: number, shift: number): string {
  const [, sign = "", whole = "", fraction = "", exponent = "0"] = written.exec(String(value)) ?? [];
  const digits = (whole + fraction).replace(/^0+/, "");
  if (digits === "") return "0";
  const point = whole.length + Number(exponent) + shift - (whole.length + fraction.length - digits.length);
  const minus = sign === "-" ? "-" : "";
  const bare = digits.replace(/0+$/, "");
  if (point > 21 || point < -6) return `${minus}${bare[0]}${bare.length > 1 ? `.${bare.slice(1)}` : ""}e${point - 1}`;
  if (point <= 0) return `${minus}0.${"0".repeat(-point)}${bare}`;
  if (point >= bare.length) return minus + bare + "0".repeat(point - bare.length);
  return `${minus}${bare.slice(0, point)}.${bare.slice(point)}`;
}

/**
 * A number written with a decimal point, its point moved.
 * @returns the number·10^shift to the last digit; NaN where the text is no number
 */
export function moved(text: string, shift: number): number {
  const [, sign, whole, fraction, exponent = "0"] = written.exec(text) ?? [];
  if (sign === undefined || !(whole || fraction)) return NaN;
  return Number(`${sign}${whole || "0"}.${fraction || "0"}e${Number(exponent) + shift}`);
}
