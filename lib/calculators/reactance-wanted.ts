/** A wanted reactance as people give it: ohms, or the part that would have it. Pure. */
import { significantDigits, withoutTrailingZeros } from "@/lib/format/quantity";
import type { Reader } from "@/lib/calculators/input";
import type { Read } from "@/lib/format/read-quantity";
import { reactanceOfPart, type ReactivePart } from "@/lib/line/reactance";

/** Ohm, inductive above 0; or a coil or capacitor, whose reactance depends on the frequency. */
export type WantedReactance = { kind: "ohm"; ohm: number } | { kind: "part"; part: ReactivePart };

const example = "j50, -j35, 350 nH or 132 pF";
const ohms = /^([+-])?\s*(j|i)?\s*(\d+(?:[.,]\d*)?|[.,]\d+)\s*(j|i)?\s*(?:Ω|\u2126|ohms?)?$/i;

export function readWantedReactance(text: string, { readQuantity }: Reader): Read<WantedReactance> {
  const typed = text.trim().replace(/[\u2212\u2013]/g, "-");
  if (typed === "") return { ok: false, message: `Type a reactance, for example ${example}.` };
  const found = ohms.exec(typed);
  if (found && !(found[2] && found[4])) {
    const ohm = Number((found[3] ?? "").replace(",", ".")) * (found[1] === "-" ? -1 : 1);
    if (Math.abs(ohm) > 1e9) return { ok: false, message: "At most 1 GΩ." };
    const size = withoutTrailingZeros(significantDigits(Math.abs(ohm), 4));
    return { ok: true, value: { kind: "ohm", ohm }, understood: `${ohm < 0 ? "\u2212" : "+"}j${size}\u00a0Ω` };
  }
  if (!/[HhFfµμnpum]/.test(typed))
    return { ok: false, message: `“${text.trim()}” is not a reactance. Try ${example}.` };
  const coil = readQuantity("inductance", typed);
  if (coil.ok && coil.value > 0)
    return { ok: true, value: { kind: "part", part: { lH: coil.value } }, understood: coil.understood };
  const capacitor = readQuantity("capacitance", typed);
  if (capacitor.ok && capacitor.value > 0)
    return { ok: true, value: { kind: "part", part: { cF: capacitor.value } }, understood: capacitor.understood };
  return { ok: false, message: `“${text.trim()}” is not a reactance. Try ${example}.` };
}

/** The reactance wanted at a frequency, ohm. */
export function wantedOhm(wanted: WantedReactance, frequency: number): number {
  return wanted.kind === "ohm" ? wanted.ohm : reactanceOfPart(wanted.part, frequency);
}

/** "350 nH", or nothing where ohms were typed. */
export function wantedPart(wanted: WantedReactance): ReactivePart | null {
  return wanted.kind === "part" ? wanted.part : null;
}
