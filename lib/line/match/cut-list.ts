import type { Element, Line } from "@/lib/line/element";
import { nominalFigures } from "@/lib/line/cable";
import type { DesignPoint } from "@/lib/line/match/design-point";
import type { Cut } from "@/lib/line/match/match-request";
import { ohmText } from "@/lib/line/match/wording";

/** The pieces of cable of a network, from the target side to the load, each with what is to be cut. */
export function cutsOf(elements: readonly Element[], point: DesignPoint): Cut[] {
  const { endAllowanceM = 0 } = point.request;
  return elements.flatMap((element): Cut[] => {
    if (element.kind !== "cable" && element.kind !== "stub") return [];
    const { name = "", line, lengthM, paralleled: count = 1 } = element;
    const left = lengthM - endAllowanceM;
    return [{ name, line: labelOf(line, point), count, lengthM, cutM: left > 0 ? left : null }];
  });
}

function labelOf(line: Line, { lines, feeder }: DesignPoint): string {
  const known = [...lines, ...(feeder ? [feeder] : [])].find((each) => each.line === line);
  return known?.label ?? `ideal line of ${ohmText(nominalFigures(line.model).z0)}`;
}
