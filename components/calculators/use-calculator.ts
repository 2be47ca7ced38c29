"use client";

import { useEffect, useState } from "react";
import { calculatorAddress, type Opened } from "@/lib/calculators/address";
import {
  readableTexts,
  readInput,
  shownInputs,
  valuesOf,
  type Inputs,
  type Outcome,
  type Texts,
  type Values,
} from "@/lib/calculators/input";
import type { CalculatorPath } from "@/lib/calculators/places";
import { lineOf, type CableLine } from "@/lib/cables/line";
import type { Cable } from "@/lib/cables/schema";
import { call } from "@/lib/http/call";

type Entries = ReadonlyMap<string, CableLine>;

/** What the page hands over: the address as read, and the cable it means. */
export interface OpenedCalculator extends Opened {
  line: CableLine | null;
}

/** What there is to compute, apart from any screen. */
interface Calculation<I extends Inputs, R> {
  path: CalculatorPath;
  inputs: I;
  compute: (values: Values<I>, entries: Entries) => Outcome<R>;
}

export interface Calculator<I extends Inputs = Inputs, R = unknown> {
  inputs: I;
  /** as they stand in the fields */
  texts: Texts;
  /** by input: what is wrong with it, in a sentence */
  problems: Texts;
  /** of the last texts that gave a result; `result` is theirs */
  values: Values<I>;
  /** null only while nothing has given a result yet */
  result: R | null;
  set: (name: keyof I & string, text: string) => void;
  /** the inputs asked for just now, in order */
  shown: (keyof I & string)[];
  /** entries of the catalogue loaded so far */
  entries: Entries;
  /** fetches an entry and takes it; refuses by throwing */
  chooseCable: (cableId: string) => Promise<void>;
  /** what of the address could not be used */
  notes: string[];
}

interface State {
  texts: Texts;
  /** the last that gave a result */
  good: Texts;
  entries: Entries;
}

/** The state of a calculator: texts as typed, the result of the last that had one, and the address that follows it. */
export function useCalculator<I extends Inputs, R>(
  { path, inputs, compute }: Calculation<I, R>,
  opened: OpenedCalculator,
): Calculator<I, R> {
  const [state, setState] = useState<State>(() => ({
    texts: opened.texts,
    good: opened.texts,
    entries: new Map(opened.line ? [[opened.line.cableId, opened.line]] : []),
  }));
  const { texts, good, entries } = state;
  const outcomeOf = (from: Texts, known: Entries) => compute(valuesOf(inputs, from), known);
  const attempt = outcomeOf(readableTexts(inputs, texts, good), entries);
  const outcome = attempt.ok ? attempt : outcomeOf(good, entries);
  const shown = shownInputs(inputs, texts);

  const address = calculatorAddress(path, inputs, good);
  // The address follows what is typed without a visit to the server for every letter.
  useEffect(() => window.history.replaceState(null, "", address), [address]);

  function take(name: string, text: string, line?: CableLine) {
    setState((before) => {
      const known = line ? new Map(before.entries).set(line.cableId, line) : before.entries;
      const next = { ...before.texts, [name]: text };
      const readable = readableTexts(inputs, next, before.good);
      return { texts: next, entries: known, good: outcomeOf(readable, known).ok ? readable : before.good };
    });
  }
  async function chooseCable(cableId: string) {
    const line = entries.get(cableId) ?? lineOf(await call<Cable>(`/cables/${encodeURIComponent(cableId)}`));
    take("cable", cableId, line);
  }
  return {
    inputs,
    texts,
    problems: { ...(attempt.ok ? {} : attempt.faults), ...unread(inputs, texts, shown) },
    values: valuesOf(inputs, good),
    result: outcome.ok ? outcome.result : null,
    set: take,
    shown,
    entries,
    chooseCable,
    notes: opened.notes,
  };
}

function unread(inputs: Inputs, texts: Texts, shown: readonly string[]): Texts {
  const found: Texts = {};
  for (const name of shown) {
    const input = inputs[name];
    const read = input && readInput(input, texts[name] ?? "");
    if (read && !read.ok) found[name] = read.message;
  }
  return found;
}
