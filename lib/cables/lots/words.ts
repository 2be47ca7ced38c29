/** Words for measured figures. Pure. */
import { frequency, inWords } from "@/lib/format/quantity";

export const capital = (text: string) => text.charAt(0).toUpperCase() + text.slice(1);

/** "4.1 dB/100 m at 100 MHz" */
export function asTypedLoss(lossDbPerM: number, frequencyHz: number): string {
  return `${Number((lossDbPerM * 100).toPrecision(12))} dB/100 m at ${inWords(frequency(frequencyHz))}`;
}
