/** A run as the strip draws it: elements with their names, sizes and sentences. */
import type { StripEnd, StripPiece } from "@/components/line/strip-piece";
import type { CableLine } from "@/lib/cables/line";
import {
  decibels,
  impedance,
  metres,
  nanoseconds,
  scaled,
  significantDigits,
  spoken,
  type Figure,
} from "@/lib/format/quantity";
import type { PieceFigures } from "@/lib/runs/analysis";
import type { Faults, RunDraft } from "@/lib/runs/edit";
import { terminationWords } from "@/lib/runs/leaf/termination-fields";
import type { Termination } from "@/lib/line/element";
import type { Element, LineRef } from "@/lib/runs/circuit-schema";

type Lines = ReadonlyMap<string, CableLine>;

export function lineNamed(line: LineRef, lines: Lines): CableLine | undefined {
  return "cableId" in line ? lines.get(line.cableId) : undefined;
}

function designation(line: LineRef, lines: Lines): string {
  return "cableId" in line ? (lines.get(line.cableId)?.designation ?? "unknown cable") : "own model";
}

const kindNames: Record<Element["kind"], string> = {
  cable: "Cable",
  parallel: "Cables in parallel",
  stub: "Stub",
  shunt: "Across the line",
  part: "Part",
  pad: "Pad",
  joint: "Joint",
  transformer: "Transformer",
};

/** What a piece is called: its own name, else the cable's, else its kind with its place among its kind. */
export function pieceName(elements: readonly Element[], index: number, lines: Lines): string {
  const element = elements[index];
  if (!element) return "";
  if (element.name) return element.name;
  if (element.kind === "cable") return designation(element.line, lines);
  if (element.kind === "part") return partFigure(element).name;
  const same = elements.filter((other) => other.kind === element.kind);
  return same.length > 1 ? `${kindNames[element.kind]} ${same.indexOf(element) + 1}` : kindNames[element.kind];
}

function partFigure(part: Extract<Element, { kind: "part" }>): {
  name: string;
  figure: Figure;
  part: StripPiece["part"];
} {
  if (part.lH !== undefined) return { name: "Coil", figure: scaled("inductance", part.lH, 3), part: "coil" };
  if (part.cF !== undefined) return { name: "Capacitor", figure: scaled("capacitance", part.cF, 3), part: "capacitor" };
  return { name: "Resistor", figure: scaled("resistance", part.rOhm, 3), part: "resistor" };
}

const shortFigure = ({ digits, unit }: Figure) => ({ digits, unit });

function stubEnd(element: Extract<Element, { kind: "stub" }>): StripPiece["end"] {
  if (element.end === "open" || element.end === "short") return element.end;
  return element.end.kind === "open" || element.end.kind === "short" ? element.end.kind : "load";
}

/** What only this kind of element adds to its drawing. */
function drawing(element: Element, lines: Lines, figures: PieceFigures | undefined): Partial<StripPiece> {
  switch (element.kind) {
    case "cable": {
      const length = shortFigure(metres(element.lengthM));
      const delay = figures ? [shortFigure(nanoseconds(figures.delayS))] : [];
      return {
        lengthM: element.lengthM,
        cable: lineNamed(element.line, lines),
        count: element.paralleled ?? 1,
        figures: [length, ...delay],
      };
    }
    case "parallel": {
      const first = element.branches[0];
      return {
        lengthM: first?.lengthM ?? null,
        cable: first && lineNamed(first.line, lines),
        count: element.branches.length,
      };
    }
    case "stub":
      return {
        cable: lineNamed(element.line, lines),
        connection: element.connection,
        end: stubEnd(element),
        figures: [shortFigure(metres(element.lengthM, 3))],
      };
    case "shunt":
      return {
        end:
          element.termination.kind === "open" || element.termination.kind === "short"
            ? element.termination.kind
            : "load",
      };
    case "part": {
      const { figure, part } = partFigure(element);
      return { part, connection: element.connection, figures: [shortFigure(figure)] };
    }
    case "pad":
      return { inside: `${significantDigits(element.lossDb, 2)} dB` };
    case "transformer":
      return { inside: `${significantDigits(element.turnsRatio, 3)} : 1` };
    case "joint":
      return {};
  }
}

function sentence(name: string, element: Element, figures: PieceFigures | undefined): string {
  const parts = [name];
  if ("lengthM" in element) parts.push(spoken(metres(element.lengthM)));
  if (figures?.delayS != null) parts.push(spoken(nanoseconds(figures.delayS)));
  if (figures) parts.push(spoken(decibels(figures.matchedLossDb)));
  return parts.join(", ");
}

function faultOf(faults: Faults, index: number): { words: string; isLength: boolean } | undefined {
  const path = Object.keys(faults).find((key) => key.startsWith(`elements.${index}.`));
  if (!path) return undefined;
  const isLength = path.endsWith(".lengthM");
  return {
    words: isLength ? (faults[path]?.text.trim() ? "length not readable" : "length missing") : "value not readable",
    isLength,
  };
}

/** The pieces of a run. `pieces` of the analysis may be missing while something cannot be worked out. */
export function stripPieces(
  draft: RunDraft,
  lines: Lines,
  faults: Faults,
  figures: readonly PieceFigures[] | undefined,
): StripPiece[] {
  const { elements } = draft.circuit;
  return elements.map((element, index) => {
    const name = pieceName(elements, index, lines);
    const fault = faultOf(faults, index);
    const piece: StripPiece = {
      id: `${index}-${element.kind}`,
      kind: element.kind,
      label: element.kind === "cable" ? designation(element.line, lines) : name,
      ...drawing(element, lines, figures?.[index]),
      spoken: sentence(name, element, figures?.[index]),
    };
    if (!fault) return piece;
    return { ...piece, fault: fault.words, ...(fault.isLength && piece.kind === "cable" && { lengthM: null }) };
  });
}

export function terminationFigures(termination: Termination): { digits: string; unit: string }[] {
  if (termination.kind === "constant")
    return [shortFigure(impedance({ re: termination.reOhm, im: termination.imOhm }))];
  return [{ digits: "", unit: terminationWords(termination) }];
}

/** The ends of the strip. An antenna is drawn where the load is called one. */
export function stripEnds(draft: RunDraft): { source: StripEnd; load: StripEnd } {
  const { source, load } = draft.circuit;
  const isAntenna = /antenna|aerial|whip|dipole|loop/i.test(draft.loadName);
  const kind = load.kind === "open" || load.kind === "short" ? load.kind : isAntenna ? "antenna" : "resistor";
  return {
    source: { kind: "generator", label: draft.sourceName || "Source", figures: terminationFigures(source) },
    load: { kind, label: draft.loadName || "Load", figures: terminationFigures(load) },
  };
}
