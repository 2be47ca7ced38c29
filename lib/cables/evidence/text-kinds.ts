/**
 * Whether a text is a Touchstone file or a table, each byte looked at once: a file of 25 MB must neither hold up the server
 * nor choose how long it is looked at, as it could with patterns that try again from other places. Pure.
 */

const [tab, lineFeed, carriageReturn, blank, quote, mark, hash, bracket] = [9, 10, 13, 32, 34, 33, 35, 91];
const isBlank = (byte: number | undefined) => byte === blank || byte === tab || byte === carriageReturn;
const isDigit = (byte: number | undefined) => byte !== undefined && byte >= 48 && byte <= 57;
const isSign = (byte: number | undefined) => byte === 43 || byte === 45;

const latin = (bytes: Uint8Array) => Array.from(bytes, (byte) => String.fromCharCode(byte)).join("");

/** What stands in a file that is read line by line has none longer. */
const longestLine = 1_048_576;

/** Tells every line that is not empty by where it begins and ends; stops, false, at the first that is not taken. */
function everyLine(bytes: Uint8Array, take: (from: number, to: number) => boolean): boolean {
  const hasByteOrderMark = bytes[0] === 0xef && bytes[1] === 0xbb && bytes[2] === 0xbf;
  const lineEnd = bytes.includes(lineFeed) ? lineFeed : carriageReturn;
  let from = hasByteOrderMark ? 3 : 0;
  while (from < bytes.length) {
    const found = bytes.indexOf(lineEnd, from);
    const to = found < 0 ? bytes.length : found;
    if (to - from > longestLine) return false;
    while (from < to && isBlank(bytes[from])) from++;
    if (from < to && !take(from, to)) return false;
    from = to + 1;
  }
  return true;
}

function pastDigits(bytes: Uint8Array, from: number, to: number): number {
  let at = from;
  while (at < to && isDigit(bytes[at])) at++;
  return at;
}

/** Where a number that begins here ends; −1 where none does. */
function pastNumber(bytes: Uint8Array, from: number, to: number): number {
  const start = isSign(bytes[from]) ? from + 1 : from;
  const whole = pastDigits(bytes, start, to);
  const hasPoint = whole < to && bytes[whole] === 46;
  const end = hasPoint ? pastDigits(bytes, whole + 1, to) : whole;
  if (end - start - (hasPoint ? 1 : 0) === 0) return -1;
  if (end >= to || (bytes[end] !== 101 && bytes[end] !== 69)) return end;
  const power = isSign(bytes[end + 1]) ? end + 2 : end + 1;
  const past = pastDigits(bytes, power, to);
  return past > power ? past : -1;
}

function isNumbers(bytes: Uint8Array, from: number, to: number): boolean {
  let at = from;
  while (at < to) {
    at = pastNumber(bytes, at, to);
    if (at < 0 || (at < to && !isBlank(bytes[at]))) return false;
    while (at < to && isBlank(bytes[at])) at++;
  }
  return true;
}

const optionWord = /^(?:[kmg]?hz|[syzhg]|db|ma|ri|r)$/i;
const longestHead = 200;

function isOptionLine(bytes: Uint8Array): boolean {
  if (bytes.length > longestHead) return false;
  const words = latin(bytes).split(/\s+/).filter(Boolean);
  return words.every(
    (word, i) => optionWord.test(word) || (/^r$/i.test(words[i - 1] ?? "") && Number.isFinite(Number(word))),
  );
}

/**
 * Touchstone 1 and 2: comments, one option line, and then nothing but numbers (and, of version 2, keywords in brackets).
 * Every line is held to it: what only begins like such a file is none.
 */
export function isTouchstone(bytes: Uint8Array): boolean {
  let [hasOptions, rows] = [false, 0];
  const isOne = everyLine(bytes, (from, lineEnd) => {
    let to = from;
    while (to < lineEnd && bytes[to] !== mark) to++;
    if (to === from) return true;
    if (bytes[from] === bracket)
      return /^\[[\w -]+\]/.test(latin(bytes.subarray(from, Math.min(to, from + longestHead))));
    if (bytes[from] === hash) {
      if (hasOptions || !isOptionLine(bytes.subarray(from + 1, to))) return false;
      hasOptions = true;
      return true;
    }
    rows++;
    return hasOptions && isNumbers(bytes, from, to);
  });
  return isOne && hasOptions && rows > 0;
}

const leastShare = 0.9;
const markup = /<\s*(?:!doctype|html|script|svg|\?xml)/i;

/** How often a sign parts a line, not counting between quotation marks; where the last of those stays open, all count. */
function partings(bytes: Uint8Array, from: number, to: number, sign: number): number {
  let [outside, inside, isQuoted] = [0, 0, false];
  for (let at = from; at < to; at++) {
    if (bytes[at] === quote) {
      isQuoted = !isQuoted;
      inside = 0;
    } else if (bytes[at] === sign) {
      if (isQuoted) inside++;
      else outside++;
    }
  }
  return outside + (isQuoted ? inside : 0);
}

/** A table in text: the same sign parts nearly every line into as many cells, at least two; no markup. */
export function isTable(bytes: Uint8Array): boolean {
  if (markup.test(latin(bytes.subarray(0, 4096)))) return false;
  return [44, 59, tab].some((sign) => {
    let [lines, alike, usual] = [0, 0, 0];
    const isRead = everyLine(bytes, (from, to) => {
      const count = partings(bytes, from, to, sign);
      if (lines++ === 0) usual = count;
      if (count === usual) alike++;
      return usual > 0;
    });
    return isRead && lines > 1 && alike >= leastShare * lines;
  });
}

/** Whether bytes are text in UTF-8 without control characters but tab and line end. */
export function isText(bytes: Uint8Array): boolean {
  for (let at = 0; at < bytes.length; at++) {
    const byte = bytes[at] ?? 0;
    if ((byte < blank && byte !== tab && byte !== lineFeed && byte !== carriageReturn) || byte === 127) return false;
  }
  try {
    new TextDecoder("utf-8", { fatal: true }).decode(bytes);
    return true;
  } catch {
    return false;
  }
}
