import { CableLengthwise } from "@/components/line/cable-lengthwise";
import type { DrawnCable } from "@/components/line/cable-shape";
import { cutFrame, cutLayout, hangOf, type CutItem, type StubHang } from "@/components/line/cut-layout";
import { CutStub } from "@/components/line/cut-stub";
import { CutWords, Dimension } from "@/components/line/dimension";
import { LoadSymbol } from "@/components/line/end-symbols";
import type { StripEnd } from "@/components/line/strip-piece";
import { Box, Joint, Plate, SeriesPart, ShuntPart, Transformer } from "@/components/line/symbols";
import { cutLength, digits, scaled } from "@/lib/format/quantity";
import type { Element, PartElement } from "@/lib/line/element";

interface CutDrawingProps<L> {
  /** the match alone, from source to load */
  elements: readonly Element<L>[];
  load: StripEnd["kind"];
  /** how a line is drawn; without it a plain coaxial cable */
  cableOf?: (line: L) => DrawnCable | undefined;
  /** the cut in one sentence, for a screen reader */
  name: string;
}

const { axisY: y } = cutFrame;

const plainCoax: DrawnCable = {
  construction: { kind: "coax", innerMm: 0.9, dielectricMm: 3.15, relativePermittivity: 2.3, lossTangent: 0 },
  build: null,
  outerDiameterMm: 5,
};
const mmToPx = 2.3;

/** The engine part as a symbol and its value. */
function partFigure({ rOhm, lH, cF }: PartElement) {
  if (lH !== undefined) return { shape: "coil", figure: scaled("inductance", lH, 3) } as const;
  if (cF !== undefined) return { shape: "capacitor", figure: scaled("capacitance", cF, 3) } as const;
  return { shape: "resistor", figure: scaled("resistance", rOhm, 3) } as const;
}

function Part({ part, x, reach }: { part: PartElement; x: number; reach: number }) {
  const { shape, figure } = partFigure(part);
  if (part.connection === "shunt") {
    return (
      <g>
        <path d={`M${x - reach} ${y}H${x + reach}`} stroke="var(--ink)" strokeWidth="1.6" />
        <ShuntPart x={x} y={y} part={shape} half={0} />
        <CutWords x={x + 14} y={y + 24} figure={figure} anchor="start" />
      </g>
    );
  }
  return (
    <g>
      <SeriesPart x={x} y={y} part={shape} reach={reach} />
      <CutWords x={x} y={y - 14} figure={figure} />
    </g>
  );
}

interface ItemProps<L> {
  item: CutItem<L>;
  hang: StubHang;
  draw: (line: L) => DrawnCable;
}

/** Cables side by side between two plates, with one dimension under them. */
function Group({ fromX, toX, cables, lengthM }: { fromX: number; toX: number; cables: DrawnCable[]; lengthM: number }) {
  const drawn = cables.slice(0, 3);
  const half = drawn.length * 7.5 + 3;
  const words = cables.length === 2 ? "both" : `all ${cables.length}`;
  return (
    <g>
      {drawn.map((cable, i) => (
        <CableLengthwise
          key={i}
          {...cable}
          fromX={fromX + 4}
          toX={toX - 4}
          y={y + (i - (drawn.length - 1) / 2) * 15}
          mmToPx={mmToPx}
        />
      ))}
      <Plate x={fromX + 4} y={y} half={half} />
      <Plate x={toX - 4} y={y} half={half} />
      <Dimension fromX={fromX} toX={toX} y={y + half + 14} figure={cutLength(lengthM)} note={words} isBelow />
    </g>
  );
}

function CutElement<L>({ item, hang, draw }: ItemProps<L>) {
  const { element, fromX, toX } = item;
  const x = (fromX + toX) / 2;
  switch (element.kind) {
    case "cable":
      if ((element.paralleled ?? 1) > 1)
        return (
          <Group
            fromX={fromX}
            toX={toX}
            cables={Array.from({ length: element.paralleled ?? 1 }, () => draw(element.line))}
            lengthM={element.lengthM}
          />
        );
      return (
        <g>
          <CableLengthwise {...draw(element.line)} fromX={fromX} toX={toX} y={y} mmToPx={mmToPx} />
          <Dimension fromX={fromX} toX={toX} y={32} figure={cutLength(element.lengthM)} />
        </g>
      );
    case "parallel":
      return (
        <Group
          fromX={fromX}
          toX={toX}
          cables={element.branches.map(({ line }) => draw(line))}
          lengthM={element.branches[0]?.lengthM ?? 0}
        />
      );
    case "stub":
      return <CutStub element={element} x={x} y={y} hang={hang} cable={draw(element.line)} mmToPx={mmToPx} />;
    case "part":
      return <Part part={element} x={x} reach={(toX - fromX) / 2 + 5} />;
    case "pad":
      return <Box x={x} y={y} inside={`${digits(element.lossDb, 1)} dB`} width={toX - fromX} />;
    case "joint":
      return <Joint x={x} y={y} half={13} />;
    case "shunt":
      return <ShuntPart x={x} y={y} part="resistor" half={7} />;
    case "transformer":
      return <Transformer x={x} y={y} />;
  }
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
  return (
    <rect
      x={first.fromX - 9}
      y="24"
      width={last.toX - first.fromX + 18}
      height="72"
      fill="none"
      stroke="var(--rule)"
      strokeWidth="1.2"
      strokeDasharray="3 3"
    />
  );
}

/** The small drawing of a match: what to cut, how it is joined, in one proportion. */
export function CutDrawing<L>({ elements, load, cableOf, name }: CutDrawingProps<L>) {
  const layout = cutLayout(elements);
  const draw = (line: L) => cableOf?.(line) ?? plainCoax;
  const order = [...layout.items.keys()].sort(
    (a, b) => Number(layout.items[a]?.element.kind !== "cable") - Number(layout.items[b]?.element.kind !== "cable"),
  );
  return (
    <svg
      width="100%"
      viewBox={`0 0 ${cutFrame.width} ${cutFrame.height}`}
      role="img"
      aria-label={name}
      className="block max-w-full overflow-visible"
    >
      <CableLengthwise {...plainCoax} fromX={cutFrame.leadX} toX={layout.startX} y={y} mmToPx={mmToPx} />
      <path d={`M${cutFrame.leadX - 2} ${y - 12}q6 6 0 12t0 12`} fill="none" stroke="var(--ink)" strokeWidth="1.2" />
      {order.map((index) => {
        const item = layout.items[index];
        return item ? <CutElement key={index} item={item} hang={hangOf(layout, index)} draw={draw} /> : null;
      })}
      {seams(layout.items).map((x) => (
        <path key={x} d={`M${x} ${y - 9}v18`} stroke="var(--ink)" strokeWidth="1.4" />
      ))}
      <PartsBox items={layout.items} />
      <LoadSymbol x={cutFrame.loadX} y={y} kind={load} />
    </svg>
  );
}
