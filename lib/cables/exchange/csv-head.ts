/** The head of a table -> what each column is about, in which unit. Pure. */
import { ownColumn } from "@/lib/cables/exchange/csv-own-row";
import type { OwnColumn } from "@/lib/cables/exchange/csv-columns";
import { meaningOf, plainHead, type Meaning } from "@/lib/cables/exchange/head-names";
import { isUnitOf } from "@/lib/cables/exchange/unit";
import type { QuantityKind } from "@/lib/format/unit-spelling";

export type ColumnRead = { at: number; head: string } & (
  | { is: "own"; column: OwnColumn }
  | { is: "foreign"; meaning: Meaning; kind?: QuantityKind; unit?: string; frequencyHz?: number; isLimit?: boolean }
  | { is: "unknown" }
);

const lossName = /\b(loss|losses|attenuation|att|atten|alpha)\b|α|\b(db|np)\s*\//i;
const lossUnit = /(?:m?db|np|neper)\s*\/\s*(?:\d+\s*)?(?:km|m|ft|kft|yd|feet|foot|metres?|meters?)\b/i;
const frequencyIn = /(\d+(?:[.,]\d+)?)\s*(k|m|g)?hz\b/i;
const sizes: Record<string, number> = { "": 0, k: 3, m: 6, g: 9 };

/** The unit in brackets, else what stands behind the name. */
function parted(head: string): { name: string; unit: string | undefined } {
  const bracketed = /^(.*?)[[(]([^\])]*)[\])]\s*(.*)$/.exec(head);
  if (!bracketed) return { name: head, unit: undefined };
  return { name: `${bracketed[1]} ${bracketed[3]}`, unit: bracketed[2]?.trim() };
}

/** "att 100 MHz dB/100ft", "Loss @ 0.45 GHz [dB/100 m]". */
function lossColumn(head: string): Omit<Extract<ColumnRead, { is: "foreign" }>, "at" | "head"> | undefined {
  const found = frequencyIn.exec(head);
  if (!found || !lossName.test(head)) return undefined;
  const frequencyHz = Number(`${found[1]?.replace(",", ".")}e${sizes[(found[2] ?? "").toLowerCase()]}`);
  const unit = lossUnit.exec(head.replace(found[0], " "))?.[0];
  const isLimit = /\bmax(imum)?\b|≤|<=/i.test(head);
  return { is: "foreign", meaning: "loss", kind: "lossPerLength", unit, frequencyHz, isLimit };
}

/** A name with its unit behind it and no brackets: "Capacitance pF/ft". */
function unbracketed(name: string): { known: ReturnType<typeof meaningOf>; unit: string | undefined } {
  const whole = meaningOf(plainHead(name));
  if (whole) return { known: whole, unit: undefined };
  const words = plainHead(name).split(" ");
  const raw = name.trim().split(/[\s_]+/);
  for (let count = words.length; count > 0; count--) {
    const known = meaningOf(words.slice(0, count).join(" "));
    const unit = raw.slice(count).join(" ");
    if (known && (unit === "" || isUnit(known.kind, unit))) return { known, unit: unit || undefined };
  }
  return { known: undefined, unit: undefined };
}

/** A unit of the kind; of a velocity factor, per cent. */
function isUnit(kind: QuantityKind | undefined, unit: string): boolean {
  return kind === undefined ? /^(%|per ?cent)$/i.test(unit) : isUnitOf(kind, unit);
}

function foreign(head: string): Omit<Extract<ColumnRead, { is: "foreign" }>, "at" | "head"> | undefined {
  const loss = lossColumn(head);
  if (loss) return loss;
  const { name, unit } = parted(head);
  const { known, unit: behind } = unbracketed(name);
  if (!known) return undefined;
  const told = unit === undefined || unit === "" ? behind : unit;
  const isTold = told !== undefined && isUnit(known.kind, told);
  return { is: "foreign", meaning: known.meaning, kind: known.kind, unit: isTold ? told : known.usual };
}

/** Whether a table is one that was taken out of here: its rows hold the model itself. */
export function isOwnTable(heads: readonly string[]): boolean {
  return heads.some((head) => ownColumn(head)?.path === "model.lInfHPerM");
}

/** @param isOwn - whether columns of ours are meant where a head is called like one */
export function readHead(heads: readonly string[], isOwn: boolean): ColumnRead[] {
  return heads.map((head, at): ColumnRead => {
    const column = isOwn ? ownColumn(head) : undefined;
    if (column) return { at, head, is: "own", column };
    const read = foreign(head.trim());
    return read ? { at, head, ...read } : { at, head, is: "unknown" };
  });
}
