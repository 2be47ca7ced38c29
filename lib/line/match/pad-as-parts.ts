import type { PadElement, PartElement } from "@/lib/line/element";
import type { MatchPieceName } from "@/lib/line/match/piece-name";
import type { PadResistors } from "@/lib/line/pad";

/**
 * The resistors of a pad as parts, from the source side; arms that are a wire or nothing are left out.
 * @param resistors - ohm, as `padResistors` gives them
 */
export function padAsParts(resistors: PadResistors, topology: NonNullable<PadElement["topology"]>): PartElement[] {
  return resistors.flatMap((rOhm, k): PartElement[] => {
    const connection = (k === 1) === (topology === "T") ? "shunt" : "series";
    if (connection === "series" ? rOhm === 0 : rOhm === Infinity) return [];
    const name = `${connection === "series" ? "Series" : "Shunt"} resistor` satisfies MatchPieceName;
    return [{ kind: "part", name, connection, rOhm }];
  });
}
