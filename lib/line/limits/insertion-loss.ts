/** Insertion loss of balanced cable and of channels made of it, 100 m. */
import type { LimitPiece, StandardLimit } from "@/lib/line/limits/limit-line";

const tia = { standard: "ANSI/TIA-568-C.2", edition: "2009", clause: null } as const;
const iso = { standard: "ISO/IEC 11801", edition: "2nd edition, 2002, as quoted in 2004", clause: null } as const;
const recalled = { source: "recalled", seen: "memory" } as const;
const printed = {
  source: "form recalled; values as in J. Trulove, LAN Wiring, 3rd ed., table 15.2",
  seen: "secondary",
} as const;
const quoted = {
  source: "L. Adriaenssens and J. Hulsey, IEEE P802.3an contribution on channel insertion loss, March 2004",
  seen: "secondary",
} as const;

type Origin = Pick<StandardLimit, "standard" | "edition" | "clause" | "source" | "seen">;

function lossOf(
  object: "cable" | "channel",
  id: string,
  category: string,
  origin: Origin,
  piece: LimitPiece,
): StandardLimit {
  const what = { quantity: "insertionLoss", bound: "atMost", unit: "dB", scale: 1, temperatureC: 20 } as const;
  return { id, category, object, ...what, ...origin, lengthM: object === "cable" ? 100 : null, pieces: [piece] };
}

/** k1·√f + k2·f + k3/√f, dB per 100 m at 20 °C. */
const coefficients: readonly [string, string, Origin, number, number, number, number, number][] = [
  ["cat3Cable", "3", { ...tia, ...printed }, 0.064, 16, 2.32, 0.238, 0],
  ["cat5eCable", "5e", { ...tia, ...printed }, 0.064, 100, 1.967, 0.023, 0.05],
  ["cat5IsoCable", "5", { ...iso, ...quoted }, 1, 100, 1.9108, 0.0222, 0.2],
  ["cat6Cable", "6", { ...tia, ...recalled }, 1, 250, 1.808, 0.017, 0.2],
  ["cat6IsoCable", "6", { ...iso, ...quoted }, 1, 250, 1.82, 0.0169, 0.25],
  ["cat6aCable", "6A", { ...tia, ...recalled }, 1, 500, 1.82, 0.0091, 0.25],
  ["cat7Cable", "7", { ...iso, ...quoted }, 1, 600, 1.8, 0.01, 0.2],
  ["cat7aCable", "7A", { ...iso, edition: "2nd edition with amendments", ...recalled }, 1, 1000, 1.8, 0.005, 0.25],
  ["cat8Cable", "8.1 and 8.2", { ...iso, edition: "3rd edition, 2017", ...recalled }, 1, 2000, 1.8, 0.005, 0.25],
];

export const cableLossLimits: readonly StandardLimit[] = coefficients.map(
  ([id, category, origin, fromMhz, toMhz, root, linear, inverseRoot]) =>
    lossOf("cable", id, category, origin, { fromMhz, toMhz, root, linear, inverseRoot }),
);

/**
 * A channel of 90 m of cable, 10 m of cords and four connectors: the cable's loss times a factor for the cords, and a
 * loss in √f for each connector.
 */
function channelOf(cable: string, factor: number, connector: number): LimitPiece {
  const [piece] = cableLossLimits.find(({ id }) => id === cable)?.pieces ?? [];
  if (!piece) throw new Error(`channelOf: there is no cable ${cable}`);
  const { root = 0, linear = 0, inverseRoot = 0 } = piece;
  return {
    ...piece,
    root: factor * root + 4 * connector,
    linear: factor * linear,
    inverseRoot: factor * inverseRoot,
  };
}

export const channelLossLimits: readonly StandardLimit[] = [
  lossOf("channel", "classDChannel", "D", { ...iso, ...quoted }, channelOf("cat5IsoCable", 1.05, 0.04)),
  lossOf("channel", "classEChannel", "E", { ...iso, ...quoted }, channelOf("cat6IsoCable", 1.05, 0.02)),
  lossOf("channel", "classFChannel", "F", { ...iso, ...quoted }, channelOf("cat7Cable", 1.05, 0.02)),
  lossOf("channel", "cat5eChannel", "5e", { ...tia, ...recalled }, channelOf("cat5eCable", 1.02, 0.04)),
  lossOf("channel", "classEaChannel", "EA", { ...iso, ...recalled }, channelOf("cat6aCable", 1.05, 0.02)),
  lossOf("channel", "classFaChannel", "FA", { ...iso, ...recalled }, channelOf("cat7aCable", 1.05, 0.02)),
].map((limit) => ({
  ...limit,
  pieces: limit.pieces.map((piece) => ({ ...piece, fromMhz: Math.max(1, piece.fromMhz) })),
}));
