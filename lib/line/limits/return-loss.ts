/** Return loss of balanced cable, permanent links and channels. */
import type { LimitPiece, StandardLimit } from "@/lib/line/limits/limit-line";

const origin = {
  standard: "ANSI/TIA-568-C.2",
  edition: "2009",
  clause: null,
  quantity: "returnLoss",
  bound: "atLeast",
  unit: "dB",
  scale: 1,
  temperatureC: null,
  source: "recalled",
  seen: "memory",
} as const;

const flat = (fromMhz: number, toMhz: number, constant: number): LimitPiece => ({ fromMhz, toMhz, constant });
const slope = (fromMhz: number, toMhz: number, constant: number, perDecade: number, at = 1): LimitPiece => ({
  ...flat(fromMhz, toMhz, constant),
  perDecade,
  at,
});

type Limited = "cable" | "channel" | "permanentLink";
const limit = (id: string, category: string, object: Limited, ...pieces: LimitPiece[]): StandardLimit => ({
  ...origin,
  id,
  category,
  object,
  lengthM: object === "cable" ? 100 : null,
  pieces,
});

const cable = (to: number) => [slope(1, 10, 20, 5), flat(10, 20, 25), slope(20, to, 25, -7, 20)];
const channel6 = (to: number) => [flat(1, 10, 19), slope(10, 40, 24, -5), slope(40, to, 32, -10)];

export const returnLossLimits: readonly StandardLimit[] = [
  limit("cat5eCableReturnLoss", "5e", "cable", ...cable(100)),
  limit("cat6CableReturnLoss", "6", "cable", ...cable(250)),
  limit("cat5eChannelReturnLoss", "5e", "channel", flat(1, 20, 17), slope(20, 100, 17, -10, 20)),
  limit("cat5eLinkReturnLoss", "5e", "permanentLink", flat(1, 20, 19), slope(20, 100, 19, -10, 20)),
  limit("cat6ChannelReturnLoss", "6", "channel", ...channel6(250)),
  limit(
    "cat6LinkReturnLoss",
    "6",
    "permanentLink",
    slope(1, 3, 21, 4, 3),
    flat(3, 10, 21),
    slope(10, 40, 26, -5),
    slope(40, 250, 34, -10),
  ),
  limit("cat6aChannelReturnLoss", "6A", "channel", ...channel6(398.1), flat(398.1, 500, 6)),
];

/**
 * Below this insertion loss field testers do not judge return loss, dB.
 * Source: ISO/IEC 11801 and EN 50173-1, known from field-test practice; the clause was not seen.
 */
export const returnLossUnjudgedBelowDb = 3;
