/** The limits of standards on the wire. Pure. */
import type { FormulaPiece, LimitCurve, LimitOf, LimitQuantity } from "@/lib/limit-lines/limit";
import type { LimitLineItem } from "@/lib/limit-lines/schema";
import { checkYourEdition, type LimitPiece, type StandardLimit } from "@/lib/line/limits/limit-line";
import { standardLimits } from "@/lib/line/limits/standard-limits";

const mega = 1e6;

const quantityOf: Record<StandardLimit["quantity"], [LimitQuantity, string]> = {
  insertionLoss: ["insertionLoss", "insertion loss"],
  returnLoss: ["returnLoss", "return loss"],
  delay: ["delay", "delay"],
  delaySkew: ["skew", "skew"],
  dcLoop: ["dcLoop", "loop resistance"],
  conductorDc: ["conductorDc", "conductor resistance"],
};
const objectOf: Record<StandardLimit["object"], [LimitOf, string]> = {
  cable: ["cable", "cable"],
  channel: ["channel", "channel"],
  permanentLink: ["link", "permanent link"],
  segment: ["segment", "segment"],
};
const markOf = { text: "seen", secondary: "quoted", memory: "memory" } as const;

function nameOf({ object, category, quantity, lengthM }: StandardLimit): string {
  const system = /^[A-F]/.test(category) ? "Class" : "Category";
  const whose = object === "segment" ? category : `${system} ${category}`;
  const long = object === "segment" && lengthM !== null ? ` of ${lengthM} m` : "";
  return `${whose} ${objectOf[object][1]}${long}, ${quantityOf[quantity][1]}`;
}

function pieceOf(piece: LimitPiece, scale: number): FormulaPiece {
  const { fromMhz, toMhz, constant = 0, root = 0, linear = 0, inverseRoot = 0, perDecade = 0, at = 1 } = piece;
  const terms = {
    ...{ k0: constant - perDecade * Math.log10(at), k1: root, k2: linear, k3: inverseRoot, kLog: perDecade },
  };
  const given = Object.entries(terms).filter(([, value]) => value !== 0);
  return {
    ...{ fromHz: fromMhz * mega, toHz: toMhz * mega },
    ...Object.fromEntries(given.map(([name, value]) => [name, value * scale])),
  };
}

function curveOf({ pieces, scale }: StandardLimit): LimitCurve {
  const [first] = pieces;
  if (first?.toMhz === Infinity) return { form: "constant", value: (first.constant ?? 0) * scale };
  return { form: "formula", referenceHz: mega, pieces: pieces.map((piece) => pieceOf(piece, scale)) };
}

function noteOf({ seen, source }: StandardLimit): string {
  const known = source === "recalled" ? "" : `${source.charAt(0).toUpperCase()}${source.slice(1)}.`;
  return [seen === "memory" ? checkYourEdition : "", known].filter((part) => part !== "").join(" ");
}

function itemOf(limit: StandardLimit): LimitLineItem {
  const { id, standard, edition, clause, object, quantity, lengthM, seen } = limit;
  const name = nameOf(limit);
  const isShared = standardLimits.some((other) => other !== limit && nameOf(other) === name);
  return {
    ...{
      id,
      name: isShared ? `${name}, ${standard}` : name,
      quantity: quantityOf[quantity][0],
      of: objectOf[object][0],
    },
    ...(object === "cable" && lengthM !== null && { perLengthM: lengthM }),
    curve: curveOf(limit) as LimitLineItem["curve"],
    ...{ source: { title: standard, edition, clause }, note: noteOf(limit) },
    ...{ isStandard: true, mark: markOf[seen], addedByName: null, addedAt: null },
  };
}

/** Those of every standard that is kept. */
export const standardItems: readonly LimitLineItem[] = standardLimits.map(itemOf);
