/**
 * What a calculator asks for: how each thing is labelled, the text it starts with, and how a typed text is read. A
 * calculator is a record of these and one function of their values; screens and addresses know nothing more of it. Pure.
 */
import { brokenBound, type QuantityBounds } from "@/lib/format/bounds";
import type { Read, readImpedance, readQuantity } from "@/lib/format/read-quantity";
import type { QuantityKind } from "@/lib/format/unit-spelling";

/**
 * What reads numbers with units. It carries mathjs, so it is handed in: the server has it at once, a page fetches it
 * when it has woken up.
 */
export interface Reader {
  readQuantity: typeof readQuantity;
  readImpedance: typeof readImpedance;
}

interface Common {
  label: string;
  /** the text it starts with */
  usual: string;
  /** asked for only when the others stand so */
  isShown?: (texts: Record<string, string>) => boolean;
}

export interface TypedInput<V> extends Common {
  input: "typed";
  read: (text: string, reader: Reader) => Read<V>;
  /** shown in the field while the text has no unit of its own */
  unit: string;
  width: "narrow" | "normal" | "wide";
  /** may be left empty */
  isOptional: boolean;
}

export interface ChosenInput<V extends string> extends Common {
  input: "chosen";
  usual: V;
  options: readonly { value: V; label: string }[];
}

/** A cable of the catalogue by its id, or `typed`. */
export interface CableInput extends Common {
  input: "cable";
}

// `never` in the place of the values: a record of inputs may hold inputs of any value.
export type Input = TypedInput<unknown> | ChosenInput<string> | CableInput;
export type Inputs = Record<string, Input>;
export type Texts = Record<string, string>;

type ValueOf<I> =
  I extends TypedInput<infer V> ? V : I extends ChosenInput<infer V> ? V : I extends CableInput ? string : never;
export type Values<I extends Inputs> = { [K in keyof I]: ValueOf<I[K]> };

type Options = Partial<Pick<TypedInput<unknown>, "unit" | "width" | "isShown">>;

export function typed<V>(
  label: string,
  usual: string,
  read: (text: string, reader: Reader) => Read<V>,
  { unit = "", width = "normal", isShown }: Options = {},
): TypedInput<V> {
  return { input: "typed", label, usual, read, unit, width, isShown, isOptional: false };
}

const units: Partial<Record<QuantityKind, string>> = {
  length: "m",
  frequency: "MHz",
  temperature: "°C",
  power: "W",
  resistance: "Ω",
  loss: "dB",
  current: "A",
  timePerLength: "ns/m",
  capacitancePerLength: "pF/m",
  inductancePerLength: "nH/m",
  resistancePerLength: "Ω/km",
};

type QuantityOptions = Options & QuantityBounds;

/** A quantity that must be there. */
export function quantity(
  kind: QuantityKind,
  label: string,
  usual: string,
  options: QuantityOptions = {},
): TypedInput<number> {
  const read = (text: string, reader: Reader): Read<number> => {
    const quantity = reader.readQuantity(kind, text);
    const message = quantity.ok ? brokenBound(quantity.value, options) : null;
    return message === null ? quantity : { ok: false, message };
  };
  return typed(label, usual, read, { unit: units[kind], ...options });
}

/** What reads only texts that are there, made to take an empty one too. */
export function optional<V>(input: TypedInput<V>): TypedInput<V | undefined> {
  const read = (text: string, reader: Reader): Read<V | undefined> =>
    text.trim() === "" ? { ok: true, value: undefined, understood: "" } : input.read(text, reader);
  return { ...input, read, isOptional: true };
}

export function chosen<const V extends string>(
  label: string,
  usual: NoInfer<V>,
  options: readonly (readonly [V, string])[],
  isShown?: Common["isShown"],
): ChosenInput<V> {
  return { input: "chosen", label, usual, options: options.map(([value, text]) => ({ value, label: text })), isShown };
}

const longest = 80;

/** Reads the text of any input; a choice and a cable are read as they stand. */
export function readInput(input: Input, text: string, reader: Reader): Read<unknown> {
  if (text.length > longest) return { ok: false, message: `At most ${longest} characters.` };
  if (input.input === "typed") return input.read(text, reader);
  if (input.input === "cable")
    return text ? { ok: true, value: text, understood: "" } : { ok: false, message: "Choose a cable." };
  const isKnown = input.options.some(({ value }) => value === text);
  return isKnown
    ? { ok: true, value: text, understood: "" }
    : { ok: false, message: `It is ${input.options.map(({ label }) => label).join(" or ")}.` };
}

/** The inputs that are asked for while the texts stand so. */
export function shownInputs<I extends Inputs>(inputs: I, texts: Texts): (keyof I & string)[] {
  return Object.keys(inputs).filter((name) => inputs[name]?.isShown?.(texts) ?? true);
}

/** The texts, each that cannot be read replaced by its last that could. */
export function readableTexts(inputs: Inputs, texts: Texts, last: Texts, reader: Reader): Texts {
  const entries = Object.entries(inputs).map(([name, input]) => {
    const text = texts[name] ?? input.usual;
    return [name, readInput(input, text, reader).ok ? text : (last[name] ?? input.usual)];
  });
  return Object.fromEntries(entries) as Texts;
}

/** The values of texts that can all be read; what is not asked for just now has its value all the same. */
export function valuesOf<I extends Inputs>(inputs: I, texts: Texts, reader: Reader): Values<I> {
  const entries = Object.entries(inputs).map(([name, input]) => {
    const read = readInput(input, texts[name] ?? input.usual, reader);
    if (!read.ok) throw new Error(`valuesOf: ${name} cannot be read: ${texts[name]}`);
    return [name, read.value];
  });
  return Object.fromEntries(entries) as Values<I>;
}

/** What a calculator finds, or a sentence at each input that stands in the way. */
export type Outcome<R> = { ok: true; result: R } | { ok: false; faults: Texts };

export function found<R>(result: R): Outcome<R> {
  return { ok: true, result };
}

export function fault(name: string, message: string): Outcome<never> {
  return { ok: false, faults: { [name]: message } };
}
