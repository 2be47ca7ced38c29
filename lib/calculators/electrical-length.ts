/** A length as people give it for a line: degrees, wavelengths, time, or metres of cable. Pure. */
import { significantDigits, withoutTrailingZeros } from "@/lib/format/quantity";
import type { Reader } from "@/lib/calculators/input";
import type { Read } from "@/lib/format/read-quantity";

/** An angle is in radians; a delay in seconds; a length, of cable, in metres. */
export type GivenLength =
  { kind: "angle"; radians: number } | { kind: "delay"; seconds: number } | { kind: "length"; metres: number };

const example = "90°, λ/4, 24 ns or 1.2 m";
const figure = String.raw`(\d+(?:[.,]\d*)?|[.,]\d+)`;
const degrees = new RegExp(`^${figure}\\s*(?:°|deg|degrees?)$`, "i");
const radians = new RegExp(`^${figure}\\s*(?:rad|radians?)$`, "i");
const waves = String.raw`(?:λ|lambda|waves?|wavelengths?|wl)`;
/** λ/4, 3λ/4, 0.25 λ, 1/4 wave, λ / 20 */
const wavesOver = new RegExp(`^(?:${figure}\\s*)?${waves}\\s*/\\s*${figure}$`, "i");
const share = new RegExp(`^${figure}(?:\\s*/\\s*${figure})?\\s*-?\\s*${waves}$`, "i");
const words: Record<string, number> = { quarter: 0.25, half: 0.5, full: 1 };
const inWords = new RegExp(`^(?:a\\s+)?(quarter|half|full)[\\s-]*${waves}$`, "i");

const number = (text: string | undefined) => (text === undefined ? 1 : Number(text.replace(",", ".")));

/** Wavelengths that a text means; undefined where it is no such text. */
function wavelengthsOf(text: string): number | undefined {
  const word = inWords.exec(text)?.[1];
  if (word !== undefined) return words[word.toLowerCase()];
  const over = wavesOver.exec(text);
  if (over) return number(over[1]) / number(over[2]);
  const part = share.exec(text);
  return part ? number(part[1]) / number(part[2]) : undefined;
}

function angle(value: number): Read<GivenLength> {
  if (!(value > 0 && value < 1e9)) return { ok: false, message: "More than 0." };
  const turns = value / (2 * Math.PI);
  const words = `${shortened(turns * 360)}° or ${shortened(turns)} λ`;
  return { ok: true, value: { kind: "angle", radians: value }, understood: words };
}

function shortened(value: number): string {
  return withoutTrailingZeros(significantDigits(value, 5));
}

/** Reads a length of line; a bare figure is refused, since degrees and metres are both usual. */
export function readGivenLength(text: string, { readQuantity }: Reader): Read<GivenLength> {
  const typed = text.trim();
  if (typed === "") return { ok: false, message: `Type a length, for example ${example}.` };
  const inDegrees = degrees.exec(typed);
  if (inDegrees) return angle((number(inDegrees[1]) / 180) * Math.PI);
  const inRadians = radians.exec(typed);
  if (inRadians) return angle(number(inRadians[1]));
  const inWaves = wavelengthsOf(typed);
  if (inWaves !== undefined) return angle(2 * Math.PI * inWaves);
  if (/^[\d.,\s]+$/.test(typed)) return { ok: false, message: `Degrees, wavelengths, time or metres? Try ${example}.` };
  // Length first: "18 m" is metres, though a bare m after a time is a millisecond.
  const length = readQuantity("length", typed);
  if (length.ok) return positive(length.value, { kind: "length", metres: length.value }, length.understood);
  const time = readQuantity("time", typed);
  if (time.ok) return positive(time.value, { kind: "delay", seconds: time.value }, time.understood);
  return { ok: false, message: `“${typed}” is not a length of line. Try ${example}.` };
}

function positive(value: number, given: GivenLength, understood: string): Read<GivenLength> {
  if (!(value > 0)) return { ok: false, message: "More than 0." };
  return { ok: true, value: given, understood };
}
