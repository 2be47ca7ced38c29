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
  type Reader,
  type Texts,
  type Values,
} from "@/lib/calculators/input";
import type { CalculatorPath } from "@/lib/calculators/places";
import { lineOf, type CableLine } from "@/lib/cables/line";
import type { Cable } from "@/lib/cables/schema";
import { call } from "@/lib/http/call";

type Entries = ReadonlyMap<string, CableLine>;

/** What the page hands over: the address as read, and the cable it means. */
export interface OpenedCalculator<I extends Inputs> extends Opened {
  values: Values<I>;
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
  /** of the texts as far as they can be read, whether or not they give a result */
  attempted: Values<I>;
  /** null only while nothing has given a result yet */
  result: R | null;
  set: (name: keyof I & string, text: string) => void;
  /** the inputs asked for just now, in order */
  shown: (keyof I & string)[];
  /** entries of the catalogue loaded so far */
  entries: Entries;
  /** fetches an entry and takes it; refuses by throwing */
  chooseCable: (cableId: string) => Promise<void>;
  /** null until it has been fetched */
  reader: Reader | null;
  /** what of the address could not be used */
  notes: string[];
}

interface State<I extends Inputs> {
  texts: Texts;
  attempted: Values<I>;
  /** the last texts that gave a result, and their values */
  good: Texts;
  values: Values<I>;
  entries: Entries;
}

const fetchReader = () => import("@/lib/format/read-quantity");

/** The reader of quantities: not with the page, but as soon as the page has woken up. */
function useReader(): Reader | null {
  const [reader, setReader] = useState<Reader | null>(null);
  useEffect(() => void fetchReader().then((loaded) => setReader(loaded)), []);
  return reader;
}

/** The state of a calculator: texts as typed, the result of the last that had one, and the address that follows it. */
export function useCalculator<I extends Inputs, R>(
  { path, inputs, compute }: Calculation<I, R>,
  opened: OpenedCalculator<I>,
): Calculator<I, R> {
  const { texts: first, values: firstValues, line, notes } = opened;
  const [state, setState] = useState<State<I>>(() => ({
    ...{ texts: first, attempted: firstValues, good: first, values: firstValues },
    entries: new Map(line ? [[line.cableId, line]] : []),
  }));
  const reader = useReader();
  const { texts, attempted, good, values, entries } = state;
  const attempt = compute(attempted, entries);
  const outcome = attempt.ok ? attempt : compute(values, entries);
  const shown = shownInputs(inputs, texts);

  const address = calculatorAddress(path, inputs, good);
  // The address follows what is typed without a visit to the server for every letter.
  useEffect(() => window.history.replaceState(null, "", address), [address]);

  /** What the texts have come to, once they can be read. */
  function settle(before: State<I>, by: Reader): State<I> {
    const readable = readableTexts(inputs, before.texts, before.good, by);
    const tried = valuesOf(inputs, readable, by);
    const isGood = compute(tried, before.entries).ok;
    return { ...before, attempted: tried, ...(isGood && { good: readable, values: tried }) };
  }
  function take(name: string, text: string, entry?: CableLine) {
    setState((before) => {
      const known = entry ? new Map(before.entries).set(entry.cableId, entry) : before.entries;
      const next = { ...before, entries: known, texts: { ...before.texts, [name]: text } };
      return reader ? settle(next, reader) : next;
    });
    // Typed before the reader was there: it is read as soon as that is.
    if (!reader) void fetchReader().then((loaded) => setState((before) => settle(before, loaded)));
  }
  async function chooseCable(cableId: string) {
    take("cable", cableId, entries.get(cableId) ?? lineOf(await call<Cable>(`/cables/${encodeURIComponent(cableId)}`)));
  }
  const problems = { ...(attempt.ok ? {} : attempt.faults), ...(reader && unread(inputs, texts, shown, reader)) };
  const result = outcome.ok ? outcome.result : null;
  return { inputs, texts, problems, values, attempted, result, set: take, shown, entries, chooseCable, reader, notes };
}

function unread(inputs: Inputs, texts: Texts, shown: readonly string[], reader: Reader): Texts {
  const found: Texts = {};
  for (const name of shown) {
    const input = inputs[name];
    const read = input && readInput(input, texts[name] ?? "", reader);
    if (read && !read.ok) found[name] = read.message;
  }
  return found;
}
