/** Noise rows of an active two-port: frequency, least noise figure, source reflection, equivalent resistance. */
import { FileFault, type FileLimits, type NoiseData } from "@/lib/touchstone/network-file";

const figuresARow = 5;

export class NoiseRows {
  private readonly rows: NoiseData = {
    frequenciesHz: [],
    minimumFigureDb: [],
    reflection: { re: [], im: [] },
    resistanceOhm: [],
  };
  private last = -1;

  /**
   * @param unitHz - hertz of one unit of frequency
   * @param resistanceScale - ohm of one unit of resistance: the reference in version 1, 1 in version 2
   */
  constructor(
    private readonly unitHz: number,
    private readonly resistanceScale: number,
    private readonly limits: FileLimits,
  ) {}

  get length(): number {
    return this.rows.frequenciesHz.length;
  }

  /** @throws FileFault where the row is not five figures, or its frequency does not ascend */
  take(figures: Float64Array, count: number, line: number): void {
    if (count !== figuresARow) throw new FileFault(line, `A noise row needs five figures; this one has ${count}.`);
    const [frequency = 0, minimum = 0, magnitude = 0, degrees = 0, resistance = 0] = figures;
    if (frequency < 0) throw new FileFault(line, `The frequency ${frequency} is negative.`);
    if (!(frequency > this.last)) throw new FileFault(line, `The noise frequency ${frequency} does not increase.`);
    if (this.length >= this.limits.points)
      throw new FileFault(line, `The file has more than ${this.limits.points} noise frequencies.`);
    const angle = (degrees * Math.PI) / 180;
    this.last = frequency;
    this.rows.frequenciesHz.push(frequency * this.unitHz);
    this.rows.minimumFigureDb.push(minimum);
    this.rows.reflection.re.push(magnitude * Math.cos(angle));
    this.rows.reflection.im.push(magnitude * Math.sin(angle));
    this.rows.resistanceOhm.push(resistance * this.resistanceScale);
  }

  /** undefined without any row */
  data(): NoiseData | undefined {
    return this.length > 0 ? this.rows : undefined;
  }
}
