/** The address of a calculator <-> what stands in its fields, texts as they were typed, so that any state can be sent. Pure. */
import { readInput, shownInputs, type Inputs, type Reader, type Texts } from "@/lib/calculators/input";

export type Parameters = Record<string, string | string[] | undefined>;

export interface Opened {
  texts: Texts;
  /** what of the address could not be used, in sentences */
  notes: string[];
}

const most = 3;

/**
 * What a calculator opens with. Without any of its own names in the address everything is usual; with some, what may be
 * empty is empty unless named. What cannot be read, or means nothing, is said.
 */
export function readAddress(inputs: Inputs, parameters: Parameters, reader: Reader): Opened {
  const given = Object.keys(parameters).filter((name) => parameters[name] !== undefined);
  const isOwn = (name: string) => Object.hasOwn(inputs, name);
  const hasOwn = given.some(isOwn);
  const notes: string[] = [];
  const texts: Texts = {};
  for (const [name, input] of Object.entries(inputs)) {
    const text = [parameters[name]].flat()[0];
    const isEmptied = hasOwn && input.input === "typed" && input.isOptional;
    texts[name] = text ?? (isEmptied ? "" : input.usual);
    const read = readInput(input, texts[name], reader);
    if (read.ok) continue;
    texts[name] = isEmptied ? "" : input.usual;
    const usual = input.input === "typed" ? `The usual ${texts[name]} stands here.` : "The usual one stands here.";
    const instead = texts[name] === "" ? "It is left empty." : usual;
    notes.push(`${input.label}: the address held “${shortened(text ?? "")}”. ${read.message} ${instead}`);
  }
  const strangers = given.filter((name) => !isOwn(name)).map((name) => `“${shortened(name)}”`);
  if (strangers.length > 0)
    notes.push(`The address also holds ${strangers.slice(0, most).join(", ")}, which means nothing here.`);
  return { texts, notes };
}

function shortened(text: string): string {
  return text.length > 40 ? `${text.slice(0, 39)}…` : text;
}

/** The address of a state: everything that is asked for, so that it stays the same whatever becomes usual later. */
export function calculatorAddress(path: string, inputs: Inputs, texts: Texts): string {
  const parameters = new URLSearchParams();
  for (const name of shownInputs(inputs, texts)) parameters.set(name, texts[name] ?? "");
  return `${path}?${parameters}`;
}
