"use client";

import { useEffect, useState } from "react";
import { calculatorAddress, type Opened } from "@/lib/calculators/address";
import { readInput, shownInputs, valuesOf, type Inputs, type Texts, type Values } from "@/lib/calculators/input";
import type { CalculatorPath } from "@/lib/calculators/places";
import { lineOf, type CableLine } from "@/lib/cables/line";
import type { Cable } from "@/lib/cables/schema";
import { call } from "@/lib/http/call";

/** What the page hands over: the address as read, and the cable it means. */
export interface OpenedCalculator extends Opened {
  line: CableLine | null;
}

export interface Calculator<I extends Inputs = Inputs> {
  inputs: I;
  /** as they stand in the fields */
  texts: Texts;
  /** by input: what cannot be read, in a sentence */
  unread: Texts;
  /** of the last texts that could all be read */
  values: Values<I>;
  set: (name: keyof I & string, text: string) => void;
  /** the inputs asked for just now, in order */
  shown: (keyof I & string)[];
  /** entries of the catalogue loaded so far */
  entries: ReadonlyMap<string, CableLine>;
  /** fetches an entry and takes it; refuses by throwing */
  chooseCable: (cableId: string) => Promise<void>;
  /** what of the address could not be used */
  notes: string[];
  /** this state's address, without the host */
  address: string;
}

/** The state of a calculator: texts as typed, values as last read, and the address that follows them. */
export function useCalculator<I extends Inputs>(
  path: CalculatorPath,
  inputs: I,
  opened: OpenedCalculator,
): Calculator<I> {
  const [texts, setTexts] = useState(opened.texts);
  const [read, setRead] = useState(opened.texts);
  const [entries, setEntries] = useState<ReadonlyMap<string, CableLine>>(
    () => new Map(opened.line ? [[opened.line.cableId, opened.line]] : []),
  );
  const shown = shownInputs(inputs, texts);
  const unread: Texts = {};
  for (const name of shown) {
    const input = inputs[name];
    const result = input && readInput(input, texts[name] ?? "");
    if (result && !result.ok) unread[name] = result.message;
  }
  const address = calculatorAddress(path, inputs, read);
  // The address follows what is typed without a visit to the server for every letter.
  useEffect(() => window.history.replaceState(null, "", address), [address]);

  function set(name: keyof I & string, text: string) {
    const input = inputs[name];
    setTexts((before) => ({ ...before, [name]: text }));
    if (input && readInput(input, text).ok) setRead((before) => ({ ...before, [name]: text }));
  }
  async function chooseCable(cableId: string) {
    if (!entries.has(cableId)) {
      const line = lineOf(await call<Cable>(`/cables/${encodeURIComponent(cableId)}`));
      setEntries((before) => new Map(before).set(cableId, line));
    }
    set("cable", cableId);
  }
  const values = valuesOf(inputs, read);
  return { inputs, texts, unread, values, set, shown, entries, chooseCable, notes: opened.notes, address };
}
