/** The distance near the start at which the reflection's imaginary part is zero, by secants; the start where none is. */
export function withoutReactance(imaginary: (distance: number) => number, start: number, reach: number): number {
  let [a, b] = [start, start + reach / 100];
  let [atA, atB] = [imaginary(a), imaginary(b)];
  for (let iteration = 0; iteration < 40 && Math.abs(atA) > 1e-14 && atA !== atB; iteration++) {
    const next = a - (atA * (b - a)) / (atB - atA);
    if (!(Math.abs(next - start) < reach)) return start;
    [b, atB] = [a, atA];
    a = next;
    atA = imaginary(a);
  }
  return a;
}
