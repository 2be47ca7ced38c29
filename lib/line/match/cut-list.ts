import type { Element, Line } from "@/lib/line/element";
import { nominalFigures } from "@/lib/line/cable";
import type { DesignPoint } from "@/lib/line/match/design-point";
import type { Cut } from "@/lib/line/match/match-request";
import { trimPerMetre } from "@/lib/line/match/trim";
import { ohmText } from "@/lib/line/match/wording";

/** Below this return loss at the design frequency, dB, there is no one best frequency to trim to. */
const exactDb = 60;

/**
 * The pieces of cable of a network, from the target side to the load, each with what is to be cut and which way the match
 * moves when it is trimmed by itself.
 * @param designReturnLossDb - of the network; null where it is exact
 */
export function cutsOf(elements: readonly Element[], point: DesignPoint, designReturnLossDb: number | null): Cut[] {
  const isExact = (designReturnLossDb ?? Infinity) >= exactDb;
  return elements.flatMap((element, k) =>
    piecesOf(element).map(({ line, lengthM, count, of }): Cut => {
      const build = (length: number) => elements.map((each, n) => (n === k ? of(length) : each));
      const left = lengthM - (point.request.endAllowanceM ?? 0);
      return {
        name: element.name ?? "",
        line: labelOf(line, point),
        count,
        lengthM,
        cutM: left > 0 ? left : null,
        trimHzPerM: (isExact ? trimPerMetre(point, build, lengthM) : undefined) ?? null,
      };
    }),
  );
}

interface Piece {
  line: Line;
  lengthM: number;
  count: number;
  /** the element with this piece of another length */
  of: (lengthM: number) => Element;
}

function piecesOf(element: Element): Piece[] {
  if (element.kind === "parallel") {
    const { branches } = element;
    const made = (k: number, lengthM: number) => branches.map((each, n) => (n === k ? { ...each, lengthM } : each));
    return branches.map(({ line, lengthM }, k) => ({
      line,
      lengthM,
      count: 1,
      of: (length) => ({ ...element, branches: made(k, length) }),
    }));
  }
  if (element.kind !== "cable" && element.kind !== "stub") return [];
  const { line, lengthM, paralleled: count = 1 } = element;
  return [{ line, lengthM, count, of: (length) => ({ ...element, lengthM: length }) }];
}

function labelOf(line: Line, { lines, feeder }: DesignPoint): string {
  const known = [...lines, ...(feeder ? [feeder] : [])].find((each) => each.line === line);
  return known?.label ?? `ideal line of ${ohmText(nominalFigures(line.model).z0)}`;
}
