/** What a wave front meets between lines: resistances, pads and transformers, and the lines that end there. */

/** A line's end: line n has 2n at its source side (a stub at its near end) and 2n + 1 at the other. */
export type LineEnd = number;

/** What closes a junction on one side. A termination as v : i of its impedance; `isDriven` where the source's e.m.f. acts. */
export type Closing = { ends: LineEnd[] } | { v: number; i: number; isDriven?: boolean };

/** What stands in a junction, from source to load. */
export type Link =
  | { kind: "matrix"; a: number; b: number; c: number; d: number }
  | { kind: "shuntLine" | "seriesLine"; end: LineEnd }
  | { kind: "node"; name: string };

export interface Junction {
  /** where in the run it is */
  place: string;
  left: Closing;
  links: Link[];
  right: Closing;
}

/** What one wave of 1 V that comes in on a line, or 1 V of e.m.f., sets off. */
export interface Scattered {
  /** waves that go out, volt */
  waves: { end: LineEnd; volt: number }[];
  /** jumps of node voltages, volt */
  nodes: { name: string; volt: number }[];
}

/** (v, i) = u·(v1, i1) + (v0, i0): the one unknown u is found where the walk ends. */
interface Ray {
  v1: number;
  i1: number;
  v0: number;
  i0: number;
}

/**
 * What goes out of a junction, and what happens at its nodes. Every line end is an e.m.f. of twice the wave that comes
 * in behind the line's impedance.
 * @param impedanceOf - of a line end, ohm, above 0
 * @param from - the line end on which a wave of 1 V comes in, or "source" for 1 V of e.m.f.
 * Source: reflection and transmission at a junction from its Thévenin equivalents, L. V. Bewley, Traveling Waves on
 * Transmission Systems, 2nd ed., chapter 3.
 */
export function scatter(
  { left, links, right }: Junction,
  impedanceOf: (end: LineEnd) => number,
  from: LineEnd | "source",
): Scattered {
  const twice = (end: LineEnd) => (end === from ? 2 : 0);
  const seen: { end?: LineEnd; name?: string; v1: number; v0: number }[] = [];
  const closed = closing(right, impedanceOf, twice, 0);
  const size = closed.y * closed.y + closed.z * closed.z;
  const ray: Ray = { v1: closed.z, i1: closed.y, v0: (closed.e * closed.y) / size, i0: (-closed.e * closed.z) / size };
  const look = (end: LineEnd) => seen.push({ end, v1: ray.v1, v0: ray.v0 });
  if ("ends" in right) right.ends.forEach(look);
  for (const link of [...links].reverse()) {
    if (link.kind === "node") seen.push({ name: link.name, v1: ray.v1, v0: ray.v0 });
    else if (link.kind === "matrix") throughMatrix(ray, link);
    else if (link.kind === "shuntLine") {
      look(link.end);
      acrossLine(ray, impedanceOf(link.end), twice(link.end));
    } else seen.push({ end: link.end, ...alongLine(ray, impedanceOf(link.end), twice(link.end)) });
  }
  if ("ends" in left) left.ends.forEach(look);
  const u = unknown(ray, closing(left, impedanceOf, twice, from === "source" ? 1 : 0));
  return sorted(seen, u, from);
}

/** v·y − i·z = e, i toward the closing. */
function closing(
  of: Closing,
  impedanceOf: (end: LineEnd) => number,
  twice: (end: LineEnd) => number,
  emf: number,
): { y: number; z: number; e: number } {
  if (!("ends" in of)) return { y: of.i, z: of.v, e: of.isDriven ? emf * of.i : 0 };
  const y = of.ends.reduce((sum, end) => sum + 1 / impedanceOf(end), 0);
  const e = of.ends.reduce((sum, end) => sum + twice(end) / impedanceOf(end), 0);
  return { y, z: 1, e };
}

function throughMatrix(ray: Ray, { a, b, c, d }: Extract<Link, { kind: "matrix" }>): void {
  const { v1, i1, v0, i0 } = ray;
  ray.v1 = a * v1 + b * i1;
  ray.i1 = c * v1 + d * i1;
  ray.v0 = a * v0 + b * i0;
  ray.i0 = c * v0 + d * i0;
}

function acrossLine(ray: Ray, impedance: number, emf: number): void {
  ray.i1 += ray.v1 / impedance;
  ray.i0 += (ray.v0 - emf) / impedance;
}

/** Returns the voltage at the line's own terminals. */
function alongLine(ray: Ray, impedance: number, emf: number): { v1: number; v0: number } {
  const own = { v1: impedance * ray.i1, v0: impedance * ray.i0 + emf };
  ray.v1 += own.v1;
  ray.v0 += own.v0;
  return own;
}

/** From the closing at the source side; where nothing determines u it moves no voltage either. */
function unknown({ v1, i1, v0, i0 }: Ray, { y, z, e }: { y: number; z: number; e: number }): number {
  const by = v1 * y + i1 * z;
  return by === 0 ? 0 : (e - v0 * y - i0 * z) / by;
}

function sorted(
  seen: { end?: LineEnd; name?: string; v1: number; v0: number }[],
  u: number,
  from: LineEnd | "source",
): Scattered {
  const result: Scattered = { waves: [], nodes: [] };
  for (const { end, name, v1, v0 } of seen) {
    const volt = u * v1 + v0;
    if (name !== undefined) result.nodes.push({ name, volt });
    if (end !== undefined) result.waves.push({ end, volt: volt - (end === from ? 1 : 0) });
  }
  return result;
}
