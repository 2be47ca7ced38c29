/** Files without a [Version]: the option line first, the number of ports from the name. */
import { lineOfFigures, type Lines } from "@/lib/touchstone/lines";
import { FileFault, type FileLimits, type NetworkFile } from "@/lib/touchstone/network-file";
import { NoiseRows } from "@/lib/touchstone/noise";
import { type Options, readOptions } from "@/lib/touchstone/option-line";
import { Points } from "@/lib/touchstone/points";

const mostPairsALine = 4;

/** One value a port: as given, or the one given for all. */
function referencesOf({ referenceOhm }: Options, ports: number, line: number): number[] {
  if (referenceOhm.length === ports) return referenceOhm;
  const [only] = referenceOhm;
  if (only !== undefined && referenceOhm.length === 1) return Array.from({ length: ports }, () => only);
  throw new FileFault(line, `The option line gives ${referenceOhm.length} references; the file has ${ports} ports.`);
}

/** Reads the lines of data, deciding by the number of ports what a line may hold. */
class Version1Data {
  readonly row = lineOfFigures();
  private isNoise = false;
  private isLayoutSaid = false;

  constructor(
    private readonly lines: Lines,
    private readonly ports: number,
    readonly points: Points,
    readonly noise: NoiseRows,
  ) {}

  takeLine(): void {
    const { row, lines, ports } = this;
    const count = lines.figures(row);
    if (ports === 1) this.takeOnePort(count);
    else if (ports === 2) this.takeTwoPort(count);
    else this.takeMatrixLine(count);
  }

  private takeOnePort(count: number): void {
    const { line } = this.lines;
    if (count === 2)
      throw new FileFault(line, "A pair is incomplete: a one-port point needs three figures, this has 2.");
    if (count !== 3)
      throw new FileFault(
        line,
        `${count} figures do not fit the number of ports: a one-port point needs three${count % 2 === 0 ? ", and a pair is incomplete" : ""}.`,
      );
    this.points.take(this.row, 0, count, line);
  }

  /** Noise begins where the frequency first goes down; a row of nine figures is no noise. */
  private takeTwoPort(count: number): void {
    const { line } = this.lines;
    const falls = this.points.length > 0 && (this.row[0] ?? NaN) <= this.points.lastWritten;
    if (this.isNoise || (falls && count !== this.points.figuresAPoint)) {
      this.isNoise = true;
      return this.noise.take(this.row, count, line);
    }
    if (count !== this.points.figuresAPoint)
      throw new FileFault(line, `A two-port point needs nine figures; this line has ${count}.`);
    this.points.take(this.row, 0, count, line);
  }

  /** Three ports and more: row by row, at most four pairs a line. */
  private takeMatrixLine(count: number): void {
    const { points, lines } = this;
    const { line } = lines;
    const isFirst = points.filled === 0;
    if (isFirst !== (count % 2 === 1))
      throw new FileFault(
        line,
        isFirst
          ? "A pair is incomplete: the first line of a point is its frequency and whole pairs."
          : `This is not the rest of the point that began in line ${points.startLine}: a pair is incomplete, or its figures are too few.`,
      );
    const pairs = (count - (isFirst ? 1 : 0)) / 2;
    const pairsBefore = isFirst ? 0 : (points.filled - 1) / 2;
    if (1 + 2 * (pairsBefore + pairs) > points.figuresAPoint)
      throw new FileFault(
        line,
        `The number of figures does not fit ${this.ports} ports: there are too many in this point.`,
      );
    if (!this.isLayoutSaid && (pairs > mostPairsALine || (pairsBefore % this.ports) + pairs > this.ports)) {
      this.isLayoutSaid = true;
      const message = "A line holds more than four pairs, or parts of two rows; the pairs were read row by row.";
      lines.warnings.push({ line, message });
    }
    points.take(this.row, 0, count, line);
  }
}

function refuseKeyword(lines: Lines): never {
  const keyword = lines.text.slice(lines.start, Math.min(lines.end, lines.start + 40));
  const isVersion = /^\[\s*version\s*\]/i.test(keyword);
  throw new FileFault(
    lines.line,
    isVersion ? "[Version] must come before all else." : `${keyword} belongs to a file that begins with [Version].`,
  );
}

/**
 * @param lines - on the first line that has content
 * @param ports - as the name says; null where it does not
 * @throws FileFault
 */
export function readVersion1(lines: Lines, ports: number | null, limits: FileLimits): NetworkFile {
  const mark = (at: number) => lines.text.charAt(at);
  if (mark(lines.start) !== "#") throw new FileFault(lines.line, "There are data before the option line (# …).");
  if (ports === null)
    throw new FileFault(null, "The name must end in .s1p, .s2p and so on: it tells the ports of a file of version 1.");
  const options = readOptions(lines);
  const referenceOhm = referencesOf(options, ports, lines.line);
  const isPerPort = options.referenceOhm.length > 1;
  if (isPerPort)
    lines.warnings.push({ line: lines.line, message: "One reference a port was read, as version 2.1 allows it." });
  const shape = { ports, matrix: "Full", order: "21_12", normalisedTo: referenceOhm } as const;
  const noise = new NoiseRows(options.unitHz, referenceOhm[0] ?? NaN, limits);
  const data = new Version1Data(lines, ports, new Points(shape, options, limits), noise);
  while (lines.nextWithContent()) {
    if (mark(lines.start) === "#") lines.warnings.push({ line: lines.line, message: laterOptions });
    else if (mark(lines.start) === "[") refuseKeyword(lines);
    else data.takeLine();
  }
  const { points } = data;
  if (points.filled > 0) throw new FileFault(points.startLine, "The point that begins here is incomplete.");
  if (points.length === 0) throw new FileFault(null, "There is an option line but there are no data.");
  return {
    version: isPerPort ? "2.1" : "1.1",
    ports,
    parameter: options.parameter,
    referenceOhm,
    frequenciesHz: points.frequenciesHz.values(),
    re: points.re.values(),
    im: points.im.values(),
    comments: lines.comments,
    warnings: [...lines.warnings, ...points.warnings()],
    noise: noise.data(),
  };
}

export const laterOptions = "A second option line was ignored; the first one counts.";
