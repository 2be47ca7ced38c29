import { expect } from "vitest";

/** A value from outside, with what it may be off by: |got − value| ≤ abs_tolerance + rel_tolerance·|value|. */
export interface Expected {
  value: Value;
  rel_tolerance: number;
  abs_tolerance: number;
}

type Value = number | readonly Value[];
/** What the engine answers with: plain or typed arrays, nested as the expected value is. */
type Got = number | ArrayLike<number> | readonly Got[];

/**
 * Asserts that a result agrees with an expected value, element by element where both are lists.
 * @param where - named in the failure; the index is added while descending
 */
export function closeTo(got: Got, expected: Expected, where = "value"): void {
  const { value, rel_tolerance, abs_tolerance } = expected;
  if (typeof value === "number") {
    const allowed = abs_tolerance + rel_tolerance * Math.abs(value);
    const error = Math.abs((got as number) - value);
    expect(error <= allowed, `${where}: got ${got}, expected ${value} ± ${allowed}`).toBe(true);
    return;
  }
  const list = got as ArrayLike<Got>;
  expect(list.length, `${where}: number of values`).toBe(value.length);
  value.forEach((each, index) =>
    closeTo(list[index]!, { value: each, rel_tolerance, abs_tolerance }, `${where}[${index}]`),
  );
}
