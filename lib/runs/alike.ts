/** Whether two plain values say the same, whatever the order of their keys; an absent key is the same as undefined. Pure. */

function canonical(value: unknown): unknown {
  if (Array.isArray(value)) return value.map(canonical);
  if (value === null || typeof value !== "object") return value;
  const entries = Object.entries(value).filter(([, inner]) => inner !== undefined);
  return Object.fromEntries(
    entries.sort(([a], [b]) => (a < b ? -1 : 1)).map(([key, inner]) => [key, canonical(inner)]),
  );
}

export function alike(a: unknown, b: unknown): boolean {
  return a === b || JSON.stringify(canonical(a)) === JSON.stringify(canonical(b));
}
