import type { Element, Line } from "@/lib/line/element";
import { nominalFigures } from "@/lib/line/cable";
import type { DesignPoint } from "@/lib/line/match/design-point";
import type { Cut } from "@/lib/line/match/match-request";
import { ohmText } from "@/lib/line/match/wording";

/** The pieces of cable of a network, from the target side to the load, each with what is to be cut. */
export function cutsOf(elements: readonly Element[], point: DesignPoint): Cut[] {
  const cut = (name: string, line: Line, lengthM: number, count = 1): Cut => {
    const left = lengthM - (point.request.endAllowanceM ?? 0);
    return { name, line: labelOf(line, point), count, lengthM, cutM: left > 0 ? left : null };
  };
  return elements.flatMap((element): Cut[] => {
    const { name = "" } = element;
    if (element.kind === "parallel") return element.branches.map(({ line, lengthM }) => cut(name, line, lengthM));
    if (element.kind !== "cable" && element.kind !== "stub") return [];
    return [cut(name, element.line, element.lengthM, element.paralleled)];
  });
}

function labelOf(line: Line, { lines, feeder }: DesignPoint): string {
  const known = [...lines, ...(feeder ? [feeder] : [])].find((each) => each.line === line);
  return known?.label ?? `ideal line of ${ohmText(nominalFigures(line.model).z0)}`;
}
