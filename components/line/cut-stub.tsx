import { CableLengthwise } from "@/components/line/cable-lengthwise";
import type { DrawnCable } from "@/components/line/cable-shape";
import type { StubHang } from "@/components/line/cut-layout";
import { CutWords, Dimension } from "@/components/line/dimension";
import { BreakMark, Tee } from "@/components/line/symbols";
import { cutLength } from "@/lib/format/quantity";
import type { StubElement } from "@/lib/line/element";

interface CutStubProps<L> {
  element: StubElement<L>;
  x: number;
  y: number;
  hang: StubHang;
  cable: DrawnCable;
  mmToPx: number;
}

function endWords(end: StubElement["end"]): string {
  if (end === "short") return "shorted";
  return end === "open" ? "open" : "loaded";
}

/** Folded back under the line, its end at the left. */
function Folded<L>({ element, x, y, hang, cable, mmToPx }: CutStubProps<L>) {
  const below = y + 34;
  const end = x - hang.lengthPx;
  return (
    <g>
      <path d={`M${x} ${y}V${below}`} stroke="var(--conductor)" strokeWidth="2.4" />
      <CableLengthwise {...cable} fromX={end} toX={x} y={below} mmToPx={mmToPx} />
      {element.end === "short" && (
        <path d={`M${end} ${below - 8}h-7v16h7`} fill="none" stroke="var(--ink)" strokeWidth="1.8" />
      )}
      <Dimension
        fromX={end}
        toX={x}
        y={below + 22}
        figure={cutLength(element.lengthM)}
        note={endWords(element.end)}
        isBelow
      />
    </g>
  );
}

/** Where the words of a hanging stub begin or end. */
function wordsAt({ words, clearPx, lengthPx }: StubHang, x: number, y: number) {
  const end = y + 8 + lengthPx;
  const beside = Math.max(y + 30, (y + 10 + end) / 2);
  if (words === "left") return { x: x - 16, y: beside, anchor: "end" } as const;
  if (words === "right") return { x: x + 16, y: beside, anchor: "start" } as const;
  if (words === "under") return { x: x - 14, y: end + 16, anchor: "start" } as const;
  return { x: x + 14, y: y + 24 + Math.max(lengthPx, clearPx), anchor: "end" } as const;
}

/** Hanging from the tee, its words beside it. */
function Hanging<L>({ element, x, y, hang, cable, mmToPx }: CutStubProps<L>) {
  const end = y + 8 + hang.lengthPx;
  return (
    <g>
      <g transform={`rotate(90 ${x} ${y})`}>
        <CableLengthwise {...cable} fromX={x + 6} toX={x + 8 + hang.lengthPx} y={y} mmToPx={mmToPx} />
        {hang.isBroken && <BreakMark x={x + 8 + hang.lengthPx / 2} y={y} half={6} />}
      </g>
      {element.end === "short" && <path d={`M${x - 9} ${end}h18`} stroke="var(--ink)" strokeWidth="3" />}
      <CutWords {...wordsAt(hang, x, y)} figure={cutLength(element.lengthM)} note={endWords(element.end)} />
    </g>
  );
}

/** A stub in the drawing of a match. */
export function CutStub<L>(props: CutStubProps<L>) {
  return (
    <g>
      {props.hang.isFolded ? <Folded {...props} /> : <Hanging {...props} />}
      <Tee x={props.x} y={props.y} isSeries={props.element.connection === "series"} />
    </g>
  );
}
