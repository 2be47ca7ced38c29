import { CableLengthwise } from "@/components/line/cable-lengthwise";
import { cableShape, type DrawnCable } from "@/components/line/cable-shape";
import { cutFrame, cutLayout, hangOf, isLeftOfAnother, teeLinks, type CutItem } from "@/components/line/cut-layout";
import { CutElement } from "@/components/line/cut-pieces";
import { LoadSymbol } from "@/components/line/end-symbols";
import type { StripEnd } from "@/components/line/strip-piece";
import type { Element } from "@/lib/line/element";

interface CutDrawingProps<L> {
  /** the match alone, from source to load */
  elements: readonly Element<L>[];
  load: StripEnd["kind"];
  /** how a line is drawn; without it a plain coaxial cable */
  cableOf?: (line: L) => DrawnCable | undefined;
  /** the run's own cable, that comes up to the match; without it the first cable of the match */
  lead?: DrawnCable;
  /** the run's cable that goes on from the match, where it does not stand at the load */
  onward?: DrawnCable;
  /** the cut in one sentence, for a screen reader */
  name: string;
}

const { axisY: y } = cutFrame;

export const plainCoax: DrawnCable = {
  construction: { kind: "coax", innerMm: 0.9, dielectricMm: 3.15, relativePermittivity: 2.3, lossTangent: 0 },
  build: null,
  outerDiameterMm: 5,
};

/** The thickest cable of a drawing is this thick, px. */
const thickestPx = 12;

/** The lines an element is made of. */
function linesOf<L>(element: Element<L>): L[] {
  if (element.kind === "cable" || element.kind === "stub") return [element.line];
  return element.kind === "parallel" ? element.branches.map(({ line }) => line) : [];
}

/** Where one cable meets another with nothing between. */
function seams<L>(items: readonly CutItem<L>[]): number[] {
  return items
    .filter(({ element }, i) => element.kind === "cable" && (i === 0 || items[i - 1]?.element.kind === "cable"))
    .map(({ fromX }) => fromX);
}

/** Parts that stand together go in one box. */
function PartsBox<L>({ items }: { items: readonly CutItem<L>[] }) {
  const parts = items.filter(({ element }) => element.kind === "part");
  const [first, last] = [parts[0], parts.at(-1)];
  if (!first || !last) return null;
  const [from, to] = [first.fromX - 9, last.toX + 9];
  return (
    <rect
      x={from}
      y="24"
      width={to - from}
      height="72"
      fill="none"
      stroke="var(--rule)"
      strokeWidth="1.2"
      strokeDasharray="3 3"
    />
  );
}

/** Cables first, so that tees and plates stand over them. */
function drawingOrder<L>(items: readonly CutItem<L>[]): number[] {
  const isOver = (index: number) => Number(items[index]?.element.kind !== "cable");
  return [...items.keys()].sort((a, b) => isOver(a) - isOver(b));
}

/** The run goes on: a stretch of its cable, broken off as it is at the other side. */
function Onward({ cable, mmToPx }: { cable: DrawnCable; mmToPx: number }) {
  const { loadX, width } = cutFrame;
  const toX = width - 8;
  return (
    <g>
      <CableLengthwise {...cable} fromX={loadX} toX={toX} y={y} mmToPx={mmToPx} />
      <path d={`M${loadX} ${y - 9}v18`} stroke="var(--ink)" strokeWidth="1.4" />
      <path d={`M${toX + 2} ${y - 12}q-6 6 0 12t0 12`} fill="none" stroke="var(--ink)" strokeWidth="1.2" />
    </g>
  );
}

/** The small drawing of a match: what to cut, how it is joined, in one proportion. */
export function CutDrawing<L>({ elements, load, cableOf, lead, onward, name }: CutDrawingProps<L>) {
  const layout = cutLayout(elements);
  const draw = (line: L) => cableOf?.(line) ?? plainCoax;
  const own = elements.flatMap(linesOf).map(draw);
  const leading = lead ?? own[0] ?? plainCoax;
  const cables = [leading, ...own, ...(onward ? [onward] : [])];
  const mmToPx = thickestPx / Math.max(...cables.map((cable) => cableShape(cable)?.outerMm ?? 5));
  const { width, height, leadX, loadX } = cutFrame;
  return (
    <svg
      width="100%"
      viewBox={`0 0 ${width} ${height}`}
      role="img"
      aria-label={name}
      className="block max-w-full overflow-visible"
    >
      <CableLengthwise {...leading} fromX={leadX} toX={layout.startX} y={y} mmToPx={mmToPx} />
      <path d={`M${leadX - 2} ${y - 12}q6 6 0 12t0 12`} fill="none" stroke="var(--ink)" strokeWidth="1.2" />
      {teeLinks(layout).map(([from, to]) => (
        <path key={from} d={`M${from} ${y}H${to}`} stroke="var(--conductor)" strokeWidth="2.4" />
      ))}
      {drawingOrder(layout.items).map((index) => {
        const item = layout.items[index];
        const shape = { hang: hangOf(layout, index), isLeft: isLeftOfAnother(layout, index) };
        return item && <CutElement key={index} item={item} {...shape} draw={draw} mmToPx={mmToPx} />;
      })}
      {seams(layout.items).map((x) => (
        <path key={x} d={`M${x} ${y - 9}v18`} stroke="var(--ink)" strokeWidth="1.4" />
      ))}
      <PartsBox items={layout.items} />
      {onward ? <Onward cable={onward} mmToPx={mmToPx} /> : <LoadSymbol x={loadX} y={y} kind={load} />}
    </svg>
  );
}
