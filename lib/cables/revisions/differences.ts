/** What differs between two revisions of an entry, field by field. Pure. */
import { compareFigures, differencePercent } from "@/lib/cables/compare";
import type { Build, Cable, Figure } from "@/lib/cables/schema";

export type Compared = Pick<Cable, "name" | "family" | "model" | "construction" | "build" | "figures" | "limits">;
type Value = number | string | null;

export interface Difference {
  /** unique: "construction.dielectricMm", "figure.z0Ohm.nominal", "limits.minBendMm", "model.cFPerM", "derived.z0Ohm" */
  field: string;
  /** whether somebody gave it; else it is worked out from what was given */
  isGiven: boolean;
  /** SI or the unit of the field's name; null: not given */
  before: Value;
  after: Value;
  /** as its source gives it, where there is such a text */
  beforeTyped: string | null;
  afterTyped: string | null;
  /** null where one is missing, is not a number, or the former is 0 */
  percent: number | null;
  source: string | null;
  /** of a figure: the frequency it is meant at, hertz */
  atHz: number | null;
}

const text = (value: unknown): Value => {
  if (value === undefined || value === null) return null;
  return typeof value === "number" || typeof value === "string" ? value : JSON.stringify(value);
};

function difference(field: string, isGiven: boolean, was: unknown, is: unknown): Difference {
  const [before, after] = [text(was), text(is)];
  const areNumbers = typeof before === "number" && typeof after === "number";
  return {
    ...{ field, isGiven, before, after, beforeTyped: null, afterTyped: null, source: null, atHz: null },
    percent: areNumbers ? differencePercent(after, before) : null,
  };
}

type Fields = Record<string, unknown>;

/** Every field of two records, nested ones with dotted names. */
function fieldsOf(prefix: string, before: Fields, after: Fields): Difference[] {
  const names = [...new Set([...Object.keys(before), ...Object.keys(after)])];
  return names.map((name) => difference(`${prefix}.${name}`, true, before[name], after[name]));
}

/** Figures are the same figure where quantity, kind and frequencies are; a second one of the same is counted. */
function keyed(figures: readonly Figure[]): Map<string, Figure> {
  const map = new Map<string, Figure>();
  for (const figure of figures) {
    const key = [figure.quantity, figure.kind, figure.fromHz ?? "", figure.toHz ?? ""].join(".");
    let free = key;
    for (let n = 2; map.has(free); n++) free = `${key}.${n}`;
    map.set(free, figure);
  }
  return map;
}

function figureDifferences(before: readonly Figure[], after: readonly Figure[]): Difference[] {
  const [was, is] = [keyed(before), keyed(after)];
  return [...new Set([...was.keys(), ...is.keys()])].map((key) => {
    const [former, latter] = [was.get(key), is.get(key)];
    const one = latter ?? former;
    const atHz = one?.fromHz !== undefined && one.fromHz === (one.toHz ?? one.fromHz) ? one.fromHz : null;
    return {
      ...difference(`figure.${key}`, true, former?.valueSi, latter?.valueSi),
      ...{ beforeTyped: former?.asTyped ?? null, afterTyped: latter?.asTyped ?? null, atHz },
      source: latter?.source ?? null,
    };
  });
}

const words = (build: Build | null): Fields => ({ ...build });

/** What the figures of both give at a frequency, for the part of the table that is worked out. */
function derived(before: Compared, after: Compared, lossAtHz: number): Difference[] {
  const [was, is] = [compareFigures(before, lossAtHz), compareFigures(after, lossAtHz)];
  const names = ["z0Ohm", "velocityFactor", "capacitanceFPerM", "loopResistanceOhmPerM", "lossDbPer100m"] as const;
  return names.map((name) => difference(`derived.${name}`, false, was[name], is[name]));
}

/** Two numbers that print alike to twelve digits are the same: what was worked out twice differs in the last. */
function isSame({ before, after, beforeTyped, afterTyped }: Difference): boolean {
  if (typeof before !== "number" || typeof after !== "number") return before === after;
  return before.toPrecision(12) === after.toPrecision(12) && beforeTyped === afterTyped;
}

/** Every field of both revisions, in the order of an entry; `isSame` tells those that did not change. */
export function fieldsOfBoth(
  before: Compared,
  after: Compared,
  lossAtHz = 100e6,
): (Difference & { isSame: boolean })[] {
  const own = (cable: Compared): Fields => ({ name: cable.name, family: cable.family });
  const all = [
    ...fieldsOf("entry", own(before), own(after)),
    ...fieldsOf("construction", { ...before.construction }, { ...after.construction }),
    ...fieldsOf("build", words(before.build), words(after.build)),
    ...figureDifferences(before.figures, after.figures),
    ...fieldsOf("limits", { ...before.limits }, { ...after.limits }),
    ...fieldsOf("model", { ...before.model }, { ...after.model }),
    ...derived(before, after, lossAtHz),
  ];
  return all.map((each) => ({ ...each, isSame: isSame(each) }));
}

/** The fields that changed. */
export function differences(before: Compared, after: Compared, lossAtHz?: number): Difference[] {
  return fieldsOfBoth(before, after, lossAtHz).filter((each) => !each.isSame);
}

/** How many fields somebody has changed: the model follows from the others, unless it alone was changed. */
export function countGiven(changed: readonly Difference[]): number {
  const given = changed.filter(({ isGiven }) => isGiven);
  return given.filter(({ field }) => !field.startsWith("model.")).length || given.length;
}
