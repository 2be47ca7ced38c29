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
  const last = values.length - 1;
  let low = Infinity;
  let high = -Infinity;
  let isDefined = last >= 0;
  for (let n = 0; n <= last; n++) {
    const value = values[n]!;
    if (value < low) low = value;
    if (value > high) high = value;
    if (Number.isNaN(value)) isDefined = false;
  }
  const half = Math.floor(last / 2);
  result.min[k] = isDefined ? low : NaN;
  result.max[k] = isDefined ? high : NaN;
  // the median first: what is not above it then lies before it
  result.median[k] = isDefined ? quantile(values, 0.5, 0, last) : NaN;
  result.p05[k] = isDefined ? quantile(values, 0.05, 0, Math.max(half, Math.ceil(0.05 * last))) : NaN;
  result.p95[k] = isDefined ? quantile(values, 0.95, Math.min(half, Math.floor(0.95 * last)), last) : NaN;
}

/**
 * @param values - reordered; those of rank `from` to `to` must stand at those indices, in any order
 * @param share - 0 to 1
 */
function quantile(values: Float64Array, share: number, from: number, to: number): number {
  const rank = share * (values.length - 1);
  const below = Math.floor(rank);
  const part = rank - below;
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
