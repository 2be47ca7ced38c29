import { CutWords } from "@/components/line/dimension";
import { LoadSymbol, SourceSymbol } from "@/components/line/end-symbols";
import { SeriesPart, ShuntPart } from "@/components/line/symbols";
import { scaled, trimmed } from "@/lib/format/quantity";
import type { PadResistors } from "@/lib/line/pad";
import type { PadTopology } from "@/lib/line/pad-parts";

interface Props {
  topology: PadTopology;
  resistors: PadResistors;
  sourceOhm: number;
  loadOhm: number;
  name: string;
}

const [width, height, y] = [430, 128, 50];
const [startX, endX] = [62, 372];
/** Centres of the three resistors. */
const places = { T: [130, 217, 304], pi: [118, 217, 316] } as const;

const ohms = (value: number) => trimmed(scaled("resistance", value, 4));

/** A resistor in the line; one of 0 Ω is a wire. */
function InLine({ x, ohm }: { x: number; ohm: number }) {
  if (ohm === 0) return <path d={`M${x - 29} ${y}H${x + 29}`} stroke="var(--ink)" strokeWidth="1.6" />;
  return (
    <g>
      <SeriesPart x={x} y={y} part="resistor" />
      <CutWords x={x} y={y - 14} figure={ohms(ohm)} />
    </g>
  );
}

/** A resistor across the line; one of infinite resistance is not there. */
function Across({ x, ohm, isLeft = false }: { x: number; ohm: number; isLeft?: boolean }) {
  if (ohm === Infinity) return null;
  return (
    <g>
      <ShuntPart x={x} y={y} part="resistor" half={0} />
      <CutWords x={isLeft ? x - 12 : x + 12} y={y + 24} figure={ohms(ohm)} anchor={isLeft ? "end" : "start"} />
    </g>
  );
}

/** The three resistors of a pad as they are soldered, from source to load. */
export function PadDrawing({ topology, resistors, sourceOhm, loadOhm, name }: Props) {
  const [first, second, third] = resistors;
  const [a, b, c] = places[topology];
  return (
    <svg
      width="100%"
      viewBox={`0 0 ${width} ${height}`}
      role="img"
      aria-label={name}
      className="block max-w-120 overflow-visible"
    >
      <SourceSymbol x={startX} y={y} />
      <path d={`M${startX} ${y}H${a - 29}M${c + 29} ${y}H${endX}`} stroke="var(--ink)" strokeWidth="1.6" />
      <path d={`M${a - 29} ${y}H${c + 29}`} stroke="var(--ink)" strokeWidth={topology === "pi" ? 1.6 : 0} />
      {topology === "T" ? (
        <>
          <path d={`M${a + 29} ${y}H${c - 29}`} stroke="var(--ink)" strokeWidth="1.6" />
          <InLine x={a} ohm={first} />
          <Across x={b} ohm={second} />
          <InLine x={c} ohm={third} />
        </>
      ) : (
        <>
          {second > 0 && <rect x={b - 28} y={y - 6} width="56" height="12" fill="var(--paper)" />}
          <Across x={a} ohm={first} />
          <InLine x={b} ohm={second} />
          <Across x={c} ohm={third} isLeft />
        </>
      )}
      <LoadSymbol x={endX} y={y} kind="resistor" />
      <CutWords x={startX - 28} y={y + 34} figure={ohms(sourceOhm)} />
      <CutWords x={endX + 10} y={y + 34} figure={ohms(loadOhm)} />
    </svg>
  );
}
