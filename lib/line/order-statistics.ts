/** The curves between which shares of many curves lie. */

/** One value per frequency each. NaN where any of the curves is not defined. */
export interface Percentiles {
  min: Float64Array;
  p05: Float64Array;
  median: Float64Array;
  p95: Float64Array;
  max: Float64Array;
}

/**
 * Percentile curves of many curves, point by point: least, 5 %, half, 95 %, greatest.
 * @param values - curve after curve, `count` values each; Infinity is a value like any other
 * @returns each of length `count`
 * Source: R. J. Hyndman and Y. Fan, Sample quantiles in statistical packages, Am. Stat. 50 (1996) 361, definition 7
 * (linear between order statistics); order statistics without sorting by C. A. R. Hoare, Find, Comm. ACM 4 (1961) 321.
 */
export function percentileCurves(values: Float64Array, count: number): Percentiles {
  const curves = values.length / count;
  const column = () => new Float64Array(count);
  const result = { min: column(), p05: column(), median: column(), p95: column(), max: column() };
  const block = new Float64Array(together * curves);
  for (let from = 0; from < count; from += together) {
    const width = Math.min(together, count - from);
    for (let n = 0; n < curves; n++)
      for (let k = 0; k < width; k++) block[k * curves + n] = values[n * count + from + k]!;
    for (let k = 0; k < width; k++) putPercentiles(result, from + k, block.subarray(k * curves, (k + 1) * curves));
  }
  return result;
}

/** Points gathered at a time: as many as lie beside each other in a line of the machine's cache. */
const together = 8;

/** @param values - of all curves at one point; reordered */
function putPercentiles(result: Percentiles, k: number, values: Float64Array): void {
  let low = Infinity;
  let high = -Infinity;
  let isDefined = values.length > 0;
  for (let n = 0; n < values.length; n++) {
    const value = values[n]!;
    if (value < low) low = value;
    if (value > high) high = value;
    if (Number.isNaN(value)) isDefined = false;
  }
  const starts = isDefined ? sortIntoBuckets(values, low, high) : undefined;
  const at = (share: number) => (isDefined ? quantile(values, share, starts) : NaN);
  result.min[k] = isDefined ? low : NaN;
  result.max[k] = isDefined ? high : NaN;
  result.p05[k] = at(0.05);
  result.median[k] = at(0.5);
  result.p95[k] = at(0.95);
}

const buckets = 256;
const bucketStarts = new Int32Array(buckets + 1);
const bucketEnds = new Int32Array(buckets);
let sorted = new Float64Array(0);

/**
 * Sorts values into buckets of equal width, in place, so that a rank need be looked for in one of them only.
 * @returns where each bucket starts, and the end; undefined where they are too few or reach to infinity
 * Source: distribution counting, D. E. Knuth, The Art of Computer Programming, vol. 3, 2nd ed., section 5.2.
 */
function sortIntoBuckets(values: Float64Array, low: number, high: number): Int32Array | undefined {
  const scale = (buckets - 1) / (high - low);
  if (values.length < buckets || !(scale > 0 && scale < Infinity)) return undefined;
  bucketStarts.fill(0);
  for (let n = 0; n < values.length; n++) bucketStarts[Math.trunc((values[n]! - low) * scale) + 1]!++;
  for (let b = 0; b < buckets; b++) {
    bucketEnds[b] = bucketStarts[b]!;
    bucketStarts[b + 1]! += bucketStarts[b]!;
  }
  if (sorted.length !== values.length) sorted = new Float64Array(values.length);
  for (let n = 0; n < values.length; n++) {
    const value = values[n]!;
    sorted[bucketEnds[Math.trunc((value - low) * scale)]!++] = value;
  }
  values.set(sorted);
  return bucketStarts;
}

/** The bucket in which a rank lies, as the index of its start among the starts. */
function bucketOf(starts: Int32Array, rank: number): number {
  let [low, high] = [0, buckets - 1];
  while (low < high) {
    const middle = (low + high + 1) >> 1;
    if (starts[middle]! <= rank) low = middle;
    else high = middle - 1;
  }
  return low;
}

/**
 * @param values - reordered, each within its bucket
 * @param share - 0 to 1
 * @param starts - of the buckets, where there are any
 */
function quantile(values: Float64Array, share: number, starts: Int32Array | undefined): number {
  const rank = share * (values.length - 1);
  const below = Math.floor(rank);
  const part = rank - below;
  const from = starts ? starts[bucketOf(starts, below)]! : 0;
  const to = starts ? starts[bucketOf(starts, Math.min(below + 1, values.length - 1)) + 1]! - 1 : values.length - 1;
  select(values, below, from, to);
  const low = values[below]!;
  if (part === 0) return low;
  let high = Infinity;
  for (let n = below + 1; n <= to; n++) if (values[n]! < high) high = values[n]!;
  return high === low ? low : low + part * (high - low);
}

/** Reorders so that the value of a rank stands at its index, none greater before it and none less after it. */
function select(values: Float64Array, rank: number, from: number, to: number): void {
  let left = from;
  let right = to;
  while (left < right) {
    const pivot = middleOf(values[left]!, values[(left + right) >> 1]!, values[right]!);
    let i = left;
    let j = right;
    while (i <= j) {
      while (values[i]! < pivot) i++;
      while (pivot < values[j]!) j--;
      if (i > j) break;
      const held = values[i]!;
      values[i++] = values[j]!;
      values[j--] = held;
    }
    if (j < rank) left = i;
    if (rank < i) right = j;
  }
}

function middleOf(a: number, b: number, c: number): number {
  return Math.max(Math.min(a, b), Math.min(Math.max(a, b), c));
}
