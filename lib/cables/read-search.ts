/**
 * How a typed search is read: each word against the team's own vocabulary, slips mended with Fuse.js, numbers with
 * units turned into ranges. The answer is what the database looks for and what the page says it understood.
 */
import Fuse from "fuse.js";
import { searchWord } from "@/lib/cables/words";

export type SearchTerm =
  | { kind: "word"; typed: string; word: string; isPrefix: boolean; isKnown: boolean }
  | { kind: "range"; typed: string; quantity: RangeQuantity; from: number; to: number; said: string };

export type RangeQuantity = "z0Ohm" | "outerDiameterMm" | "velocityFactor" | "capacitancePfPerM";

export interface SearchReading {
  terms: SearchTerm[];
  /** what was understood, in words */
  text: string;
  /** words that were read as another: what was typed and what it was taken for */
  corrected: { typed: string; read: string }[];
}

/** The words of one team's catalogue. Build it once per state of the catalogue: the Fuse index is the costly part. */
export interface Vocabulary {
  words: ReadonlySet<string>;
  fuse: Fuse<string>;
  /** sorted, for prefixes */
  sorted: readonly string[];
  read: Map<string, string | null>;
}

/** Slips are mended only towards words of the language: codes with digits are matched as typed. */
export function vocabulary(words: Iterable<string>): Vocabulary {
  const all = new Set(words);
  const spoken = [...all].filter((word) => word.length > 2 && !/\d/.test(word));
  const fuse = new Fuse(spoken, { includeScore: true, threshold: 0.4, distance: 30, ignoreLocation: false });
  return { words: all, fuse, sorted: [...all].sort(), read: new Map() };
}

const unitWords: Record<string, RangeQuantity> = {
  ohm: "z0Ohm",
  ohms: "z0Ohm",
  mm: "outerDiameterMm",
  millimetre: "outerDiameterMm",
  millimetres: "outerDiameterMm",
  millimeter: "outerDiameterMm",
  millimeters: "outerDiameterMm",
  pf: "capacitancePfPerM",
  pfm: "capacitancePfPerM",
};
const unitFuse = new Fuse(
  Object.keys(unitWords).filter((word) => word.length > 3),
  { threshold: 0.35, distance: 20 },
);
const emptyWords = new Set([
  "a",
  "an",
  "and",
  "cable",
  "cables",
  "for",
  "in",
  "of",
  "or",
  "the",
  "with",
  "wire",
  "about",
  "diameter",
]);

/** Share of the value by which a typed figure may be missed: nominal sizes are round numbers. */
const slack: Record<RangeQuantity, number> = {
  z0Ohm: 0.05,
  outerDiameterMm: 0.1,
  velocityFactor: 0.015,
  capacitancePfPerM: 0.05,
};

function range(quantity: RangeQuantity, value: number, typed: string): SearchTerm {
  const said = {
    z0Ohm: `${value} Ω`,
    outerDiameterMm: `${value} mm across`,
    velocityFactor: `velocity factor ${value}`,
    capacitancePfPerM: `${value} pF/m`,
  }[quantity];
  return {
    kind: "range",
    typed,
    quantity,
    from: value * (1 - slack[quantity]),
    to: value * (1 + slack[quantity]),
    said,
  };
}

function unitOf(word: string, isExact: boolean): RangeQuantity | undefined {
  const bare = searchWord(word);
  if (Object.hasOwn(unitWords, bare)) return unitWords[bare];
  if (isExact || bare.length < 5 || /\d/.test(bare)) return undefined;
  const nearest = unitFuse.search(bare, { limit: 1 })[0];
  return nearest && unitWords[nearest.item];
}

/** A number without a unit is a velocity factor below 1, an impedance from 20 up, a diameter between. */
function bareNumber(value: number, typed: string): SearchTerm {
  if (value > 0 && value <= 1) return range("velocityFactor", value, typed);
  return range(value >= 20 ? "z0Ohm" : "outerDiameterMm", value, typed);
}

