/** Files that begin with [Version]: keywords, then network data, noise data and [End]. */
import { Header, headerKeywords } from "@/lib/touchstone/header";
import { lineOfFigures, type Lines } from "@/lib/touchstone/lines";
import { FileFault, type FileLimits, type NetworkFile } from "@/lib/touchstone/network-file";
import { NoiseRows } from "@/lib/touchstone/noise";
import { type Options, readOptions } from "@/lib/touchstone/option-line";
import { Points } from "@/lib/touchstone/points";
import { laterOptions } from "@/lib/touchstone/version-1";

/** Where in the file the reader is. */
type Part = "header" | "network" | "noise" | "end";

class Version2Reader {
  private part: Part = "header";
  private readonly header: Header;
  private options: Options | undefined;
  private points: Points | undefined;
  private noise: NoiseRows | undefined;
  private referenceOhm: number[] = [];
  private readonly row = lineOfFigures();

  constructor(
    private readonly lines: Lines,
    private readonly version: "2.0" | "2.1",
    private readonly limits: FileLimits,
  ) {
    this.header = new Header(limits);
  }

  read(): void {
    const { lines } = this;
    while (this.part !== "end" && lines.nextWithContent()) {
      const mark = lines.text.charAt(lines.start);
      if (mark === "#") this.takeOptions();
      else if (mark === "[") this.takeKeyword();
      else this.takeFigures();
    }
    if (this.part !== "end")
      lines.warnings.push({ line: null, message: "[End] is missing; the file was read to its end." });
    else if (lines.nextWithContent())
      lines.warnings.push({ line: lines.line, message: "What stands after [End] was not read." });
  }

  private takeOptions(): void {
    const { lines } = this;
    if (this.options) return void lines.warnings.push({ line: lines.line, message: laterOptions });
    if (this.part !== "header" || this.header.ports !== undefined)
      throw new FileFault(lines.line, "The option line must come right after [Version].");
    this.options = readOptions(lines);
    if (this.options.referenceOhm.length > 1)
      throw new FileFault(
        lines.line,
        "The option line takes one reference here; those of the ports go to [Reference].",
      );
  }

