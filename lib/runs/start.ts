/**
 * The first facts of a run: what an address may bring along, what the form asks, and the run they make. Texts are as
 * typed; whoever sends someone here (a calculator, the catalogue) only has to know the names. Pure.
 */
import { z } from "zod";
import { typedCable } from "@/lib/cables/line";
import { readTypedLine, type TypedLineTexts } from "@/lib/cables/typed-line";
import { impedanceText, optionalQuantityText, quantityText } from "@/lib/format/quantity-schema";
import { readImpedance, readQuantity } from "@/lib/format/read-quantity";
import type { LineModel } from "@/lib/line/element";
import type { Element, LineRef } from "@/lib/runs/circuit-schema";
import type { NewRun } from "@/lib/runs/schema";

const brought = ["length", "frequency", "temperature", "power", "source", "load"] as const;

/** What an address brings: texts for the form, and what it does not ask for. */
export interface RunStart {
  cableId: string | undefined;
  texts: Partial<Record<(typeof brought)[number], string>>;
  /** a cable that is typed, with its name in words */
  line: { model: LineModel; words: string } | null;
  /** a piece that goes along with the first cable */
  piece: { kind: "pad"; lossDb: number } | { kind: "stub"; lengthM: number; end: "open" | "short" } | null;
}

type Parameters = Record<string, string | string[] | undefined>;

/** What cannot be read of an address is left out: the form then asks for it. */
export function readRunStart(parameters: Parameters): RunStart {
  const text = (name: string) => [parameters[name]].flat()[0]?.slice(0, 80);
  const cableId = text("cable");
  const line = cableId === typedCable ? typedLine(text) : null;
  return {
    cableId: cableId === typedCable && !line ? undefined : cableId,
    texts: Object.fromEntries(brought.flatMap((name) => (text(name) ? [[name, text(name)]] : []))),
    line,
    piece: pieceOf(text("pad"), text("stub"), text("stubEnd")),
  };
}

function typedLine(text: (name: string) => string | undefined): RunStart["line"] {
  const names: (keyof TypedLineTexts)[] = ["z0", "vf", "r0", "corner", "tan"];
  const read = readTypedLine(Object.fromEntries(names.map((name) => [name, text(name) ?? ""])) as TypedLineTexts);
  return read.ok ? { model: read.value, words: read.understood } : null;
}

function pieceOf(pad?: string, stub?: string, end?: string): RunStart["piece"] {
  const loss = pad === undefined ? null : readQuantity("loss", pad);
  if (loss?.ok && loss.value >= 0) return { kind: "pad", lossDb: loss.value };
  const length = stub === undefined ? null : readQuantity("length", stub);
  if (!length?.ok || !(length.value >= 0)) return null;
  return { kind: "stub", lengthM: length.value, end: end === "short" ? "short" : "open" };
}

export const runFormSchema = z.object({
  name: z
    .string()
    .trim()
    .min(1, { error: "Give the run a name." })
    .max(120, { error: "A name has at most 120 characters." }),
  site: z.string().trim().max(120, { error: "A site has at most 120 characters." }),
  cableId: z.string().min(1, { error: "Choose a cable." }),
  length: quantityText("length", { isNotNegative: true, most: 1e7 }),
  frequency: quantityText("frequency", { isPositive: true }),
  temperature: quantityText("temperature", { least: -200, most: 400 }),
  power: optionalQuantityText("power", { isPositive: true, most: 1e9 }),
  source: impedanceText,
  load: impedanceText,
  hasPiece: z.boolean(),
});
export type RunFormTexts = z.input<typeof runFormSchema>;
export type RunFormRead = z.output<typeof runFormSchema>;

const quantities = { length: "length", frequency: "frequency", power: "power", temperature: "temperature" } as const;

/** What a text of the form was understood as, where that says more than the text. */
export function understood(name: keyof RunFormTexts, text: string): string | undefined {
  if (name === "source" || name === "load") {
    const read = readImpedance(text);
    return read.ok ? `= ${read.understood}` : undefined;
  }
  if (!(name in quantities) || !/[a-z'"°]/i.test(text)) return undefined;
  const read = readQuantity(quantities[name as keyof typeof quantities], text);
  return read.ok ? `= ${read.understood}` : undefined;
}

/** The run that the filled form means. */
export function startedRun(read: RunFormRead, start: Pick<RunStart, "line" | "piece">): Partial<NewRun> {
  const { name, site, frequency, temperature, power, source, load } = read;
  return {
    name,
    site,
    circuit: {
      source: { kind: "constant", reOhm: source.re, imOhm: source.im },
      elements: elementsOf(read, start),
      load: { kind: "constant", reOhm: load.re, imOhm: load.im },
      // Where the source has no resistance of its own, reflections need something to be measured against.
      ...(source.re > 0 ? {} : { referenceOhm: 50 }),
    },
    temperatureC: temperature,
    designHz: frequency,
    bandHz: [frequency * 0.99, frequency * 1.01],
    availablePowerW: power ?? null,
  };
}

/** The cable, with a pad before it or a stub behind it. */
function elementsOf({ cableId, length, hasPiece, source, load }: RunFormRead, start: Pick<RunStart, "line" | "piece">) {
  const line: LineRef = cableId === typedCable && start.line ? { model: start.line.model } : { cableId };
  const cable: Element = { kind: "cable", line, lengthM: length };
  if (!hasPiece || !start.piece) return [cable];
  if (start.piece.kind === "pad") {
    const pad: Element = { kind: "pad", lossDb: start.piece.lossDb, inputOhm: source.re, outputOhm: load.re };
    return [pad, cable];
  }
  const { lengthM, end } = start.piece;
  const stub: Element = { kind: "stub", connection: "shunt", end, line, lengthM };
  return [cable, stub];
}
