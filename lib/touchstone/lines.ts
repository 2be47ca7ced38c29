/** A file's text line by line, without a copy of it in pieces. */
import { FileFault, type FileWarning } from "@/lib/touchstone/network-file";
import { type Figure, readFigure } from "@/lib/touchstone/figure";

const mostComments = 200;
const longestComment = 500;
const mostFiguresALine = 10_000;

const isSpace = (code: number) => code === 32 || code === 9;
/** Control characters other than the tab, and the byte-order mark's place in the middle of a text. */
const isControl = (code: number) => (code < 32 && code !== 9) || code === 127;

/**
 * Walks through the lines of a text. After `next` has said true, `line`, `start`, `end` tell where the content of that
 * line is, comment and blanks around it left out; `start` is `end` where there is none.
 */
export class Lines {
  line = 0;
  start = 0;
  end = 0;
  readonly comments: string[] = [];
  readonly warnings: FileWarning[] = [];
  private after = 0;
  private isForeignSaid = false;
  private readonly read: Figure = { value: 0, fault: undefined };

  constructor(readonly text: string) {
    if (text.charCodeAt(0) !== 0xfeff) return;
    this.after = 1;
    this.warnings.push({ line: 1, message: "A byte-order mark before the text was skipped." });
  }

  /**
   * Goes on to the next line; false after the last.
   * @throws FileFault for a control character
   */
  next(): boolean {
    const { text } = this;
    if (this.after >= text.length) return false;
    this.line++;
    let at = this.after;
    let comment = -1;
    let isForeign = false;
    let code = text.charCodeAt(at);
    const from = at;
    for (; at < text.length; code = text.charCodeAt(++at)) {
      if (code === 10 || code === 13) break;
      if (code === 33 && comment < 0) comment = at;
      else if (code > 126 || (code < 32 && code !== 9)) isForeign = this.checkForeign(code, comment >= 0) || isForeign;
    }
    this.after = code === 13 && text.charCodeAt(at + 1) === 10 ? at + 2 : at + 1;
    if (comment >= 0) this.keepComment(comment + 1, at);
    if (isForeign) this.sayForeign();
    this.trim(from, comment < 0 ? at : comment);
    return true;
  }

  /** Goes on to the next line that is not empty; false where there is none. */
  nextWithContent(): boolean {
    while (this.next()) if (this.start < this.end) return true;
    return false;
  }

  private checkForeign(code: number, isComment: boolean): boolean {
    if (isControl(code)) throw new FileFault(this.line, "There is a control character in the line.");
    if (!isComment) throw new FileFault(this.line, "There is a character outside ASCII that is not in a comment.");
    return true;
  }

  private sayForeign(): void {
    if (!this.isForeignSaid)
      this.warnings.push({ line: this.line, message: "Characters outside ASCII in comments were kept as they are." });
    this.isForeignSaid = true;
  }

  private keepComment(from: number, to: number): void {
    if (this.comments.length < mostComments)
      this.comments.push(this.text.slice(from, Math.min(to, from + longestComment)).trim());
    else if (this.comments.length === mostComments) {
      this.comments.push("…");
      this.warnings.push({ line: this.line, message: `Comments from here on were not kept: at most ${mostComments}.` });
    }
  }

  private trim(from: number, to: number): void {
    while (from < to && isSpace(this.text.charCodeAt(from))) from++;
    while (to > from && isSpace(this.text.charCodeAt(to - 1))) to--;
    this.start = from;
    this.end = to;
  }

  /** The words of the line, or of what follows `from`. */
  words(from = this.start): string[] {
    return this.text
      .slice(from, this.end)
      .split(/[ \t]+/)
      .filter((word) => word !== "");
  }

  /**
   * The figures of the line into `into`, from its start on.
   * @returns how many there are
   * @throws FileFault for what is no finite number
   */
  figures(into: Float64Array): number {
    const { text, end, read } = this;
    let count = 0;
    for (let at = this.start; at < end;) {
      let to = at + 1;
      while (to < end && !isSpace(text.charCodeAt(to))) to++;
      readFigure(text, at, to, read);
      if (read.fault !== undefined) this.refuseFigure(text.slice(at, Math.min(to, at + 40)), at);
      if (count === into.length)
        throw new FileFault(this.line, `The line has more than ${into.length} figures; none can need so many.`);
      into[count++] = read.value;
      at = to;
      while (at < end && isSpace(text.charCodeAt(at))) at++;
    }
    return count;
  }

  private refuseFigure(word: string, at: number): never {
    const column = at - this.text.lastIndexOf("\n", at - 1);
    const what = this.read.fault === "notFinite" ? "not a finite number" : "not a number";
    throw new FileFault(this.line, `“${word}” in column ${column} is ${what}.`);
  }
}

/** Room for the figures of one line. */
export const lineOfFigures = () => new Float64Array(mostFiguresALine);
