/** Addresses that carry what stands in a calculator into a new run or another calculator. Pure. */
import type { lineInputs } from "@/lib/calculators/line-inputs";
import type { Texts } from "@/lib/calculators/input";
import { typedCable } from "@/lib/cables/line";

/** A lossless line of an impedance and a velocity, as a typed cable. */
export function typedLineAddress({ z0, velocityFactor }: { z0: number; velocityFactor: number }): string {
  const figure = (value: number) => String(Number(value.toPrecision(6)));
  return String(
    new URLSearchParams({
      cable: typedCable,
      z0: figure(z0),
      vf: figure(velocityFactor),
      r0: "0",
      corner: "",
      tan: "0",
    }),
  );
}

type LineName = keyof typeof lineInputs;
const typedNames: readonly LineName[] = ["z0", "vf", "r0", "corner", "tan"];

/**
 * The address of a new run with a cable and whatever else is known, as typed.
 * @param texts - of the calculator; its cable and, where that is typed, its figures go along
 * @param rest - names of the new run's own fields, "length" or "load"
 */
export function newRunAddress(texts: Texts, rest: Texts): string {
  const parameters = new URLSearchParams();
  if (texts.cable !== undefined) parameters.set("cable", texts.cable);
  if (texts.cable === typedCable) for (const name of typedNames) parameters.set(name, texts[name] ?? "");
  for (const [name, text] of Object.entries(rest)) parameters.set(name, text);
  return `/runs/new?${parameters}`;
}