function hasPrefix(list: readonly string[], prefix: string): boolean {
  let low = 0;
  let high = list.length;
  while (low < high) {
    const middle = (low + high) >> 1;
    if ((list[middle] ?? "") < prefix) low = middle + 1;
    else high = middle;
  }
  return (list[low] ?? "").startsWith(prefix);
}

/** The word of the vocabulary meant by a misspelt one, or null. Remembered per vocabulary. */
function mended(word: string, known: Vocabulary): string | null {
  const remembered = known.read.get(word);
  if (remembered !== undefined) return remembered;
  const best = word.length < 3 || /\d/.test(word) ? undefined : known.fuse.search(word, { limit: 1 })[0];
  const isNear = best !== undefined && (best.score ?? 1) <= (word.length < 5 ? 0.26 : 0.4);
  const found = isNear ? best.item : null;
  if (known.read.size < 5000) known.read.set(word, found);
  return found;
}

function readWord(typed: string, known: Vocabulary, isLast: boolean, isExact: boolean): SearchTerm {
  const word = searchWord(typed);
  const as = (read: string, isPrefix: boolean, isKnown = true): SearchTerm => ({
    kind: "word",
    typed,
    word: read,
    isPrefix,
    isKnown,
  });
  if (known.words.has(word)) return as(word, isLast && !isExact);
  if (hasPrefix(known.sorted, word) && (isLast || /\d/.test(word))) return as(word, true);
  const read = isExact ? null : mended(word, known);
  return read ? as(read, false) : as(word, false, false);
}

/**
 * Reads a search.
 * @param text - as typed
 * @param known - the team's words
 * @param isExact - take every word as typed
 */
export function readSearch(text: string, known: Vocabulary, isExact = false): SearchReading {
  const parts = text
    .slice(0, 200)
    .replace(/(\d),(\d)/g, "$1.$2")
    .replace(/(^|\s)(\d+(?:\.\d+)?)\s*(Ω|\u2126|ohms?\b|mm\b|pf(?:\/m)?\b|%)/gi, "$1$2 $3")
    .split(/[\s,;]+/)
    .filter((part) => part !== "");
  const terms: SearchTerm[] = [];
  for (let i = 0; i < parts.length; i++) {
    const part = parts[i] ?? "";
    const next = parts[i + 1];
    if (/^\d+(\.\d+)?$/.test(part)) {
      const unit = next === undefined ? undefined : next === "%" ? "percent" : unitOf(next.replace("/", ""), isExact);
      if (unit) i++;
      if (unit === "percent") terms.push(range("velocityFactor", Number(part) / 100, `${part} %`));
      else terms.push(unit ? range(unit, Number(part), `${part} ${next}`) : bareNumber(Number(part), part));
    } else if (searchWord(part) !== "" && (isExact || !emptyWords.has(searchWord(part)))) {
      terms.push(readWord(part, known, i === parts.length - 1 && !/\s$/.test(text), isExact));
    }
  }
  return reading(terms);
}

function reading(terms: SearchTerm[]): SearchReading {
  const corrected = terms.flatMap((term) =>
    term.kind === "word" && term.isKnown && !term.isPrefix && searchWord(term.typed) !== term.word
      ? [{ typed: term.typed, read: term.word }]
      : [],
  );
  const text = terms.map((term) => (term.kind === "word" ? term.word : term.said)).join(", ");
  return { terms, text, corrected };
}

/**
 * The words of a reading as an FTS5 expression over the columns `team` and `words`.
 * Words are letters and digits only, so nothing in them can be syntax.
 */
export function matchExpression(teamWord: string, terms: readonly SearchTerm[]): string | null {
  const words = terms.flatMap((term) =>
    term.kind === "word" ? [`words : "${term.word}"${term.isPrefix ? "*" : ""}`] : [],
  );
  return words.length === 0 ? null : [`team : "${teamWord}"`, ...words].join(" AND ");
}
