/** What the keywords of a version 2 file say before its data. */
import { type Figure, readFigure } from "@/lib/touchstone/figure";
import { FileFault, type FileLimits } from "@/lib/touchstone/network-file";
import type { MatrixFormat, TwoPortOrder } from "@/lib/touchstone/points";

export class Header {
  ports: number | undefined;
  order: { value: TwoPortOrder; line: number } | undefined;
  frequencies: number | undefined;
  noiseFrequencies: number | undefined;
  matrix: MatrixFormat | undefined;
  reference: { values: number[]; line: number } | undefined;
  /** whether the lines that follow may still be references */
  isReferenceOpen = false;

  constructor(private readonly limits: FileLimits) {}

  /**
   * @param keyword - in capitals, without its brackets
   * @returns false for a keyword that is none of the header's
   * @throws FileFault where it says something impossible, or for the second time
   */
  take(keyword: string, words: string[], line: number): boolean {
    this.isReferenceOpen = false;
    switch (keyword) {
      case "NUMBER OF PORTS":
        this.ports = this.whole(keyword, this.ports, words, line, this.limits.ports);
        return true;
      case "NUMBER OF FREQUENCIES":
        this.frequencies = this.whole(keyword, this.frequencies, words, line, this.limits.points);
        return true;
      case "NUMBER OF NOISE FREQUENCIES":
        this.noiseFrequencies = this.whole(keyword, this.noiseFrequencies, words, line, this.limits.points);
        return true;
      case "TWO-PORT DATA ORDER":
        this.takeOrder(words, line);
        return true;
      case "MATRIX FORMAT":
        this.takeMatrix(words, line);
        return true;
      case "REFERENCE":
        this.beginReference(words, line);
        return true;
      case "MIXED-MODE ORDER":
        throw new FileFault(line, "Mixed-mode data are not read: every port must be one conductor against the common.");
      default:
        return false;
    }
  }

  private whole(keyword: string, before: number | undefined, words: string[], line: number, most: number): number {
    const name = `[${titled(keyword)}]`;
    if (before !== undefined) throw new FileFault(line, `${name} is given twice.`);
    const [word = ""] = words;
    if (words.length !== 1 || !/^\+?\d{1,15}$/.test(word) || Number(word) < 1)
      throw new FileFault(line, `${name} needs one whole number of at least 1.`);
    if (Number(word) > most) throw new FileFault(line, `${name} is at most ${most} here.`);
    return Number(word);
  }

  private takeOrder(words: string[], line: number): void {
    if (this.order) throw new FileFault(line, "[Two-Port Data Order] is given twice.");
    const [value] = words;
    if (words.length !== 1 || (value !== "12_21" && value !== "21_12"))
      throw new FileFault(line, "The data order must be 12_21 or 21_12.");
    this.order = { value, line };
  }

  private takeMatrix(words: string[], line: number): void {
    if (this.matrix) throw new FileFault(line, "[Matrix Format] is given twice.");
    const value = (["Full", "Lower", "Upper"] as const).find((each) => each.toUpperCase() === words[0]?.toUpperCase());
    if (words.length !== 1 || !value) throw new FileFault(line, "The matrix format must be Full, Lower or Upper.");
    this.matrix = value;
  }

  private beginReference(words: string[], line: number): void {
    if (this.reference) throw new FileFault(line, "[Reference] is given twice.");
    if (this.ports === undefined) throw new FileFault(line, "[Number of Ports] must come before [Reference].");
    this.reference = { values: [], line };
    this.takeReference(words, line);
  }

  /** References on the keyword's own line or on those after it. */
  takeReference(words: string[], line: number): void {
    const read: Figure = { value: 0, fault: undefined };
    for (const word of words) {
      readFigure(word, 0, word.length, read);
      if (read.fault !== undefined || !(read.value > 0))
        throw new FileFault(line, `A reference must be a positive number; “${word.slice(0, 40)}” is not.`);
      this.reference?.values.push(read.value);
    }
    const missing = (this.ports ?? 0) - (this.reference?.values.length ?? 0);
    if (missing < 0) throw new FileFault(line, `[Reference] needs one value per port: there are ${this.ports} ports.`);
    this.isReferenceOpen = missing > 0;
  }

  /**
   * Whether all is said that data need.
   * @param given - reference of the option line, ohm
   * @returns ports, order of a two-port and one reference a port
   */
  complete(given: number): { ports: number; order: TwoPortOrder; references: number[] } {
    const { ports, order, reference } = this;
    if (ports === undefined) throw new FileFault(null, "[Number of Ports] is missing.");
    if (ports === 2 && !order) throw new FileFault(null, "[Two-Port Data Order] is missing.");
    if (ports !== 2 && order) throw new FileFault(order.line, "[Two-Port Data Order] belongs to two ports only.");
    if (this.frequencies === undefined) throw new FileFault(null, "[Number of Frequencies] is missing.");
    if (reference && reference.values.length !== ports)
      throw new FileFault(
        reference.line,
        `[Reference] needs one value per port: ${ports}, not ${reference.values.length}.`,
      );
    const references = reference?.values ?? Array.from({ length: ports }, () => given);
    return { ports, order: order?.value ?? "12_21", references };
  }
}

/** Keywords that say how the data are to be read. */
export const headerKeywords = [
  "NUMBER OF PORTS",
  "NUMBER OF FREQUENCIES",
  "NUMBER OF NOISE FREQUENCIES",
  "TWO-PORT DATA ORDER",
  "MATRIX FORMAT",
  "REFERENCE",
  "MIXED-MODE ORDER",
];

const titled = (keyword: string) =>
  keyword.toLowerCase().replaceAll(/\b(?!of\b)[a-z]/g, (letter) => letter.toUpperCase());