  private takeKeyword(): void {
    const { lines } = this;
    const found = /^\[([^\]]*)\](.*)$/.exec(lines.text.slice(lines.start, Math.min(lines.end, lines.start + 4000)));
    if (!found) throw new FileFault(lines.line, "The bracket of the keyword is not closed.");
    const [, name = "", rest = ""] = found;
    const keyword = name.trim().replaceAll(/\s+/g, " ").toUpperCase();
    const words = rest.split(/\s+/).filter((word) => word !== "");
    if (keyword === "VERSION") throw new FileFault(lines.line, "[Version] is given twice.");
    if (keyword === "NETWORK DATA") this.beginNetwork();
    else if (keyword === "NOISE DATA") this.beginNoise();
    else if (keyword === "END") this.part = "end";
    else if (keyword === "BEGIN INFORMATION") this.skipInformation();
    else if (this.part !== "header" || !this.header.take(keyword, words, lines.line)) this.takeUnknown(name, keyword);
  }

  private takeUnknown(name: string, keyword: string): void {
    const { lines } = this;
    if (keyword === "END INFORMATION")
      throw new FileFault(lines.line, "[End Information] stands without [Begin Information].");
    if (this.part !== "header" && headerKeywords.includes(keyword))
      throw new FileFault(lines.line, `[${name.trim()}] must come before the data.`);
    lines.warnings.push({
      line: lines.line,
      message: `The keyword [${name.trim().slice(0, 60)}] is unknown; it was ignored.`,
    });
  }

  private skipInformation(): void {
    const { lines } = this;
    const { line } = lines;
    while (lines.nextWithContent())
      if (/^\[\s*end\s+information\s*\]/i.test(lines.text.slice(lines.start, Math.min(lines.end, lines.start + 60))))
        return;
    throw new FileFault(line, "[Begin Information] is not closed by [End Information].");
  }

  private beginNetwork(): void {
    const { lines, header } = this;
    if (this.points) throw new FileFault(lines.line, "[Network Data] is given twice.");
    if (!this.options) throw new FileFault(lines.line, "The option line (# …) is missing before the data.");
    const { ports, order, references } = header.complete(this.options.referenceOhm[0] ?? NaN);
    this.referenceOhm = references;
    this.points = new Points({ ports, order, matrix: header.matrix ?? "Full" }, this.options, this.limits);
    this.part = "network";
  }

  private beginNoise(): void {
    const { lines, header, options } = this;
    if (this.part !== "network" || !options)
      throw new FileFault(lines.line, "[Noise Data] must follow [Network Data].");
    if (header.ports !== 2) throw new FileFault(lines.line, "[Noise Data] belong to two ports only.");
    if (header.noiseFrequencies === undefined)
      throw new FileFault(lines.line, "[Number of Noise Frequencies] is missing.");
    this.noise = new NoiseRows(options.unitHz, 1, this.limits);
    this.part = "noise";
  }

  /** A point begins a line, and may be wrapped anywhere. */
  private takeFigures(): void {
    const { lines, header, row, points } = this;
    if (this.part === "header") {
      if (!header.isReferenceOpen) throw new FileFault(lines.line, "There are data outside [Network Data].");
      return header.takeReference(lines.words(), lines.line);
    }
    const count = lines.figures(row);
    if (this.noise) return this.noise.take(row, count, lines.line);
    const taken = points?.take(row, 0, count, lines.line) ?? 0;
    if (taken < count)
      throw new FileFault(
        lines.line,
        `The number of figures does not fit ${header.ports} ports: a point ends after ${taken} of the ${count} in this line.`,
      );
  }

  result(): NetworkFile {
    const { points, header, lines, options } = this;
    if (!points || !options) throw new FileFault(null, "[Network Data] is missing.");
    if (points.filled > 0) throw new FileFault(points.startLine, "The point that begins here is incomplete.");
    if (points.length !== header.frequencies)
      throw new FileFault(
        null,
        `The number of points, ${points.length}, differs from [Number of Frequencies], ${header.frequencies}.`,
      );
    const noiseRows = this.noise?.length ?? 0;
    if (header.noiseFrequencies !== undefined && noiseRows !== header.noiseFrequencies)
      throw new FileFault(
        null,
        `The number of noise rows, ${noiseRows}, differs from [Number of Noise Frequencies], ${header.noiseFrequencies}.`,
      );
    return {
      version: this.version,
      ports: header.ports ?? NaN,
      parameter: options.parameter,
      referenceOhm: this.referenceOhm,
      frequenciesHz: points.frequenciesHz.values(),
      re: points.re.values(),
      im: points.im.values(),
      comments: lines.comments,
      warnings: [...lines.warnings, ...points.warnings()],
      noise: this.noise?.data(),
    };
  }
}

/**
 * @param lines - on the first line that has content, which begins with a bracket
 * @param named - ports as the name says; null where it says none
 * @throws FileFault
 */
export function readVersion2(lines: Lines, named: number | null, limits: FileLimits): NetworkFile {
  const first = lines.text.slice(lines.start, Math.min(lines.end, lines.start + 200));
  const [, version] = /^\[\s*version\s*\]\s*(.*)$/i.exec(first) ?? [];
  if (version === undefined) throw new FileFault(lines.line, "The first keyword must be [Version].");
  if (version !== "2.0" && version !== "2.1")
    throw new FileFault(lines.line, `The version “${version.slice(0, 20)}” is unknown; 2.0 and 2.1 are read.`);
  const reader = new Version2Reader(lines, version, limits);
  reader.read();
  const file = reader.result();
  if (named === null || named === file.ports) return file;
  const message = `The name says ${named} ports, the file says ${file.ports}; the file was believed.`;
  return { ...file, warnings: [...file.warnings, { line: null, message }] };
}
