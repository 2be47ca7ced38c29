/** Published values in tests/fixtures/line, with their sources, and how to compare with them. */
import { readFileSync } from "node:fs";
import path from "node:path";
import { expect } from "vitest";
import { abs, arg, complex, polar, type Complex } from "@/lib/line/complex";

/** A complex number as prints give it. */
export type Printed = { re: number; im: number } | { mag: number; deg?: number };
type Value = string | number | number[] | Printed | null | Record<string, number>;

export interface PublishedCheck {
  id: string;
  topic: string;
  source: string;
  inputs: Record<string, Value>;
  expected: Record<string, Value>;
  tolerance: { rel?: number; abs?: number };
  note: string;
}

/** The checks whose id or topic passes; `fixture` without ".json". */
export function published(
  choose: (id: string, topic: string) => boolean,
  fixture = "published-lines",
): PublishedCheck[] {
  const file = path.resolve(import.meta.dirname, "../fixtures/line", `${fixture}.json`);
  const { checks } = JSON.parse(readFileSync(file, "utf8")) as { checks: PublishedCheck[] };
  return checks.filter(({ id, topic }) => choose(id, topic));
}

/** An input that is a number. */
export function number(values: Record<string, Value>, key: string): number {
  const value = values[key];
  if (typeof value !== "number") throw new Error(`no number ${key}`);
  return value;
}

/** An input that is complex, real numbers included. */
export function complexOf(value: Value | undefined): Complex {
  if (typeof value === "number") return complex(value);
  const printed = value as Printed;
  return "re" in printed ? printed : polar(printed.mag, ((printed.deg ?? 0) * Math.PI) / 180);
}

type Got = number | Complex | ArrayLike<number>;

/** Asserts that every expected value has been computed and agrees within the check's own tolerance. */
export function agrees({ expected, tolerance }: PublishedCheck, got: Record<string, Got>): void {
  expect(Object.keys(got).sort()).toEqual(Object.keys(expected).sort());
  for (const [key, value] of Object.entries(expected)) within(got[key]!, value, tolerance, key);
}

function within(got: Got, value: Value, tolerance: PublishedCheck["tolerance"], key: string): void {
  if (Array.isArray(value))
    return value.forEach((each, k) => near((got as ArrayLike<number>)[k]!, each, each, tolerance, `${key}[${k}]`));
  if (typeof value === "number") return near(got as number, value, value, tolerance, key);
  const complexGot = got as Complex;
  const printed = value as Printed;
  if ("re" in printed) {
    // one part of a complex number may be a small difference: it is held against the whole
    near(complexGot.re, printed.re, abs(printed), tolerance, `${key}.re`);
    return near(complexGot.im, printed.im, abs(printed), tolerance, `${key}.im`);
  }
  near(abs(complexGot), printed.mag, printed.mag, tolerance, `${key}.mag`);
  if (printed.deg !== undefined)
    near((arg(complexGot) * 180) / Math.PI, printed.deg, printed.deg, tolerance, `${key}.deg`);
}

function near(
  got: number,
  value: number,
  size: number,
  { rel = 0, abs: absolute = 0 }: PublishedCheck["tolerance"],
  key: string,
): void {
  const allowed = absolute + rel * Math.abs(size);
  expect(Math.abs(got - value) <= allowed, `${key}: got ${got}, published ${value} ± ${allowed}`).toBe(true);
}
