/** Numbers too small to write out in full. Pure. */

/** @returns 1.2e-30 with two significant figures as "1.2×10⁻³⁰"; `value` is finite */
export function withPowerOfTen(value: number, significant: number): string {
  const [mantissa, power = "0"] = Math.abs(value)
    .toExponential(Math.max(0, significant - 1))
    .split("e");
  const raised = power.replace(/./g, (sign) => (sign === "-" ? "⁻" : ("⁰¹²³⁴⁵⁶⁷⁸⁹"[Number(sign)] ?? "")));
  return `${value < 0 ? "\u2212" : ""}${mantissa}×10${raised}`;
}
