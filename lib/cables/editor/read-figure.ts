/** One typed figure -> SI, or a sentence. Loads the reader of units. */
import { figureFields, type FigureField, type FigureName } from "@/lib/cables/editor/fields";
import { brokenBound } from "@/lib/format/bounds";
import { kinds } from "@/lib/format/quantity-kinds";
import { readQuantity, type Read } from "@/lib/format/read-quantity";
import { readVelocityFactor } from "@/lib/format/read-velocity-factor";

const plainNumber = /^[+-]?(\d+\.?\d*|\.\d+)(e[+-]?\d+)?$/i;
const bareNumber = /^[\s\d.,+\-\u2212]*$/;

function readAny({ kind, unit, perUnit }: FigureField, text: string): Read<number> {
  if (kind === "velocity") return readVelocityFactor(text);
  const typed = text.trim().replace(/\u2212/g, "-");
  if (perUnit !== undefined && plainNumber.test(typed)) {
    // The reader of units takes a hundred times as long, and a long table is read at every key.
    const value = Number((Number(typed) * perUnit).toPrecision(15));
    const { digits, unit: shown } = kinds[kind].show(value);
    return { ok: true, value, understood: shown ? `${digits} ${shown}` : digits };
  }
  return readQuantity(kind, bareNumber.test(typed) && unit !== "" ? `${typed} ${unit}` : typed);
}

/** Reads a figure and holds it to its bounds; an empty text is nothing, not a fault. */
export function readFigure(name: FigureName, text: string): Read<number> | undefined {
  if (text.trim() === "") return undefined;
  const field = figureFields[name];
  const read = readAny(field, text);
  const broken = read.ok ? brokenBound(read.value, field.bounds) : null;
  return broken === null ? read : { ok: false, message: broken };
}
