/** The matrices of a file, point by point, as its figures come in. */
import { Growing } from "@/lib/touchstone/growing";
import { FileFault, type FileLimits, type FileWarning, type NetworkParameter } from "@/lib/touchstone/network-file";
import type { Options, PairFormat } from "@/lib/touchstone/option-line";

export type MatrixFormat = "Full" | "Lower" | "Upper";
/** Order of the two transmissions of a two-port, as the file names it. */
export type TwoPortOrder = "12_21" | "21_12";

/** Above this a magnitude is more than rounding over 1. */
const passiveLimit = 1 + 1e-6;

/** Where the pairs of a point go in the matrix, in the order of the file. */
export function placesOf(ports: number, matrix: MatrixFormat, order: TwoPortOrder): { row: number; column: number }[] {
  const places: { row: number; column: number }[] = [];
  for (let row = 0; row < ports; row++)
    for (let column = 0; column < ports; column++)
      if (matrix === "Full" || (matrix === "Lower" ? column <= row : column >= row)) places.push({ row, column });
  if (ports !== 2 || matrix !== "Full" || order === "12_21") return places;
  return places.map(({ row, column }) => ({ row: column, column: row }));
}

export interface PointShape {
  ports: number;
  matrix: MatrixFormat;
  order: TwoPortOrder;
  /** one value a port where the figures are normalised to it, as in version 1; absent where they are plain */
  normalisedTo?: readonly number[];
}

export class Points {
  readonly frequenciesHz = new Growing();
  readonly re = new Growing();
  readonly im = new Growing();
  /** figures of the point being read */
  filled = 0;
  /** line on which it began */
  startLine = 0;
  readonly figuresAPoint: number;
  private readonly buffer: Float64Array;
  private readonly target: Int32Array;
  private readonly mirror: Int32Array;
  private readonly factor: Float64Array | undefined;
  private last = -1;
  private odd = { count: 0, line: 0 };
  private readonly values: number;

  constructor(
    private readonly shape: PointShape,
    private readonly options: Options,
    private readonly limits: FileLimits,
  ) {
    const { ports, matrix, order, normalisedTo } = shape;
    const places = placesOf(ports, matrix, order);
    this.values = ports * ports;
    this.figuresAPoint = 1 + 2 * places.length;
    this.buffer = new Float64Array(this.figuresAPoint);
    this.target = Int32Array.from(places, ({ row, column }) => row * ports + column);
    this.mirror = Int32Array.from(places, ({ row, column }) => column * ports + row);
    if (normalisedTo && options.parameter !== "S")
      this.factor = Float64Array.from(places, ({ row, column }) =>
        scaleOf(options.parameter, normalisedTo[row] ?? NaN, normalisedTo[column] ?? NaN),
      );
  }

  get length(): number {
    return this.frequenciesHz.length;
  }

  /** Frequency of the last point as the file writes it, −1 before the first. */
  get lastWritten(): number {
    return this.last;
  }

  /**
   * Takes figures of one line; a point is done when it has all of its own.
   * @param from - first figure of `figures` to take
   * @returns how many were taken: fewer than there are where a point is done before the line is
   * @throws FileFault where a frequency does not ascend, or the file holds too much
   */
  take(figures: Float64Array, from: number, count: number, line: number): number {
    if (this.filled === 0) this.begin(figures[from] ?? NaN, line);
    const taken = Math.min(count - from, this.figuresAPoint - this.filled);
    for (let k = 0; k < taken; k++) this.buffer[this.filled + k] = figures[from + k] ?? NaN;
    this.filled += taken;
    if (this.filled === this.figuresAPoint) this.finish();
    return taken;
  }

  private begin(written: number, line: number): void {
    if (written < 0) throw new FileFault(line, `The frequency ${written} is negative.`);
    if (!(written > this.last))
      throw new FileFault(line, `The frequency ${written} does not increase: the one before is ${this.last}.`);
    const { points, values } = this.limits;
    if (this.length >= points) throw new FileFault(line, `The file has more than ${points} frequencies.`);
    if ((this.length + 1) * this.values > values)
      throw new FileFault(line, `The file has more than ${values} parameters in all its matrices.`);
    const frequency = written * this.options.unitHz;
    if (!(frequency < Infinity)) throw new FileFault(line, `The frequency ${written} is too large.`);
    this.last = written;
    this.startLine = line;
    this.frequenciesHz.push(frequency);
  }

  private finish(): void {
    const base = this.re.length;
    for (let n = 0; n < this.values; n++) {
      this.re.push(0);
      this.im.push(0);
    }
    const isTriangle = this.shape.matrix !== "Full";
    for (let k = 0; k < this.target.length; k++) {
      const factor = this.factor === undefined ? 1 : (this.factor[k] ?? NaN);
      const [re, im] = pairOf(this.options.format, this.buffer[1 + 2 * k] ?? NaN, this.buffer[2 + 2 * k] ?? NaN);
      this.put(base + (this.target[k] ?? 0), re * factor, im * factor);
      if (isTriangle) this.put(base + (this.mirror[k] ?? 0), re * factor, im * factor);
    }
    this.filled = 0;
    this.checkPassive(base);
  }

  private put(index: number, re: number, im: number): void {
    if (!(Math.abs(re) < Infinity && Math.abs(im) < Infinity))
      throw new FileFault(this.startLine, "A parameter of this point is too large to be a finite number.");
    this.re.set(index, re);
    this.im.set(index, im);
  }

  private checkPassive(base: number): void {
    const { ports } = this.shape;
    let isOdd = false;
    if (this.options.parameter === "S")
      for (let k = base; k < base + this.values; k++)
        isOdd ||= this.re.at(k) ** 2 + this.im.at(k) ** 2 > passiveLimit ** 2;
    else for (let i = 0; i < ports; i++) isOdd ||= this.re.at(base + i * ports + i) < 0;
    if (!isOdd) return;
    if (this.odd.count === 0) this.odd.line = this.startLine;
    this.odd.count++;
  }

  /** What is to be said of the whole. */
  warnings(): FileWarning[] {
    const { count, line } = this.odd;
    if (count === 0) return [];
    const what =
      this.options.parameter === "S"
        ? "A parameter has a magnitude above 1"
        : "An impedance or admittance has a negative real part";
    return [{ line, message: `${what}: not passive, as no cable is (${count} of ${this.length} frequencies).` }];
  }
}

function scaleOf(parameter: NetworkParameter, ofRow: number, ofColumn: number): number {
  const reference = ofRow === ofColumn ? ofRow : Math.sqrt(ofRow * ofColumn);
  return parameter === "Z" ? reference : 1 / reference;
}

/** A pair of figures as real and imaginary part. */
export function pairOf(format: PairFormat, first: number, second: number): [number, number] {
  if (format === "RI") return [first, second];
  const magnitude = format === "DB" ? 10 ** (first / 20) : first;
  const angle = (second * Math.PI) / 180;
  return [magnitude * Math.cos(angle), magnitude * Math.sin(angle)];
}
