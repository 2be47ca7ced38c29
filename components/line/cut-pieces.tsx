/** What a match is made of, in its small drawing. */
import { CableLengthwise } from "@/components/line/cable-lengthwise";
import type { DrawnCable } from "@/components/line/cable-shape";
import { cutFrame, type CutItem, type StubHang } from "@/components/line/cut-layout";
import { CutStub } from "@/components/line/cut-stub";
import { CutWords, Dimension } from "@/components/line/dimension";
import { Box, Joint, Plate, SeriesPart, ShuntPart, Transformer } from "@/components/line/symbols";
import { cutLength, digits, inWords, scaled } from "@/lib/format/quantity";
import type { PartElement } from "@/lib/line/element";

const { axisY: y } = cutFrame;

/** The part as a symbol and its value. */
function partFigure({ rOhm, lH, cF }: PartElement) {
  if (lH !== undefined) return { shape: "coil", figure: scaled("inductance", lH, 3) } as const;
  if (cF !== undefined) return { shape: "capacitor", figure: scaled("capacitance", cF, 3) } as const;
  return { shape: "resistor", figure: scaled("resistance", rOhm, 3) } as const;
}

interface PartProps {
  part: PartElement;
  x: number;
  reach: number;
  /** another part across follows toward the load */
  isLeft: boolean;
}

function Part({ part, x, reach, isLeft }: PartProps) {
  const { shape, figure } = partFigure(part);
  if (part.connection === "series") {
    return (
      <g>
        <SeriesPart x={x} y={y} part={shape} reach={reach} />
        <CutWords x={x} y={y - 14} figure={figure} />
      </g>
    );
  }
  // Beside the load there is no room to the right.
  const isByTheEdge = isLeft || x > cutFrame.loadX - 60;
  return (
    <g>
      <path d={`M${x - reach} ${y}H${x + reach}`} stroke="var(--ink)" strokeWidth="1.6" />
      <ShuntPart x={x} y={y} part={shape} half={0} />
      <CutWords x={isByTheEdge ? x - 13 : x + 14} y={y + 24} figure={figure} anchor={isByTheEdge ? "end" : "start"} />
    </g>
  );
}

interface GroupProps {
  fromX: number;
  toX: number;
  cables: DrawnCable[];
  lengthM: number;
  /** of the second cable, where it is not that of the first */
  otherM?: number | undefined;
  mmToPx: number;
}

/** Cables side by side between two plates, with one dimension under them. */
function Group({ fromX, toX, cables, lengthM, otherM, mmToPx }: GroupProps) {
  const drawn = cables.slice(0, 3);
  const half = drawn.length * 7.5 + 3;
  const at = (i: number) => y + (i - (drawn.length - 1) / 2) * 15;
  const alike = cables.length === 2 ? "both" : `all ${cables.length}`;
  const words = otherM === undefined ? alike : `below ${inWords(cutLength(otherM))}`;
  return (
    <g>
      {drawn.map((cable, i) => (
        <CableLengthwise key={i} {...cable} fromX={fromX + 4} toX={toX - 4} y={at(i)} mmToPx={mmToPx} />
      ))}
      <Plate x={fromX + 4} y={y} half={half} />
      <Plate x={toX - 4} y={y} half={half} />
      <Dimension fromX={fromX} toX={toX} y={y + half + 14} figure={cutLength(lengthM)} note={words} isBelow />
    </g>
  );
}

interface CutElementProps<L> {
  item: CutItem<L>;
  hang: StubHang;
  /** of a part across the line: another one follows toward the load */
  isLeft: boolean;
  draw: (line: L) => DrawnCable;
  mmToPx: number;
}

/** What takes length along the line. */
function Laid<L>({ item: { element, fromX, toX }, draw, mmToPx }: CutElementProps<L>) {
  const at = { fromX, toX, mmToPx };
  if (element.kind === "parallel") {
    const [first, second] = element.branches.map(({ lengthM }) => lengthM);
    const otherM = second === first ? undefined : second;
    const cables = element.branches.map(({ line }) => draw(line));
    return <Group {...at} cables={cables} lengthM={first ?? 0} otherM={otherM} />;
  }
  if (element.kind !== "cable") return null;
  const count = element.paralleled ?? 1;
  if (count > 1)
    return <Group {...at} cables={Array.from({ length: count }, () => draw(element.line))} lengthM={element.lengthM} />;
  return (
    <g>
      <CableLengthwise {...draw(element.line)} {...at} y={y} />
      <Dimension fromX={fromX} toX={toX} y={32} figure={cutLength(element.lengthM)} />
    </g>
  );
}

/** One element of a match. */
export function CutElement<L>(props: CutElementProps<L>) {
  const { element, fromX, toX } = props.item;
  const x = (fromX + toX) / 2;
  switch (element.kind) {
    case "cable":
    case "parallel":
      return <Laid {...props} />;
    case "stub":
      return (
        <CutStub
          element={element}
          x={x}
          y={y}
          hang={props.hang}
          cable={props.draw(element.line)}
          mmToPx={props.mmToPx}
        />
      );
    case "part":
      return <Part part={element} x={x} reach={(toX - fromX) / 2 + 5} isLeft={props.isLeft} />;
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
