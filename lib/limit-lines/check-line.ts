/** What a limit line must keep beyond the shape of its fields. Pure. */
import type { z } from "zod";
import { type LimitCurve, type LimitLine, limitOver, limitRange } from "@/lib/limit-lines/limit";

type Fault = { path: (string | number)[]; message: string };

/** The greatest a limit of a quantity can sensibly be, dB, seconds or ohm. */
const mostOf: Record<LimitLine["quantity"], number> = {
  ...{ insertionLoss: 1000, returnLoss: 100, delay: 1, skew: 1, dcLoop: 1e6, conductorDc: 1e6 },
};

function orderFaults(curve: LimitCurve): Fault[] {
  if (curve.form === "points")
    return curve.points.flatMap(({ frequencyHz }, i) =>
      i > 0 && !(frequencyHz > (curve.points[i - 1]?.frequencyHz ?? 0))
        ? [{ path: ["points", i, "frequencyHz"], message: "Each point lies above the one before." }]
        : [],
    );
  if (curve.form === "formula")
    return curve.pieces.flatMap((piece, i) =>
      i > 0 && piece.fromHz < (curve.pieces[i - 1]?.toHz ?? 0)
        ? [{ path: ["pieces", i, "fromHz"], message: "Each range begins where the one before has ended, or above." }]
        : [],
    );
  return [];
}

const looks = 65;

/** Looks along each piece, ends included; a limit of nothing or less could never be kept, or never be missed. */
function valueFaults(curve: LimitCurve, most: number): Fault[] {
  const spans: { part: LimitCurve; path: (string | number)[] }[] =
    curve.form === "formula"
      ? curve.pieces.map((piece, i) => ({ part: { ...curve, pieces: [piece] }, path: ["pieces", i] }))
      : [{ part: curve, path: [] }];
  return spans.flatMap(({ part, path }) => {
    const [from, to] = limitRange(part) ?? [1, 1];
    const frequencies = Float64Array.from({ length: looks }, (_, i) =>
      i === looks - 1 ? to : from * (to / from) ** (i / (looks - 1)),
    );
    const values = limitOver({ quantity: "insertionLoss", of: "cable", curve: part }, frequencies);
    const at = values.findIndex((value) => !(value > 0 && value <= most));
    if (at < 0) return [];
    const what = (values[at] ?? 0) > most ? `more than ${most}` : "0 or less";
    const where = part.form === "constant" ? "" : ` at ${Number((frequencies[at] ?? 0).toPrecision(4))} Hz`;
    return [{ path, message: `The limit is ${what}${where}.` }];
  });
}

function fitFaults({ quantity, perLengthM, curve }: LimitLine): Fault[] {
  const faults: Fault[] = [];
  if ((quantity === "dcLoop" || quantity === "conductorDc") && curve.form !== "constant")
    faults.push({
      path: ["curve", "form"],
      message: "A resistance is a constant: direct current has no frequency.",
    });
  if (quantity === "returnLoss" && perLengthM !== undefined)
    faults.push({ path: ["perLengthM"], message: "A return loss does not grow with length." });
  return faults;
}

/** Adds every fault of a line to its check. */
export function checkLine(line: LimitLine, context: z.core.$RefinementCtx): void {
  const order = orderFaults(line.curve);
  // What is out of order, or is no number to begin with, cannot be followed along.
  const canFollow = order.length === 0 && context.issues.length === 0;
  const inCurve = canFollow ? valueFaults(line.curve, mostOf[line.quantity]) : order;
  const faults = [...fitFaults(line), ...inCurve.map(({ path, message }) => ({ path: ["curve", ...path], message }))];
  for (const fault of faults) context.addIssue({ code: "custom", ...fault });
}
