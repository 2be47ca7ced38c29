/** A limit line as it is typed, in megahertz and people's units, and as the API takes it. Pure. */
import { quantityWords } from "@/components/limits/limit-words";
import type { Problem } from "@/lib/http/call";
import type { NewLimitLine } from "@/lib/limit-lines/schema";
import type { LimitOf, FormulaPiece, LimitQuantity } from "@/lib/limit-lines/limit";

export const coefficientNames = ["k0", "k1", "k2", "k3", "kLog"] as const;
type TypedPiece = Record<"from" | "to" | (typeof coefficientNames)[number], string>;

export interface TypedLimit {
  name: string;
  quantity: LimitQuantity;
  of: LimitOf;
  isPer100m: boolean;
  form: "formula" | "points" | "constant";
  pieces: TypedPiece[];
  /** a point a line: megahertz, then the limit */
  points: string;
  value: string;
  title: string;
  edition: string;
  clause: string;
  note: string;
}

export const newPiece: TypedPiece = { from: "", to: "", k0: "", k1: "", k2: "", k3: "", kLog: "" };

export const newLimit: TypedLimit = {
  ...{ name: "", quantity: "insertionLoss", of: "cable", isPer100m: true, form: "formula", pieces: [newPiece] },
  ...{ points: "", value: "", title: "", edition: "", clause: "", note: "" },
};

/** What cannot be read is left as it was typed: the server says of it that it is no number, at its place. */
function typedNumber(text: string, factor: number): number {
  const read = Number(text.trim().replace("−", "-").replace(",", "."));
  return (text.trim() === "" || !Number.isFinite(read) ? text : read * factor) as number;
}

const mega = 1e6;

function pieceOf(typed: TypedPiece, factor: number): FormulaPiece {
  const given = coefficientNames.filter((name) => typed[name].trim() !== "");
  return {
    ...{ fromHz: typedNumber(typed.from, mega), toHz: typedNumber(typed.to, mega) },
    ...Object.fromEntries(given.map((name) => [name, typedNumber(typed[name], factor)])),
  };
}

function curveOf({ form, pieces, points, value }: TypedLimit, factor: number): NewLimitLine["curve"] {
  if (form === "constant") return { form, value: typedNumber(value, factor) };
  if (form === "formula") return { form, referenceHz: mega, pieces: pieces.map((piece) => pieceOf(piece, factor)) };
  const rows = points.split("\n").filter((row) => row.trim() !== "");
  return {
    form,
    points: rows.map((row) => {
      const [at = "", limit = ""] = row.trim().split(/[\s;]+/);
      return { frequencyHz: typedNumber(at, mega), value: typedNumber(limit, factor) };
    }),
  };
}

export function typedLine(typed: TypedLimit): NewLimitLine {
  const { name, quantity, of, isPer100m, title, edition, clause, note } = typed;
  return {
    ...{ name, quantity, of, note },
    ...(isPer100m && quantity !== "returnLoss" && { perLengthM: 100 }),
    curve: curveOf(typed, quantityWords[quantity].factor),
    source: { title, edition, clause: clause.trim() === "" ? null : clause },
  };
}

/** The sentences of a refusal, each with the range or the point it is about. */
export function refusalSentences({ detail, errors = [] }: Problem): string[] {
  if (errors.length === 0) return [detail];
  return errors.map(({ path, message }) => {
    const [, list, index] = /^curve\.(pieces|points)\.(\d+)/.exec(path) ?? [];
    if (list === undefined) return message;
    return `${list === "pieces" ? "Range" : "Point"} ${Number(index) + 1}: ${message}`;
  });
}
