/** Delay, skew and dc resistance of balanced cabling, and what older Ethernet segments allow. */
import type { LimitPiece, StandardLimit } from "@/lib/line/limits/limit-line";

const tia = { standard: "ANSI/TIA-568-C.2", edition: "2009", clause: null } as const;
const iso = { standard: "ISO/IEC 11801", edition: "2nd edition, 2002", clause: null } as const;
const recalled = { source: "recalled", seen: "memory" } as const;
const trulove = { source: "J. Trulove, LAN Wiring, 3rd ed., tables 5.1 and 12.7", seen: "secondary" } as const;
const cl8 = {
  standard: "IEEE 802.3",
  edition: "as quoted",
  clause: "8",
  source: "quoted second-hand",
  seen: "secondary",
} as const;

const always = (constant: number): LimitPiece[] => [{ fromMhz: 0, toMhz: Infinity, constant }];
const seconds = { unit: "s", scale: 1e-9, bound: "atMost", temperatureC: null } as const;
const ohms = { unit: "ohm", scale: 1, bound: "atMost", temperatureC: 20 } as const;
const cable = { object: "cable", lengthM: 100 } as const;
const channel = { object: "channel", lengthM: null } as const;

export const delayLimits: readonly StandardLimit[] = [
  {
    id: "cableDelay",
    category: "5e, 6 and 6A",
    ...tia,
    ...cable,
    ...seconds,
    quantity: "delay",
    pieces: [{ fromMhz: 1, toMhz: 500, constant: 534, inverseRoot: 36 }],
    source: "form recalled; 1, 10 and 100 MHz as in J. Trulove, LAN Wiring, 3rd ed., table 12.7",
    seen: "memory",
  },
  {
    id: "cableSkew",
    category: "5e, 6 and 6A",
    ...tia,
    ...cable,
    ...seconds,
    quantity: "delaySkew",
    pieces: always(45),
    ...trulove,
  },
  {
    id: "channelDelay",
    category: "D and E",
    ...iso,
    ...channel,
    ...seconds,
    quantity: "delay",
    pieces: always(548),
    ...trulove,
  },
  {
    id: "classFDelay",
    category: "F",
    ...iso,
    ...channel,
    ...seconds,
    quantity: "delay",
    pieces: always(504),
    ...trulove,
  },
  {
    id: "channelSkew",
    category: "D and E",
    ...iso,
    ...channel,
    ...seconds,
    quantity: "delaySkew",
    pieces: always(50),
    ...trulove,
  },
];

export const dcLimits: readonly StandardLimit[] = [
  {
    id: "conductorDc",
    category: "5e, 6 and 6A",
    ...tia,
    ...cable,
    ...ohms,
    quantity: "conductorDc",
    pieces: always(9.38),
    ...recalled,
  },
  {
    id: "classDLoop",
    category: "D and above",
    ...iso,
    ...channel,
    ...ohms,
    quantity: "dcLoop",
    pieces: always(25),
    ...recalled,
  },
  { id: "classCLoop", category: "C", ...iso, ...channel, ...ohms, quantity: "dcLoop", pieces: always(40), ...recalled },
];

const segment = { ...cl8, category: "10BASE5", object: "segment", lengthM: 500 } as const;

export const segmentLimits: readonly StandardLimit[] = [
  {
    id: "thickEthernetLoss",
    ...segment,
    quantity: "insertionLoss",
    bound: "atMost",
    unit: "dB",
    scale: 1,
    temperatureC: null,
    pieces: [{ fromMhz: 10, toMhz: 10, constant: 8.5 }],
  },
  { id: "thickEthernetDelay", ...segment, ...seconds, quantity: "delay", pieces: always(2165) },
  { id: "thickEthernetLoop", ...segment, ...ohms, quantity: "dcLoop", pieces: always(5) },
  {
    id: "twistedEthernetLoss",
    standard: "IEEE 802.3",
    edition: "as recalled",
    clause: null,
    category: "10BASE-T",
    object: "segment",
    lengthM: null,
    quantity: "insertionLoss",
    bound: "atMost",
    unit: "dB",
    scale: 1,
    temperatureC: null,
    pieces: [{ fromMhz: 5, toMhz: 10, constant: 11.5 }],
    ...recalled,
  },
];
