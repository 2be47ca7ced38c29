import {
  brokenInto,
  enlargementFor,
  sectionParts,
  sectionRoomPx,
  type SectionPart,
} from "@/components/cables/section-parts";
import { cableShape, type CableShape, type DrawnCable } from "@/components/line/cable-shape";
import { pairPlaces } from "@/components/line/pair-section";
import { SectionDrawing, sectionRadius } from "@/components/line/section-view";
import { digits } from "@/lib/format/quantity";

const width = 380;
const lettersPerLine = 27;
const lineHeight = 14;

/** Where parts are pointed at, degrees above the horizontal, from the sheath inwards. */
const angles: Record<SectionPart["layer"], number> = { jacket: 49, screen: 28, dielectric: -26, conductor: -50 };

export interface Place {
  x: number;
  y: number;
}

/** The point of a part that its leader ends in, px from the middle of the cable. */
export function pointAt({ layer, atMm }: SectionPart, shape: CableShape, mmToPx: number): Place {
  if (shape.kind === "pair" && (layer === "dielectric" || layer === "conductor")) {
    const [pair] = pairPlaces(shape, mmToPx);
    const half = (shape.coreMm * mmToPx) / 2;
    const [dx, dy] = [half * Math.cos(pair?.turn ?? 0), half * Math.sin(pair?.turn ?? 0)];
    // The wire of the right core is pointed at, and the insulation of the same core beside it.
    const beside = layer === "dielectric" ? (shape.coreMm + shape.wireMm) * 0.25 * mmToPx : 0;
    return { x: (pair?.x ?? 0) + dx, y: (pair?.y ?? 0) + dy - beside };
  }
  const angle = (-angles[layer] * Math.PI) / 180;
  return { x: atMm * mmToPx * Math.cos(angle), y: atMm * mmToPx * Math.sin(angle) };
}

interface Label extends SectionPart {
  lines: string[];
  /** of the baseline of its first line */
  y: number;
}

/** Labels one under the other, spread over the height; where they need more, the drawing grows. */
function labelsFor(parts: readonly SectionPart[], least: number): { labels: Label[]; height: number } {
  const broken = parts.map((part) => ({ ...part, lines: brokenInto(part.words, lettersPerLine) }));
  const needed = broken.reduce((sum, { lines }) => sum + 17 + lines.length * lineHeight, 0);
  const height = Math.max(least, needed + 12 * parts.length);
  const gap = (height - needed) / Math.max(1, parts.length);
  let y = gap / 2 + 12;
  const labels = broken.map((label) => {
    const at = { ...label, y };
    y += 17 + label.lines.length * lineHeight + gap;
    return at;
  });
  return { labels, height };
}

function LabelText({ label, x }: { label: Label; x: number }) {
  return (
    <text x={x} y={label.y} className="key" style={{ fontSize: 12.5 }}>
      {label.name}
      {label.sizeMm !== null && (
        <>
          <tspan dx="6" className="figures" style={{ fontWeight: 500 }}>
            {digits(label.sizeMm, 2)}
          </tspan>
          <tspan dx="3" style={{ fontWeight: 400, fill: "var(--ink-3)", fontSize: 11 }}>
            mm
          </tspan>
        </>
      )}
      {label.lines.map((line, i) => (
        <tspan
          key={line}
          x={x}
          dy={i === 0 ? 15 : lineHeight}
          style={{ fontWeight: 400, fill: "var(--ink-2)", fontSize: 11 }}
        >
          {line}
        </tspan>
      ))}
    </text>
  );
}

export function Leader({ from, to }: { from: Place; to: Place }) {
  return (
    <g stroke="var(--ink)">
      <circle cx={from.x.toFixed(1)} cy={from.y.toFixed(1)} r="2.6" fill="var(--paper)" />
      <path
        d={`M${from.x.toFixed(1)} ${from.y.toFixed(1)}L${(to.x - 12).toFixed(1)} ${to.y.toFixed(1)}H${to.x - 4}`}
        fill="none"
        strokeWidth="0.9"
      />
    </g>
  );
}

/** A cable end-on with its sizes, to a stated scale. Only sizes the entry gives stand at the leaders. */
export function DimensionedSection(cable: DrawnCable) {
  const shape = cableShape(cable);
  if (!shape)
    return (
      <p className="mt-2 flex items-center gap-4 text-label text-ink-2">
        <svg width="120" height="120" aria-hidden="true" className="shrink-0">
          <circle cx="60" cy="60" r="52" fill="none" stroke="var(--rule)" strokeWidth="1.5" strokeDasharray="4 4" />
        </svg>
        The construction is not known: nothing is drawn that nobody stated.
      </p>
    );
  const { mmToPx } = enlargementFor(shape.outerMm, sectionRoomPx);
  const radius = sectionRadius(cable, mmToPx);
  const { labels, height } = labelsFor(sectionParts(cable), 2 * radius + 30);
  const middle = { x: sectionRoomPx / 2 + 8, y: height / 2 };
  const textX = sectionRoomPx + 36;
  const reach = radius + 13;
  return (
    <svg
      width={width}
      height={height}
      viewBox={`0 0 ${width} ${height}`}
      role="img"
      aria-label={labels.map(({ name, sizeMm, words }) => `${name} ${sizeMm ?? ""} ${words}`).join("; ")}
      className="mt-2 block max-w-full overflow-visible"
    >
      <SectionDrawing x={middle.x} y={middle.y} mmToPx={mmToPx} {...cable} />
      <path
        d={`M${middle.x - reach} ${middle.y}H${middle.x + reach}M${middle.x} ${middle.y - reach}V${middle.y + reach}`}
        stroke="var(--ink-2)"
        strokeWidth="0.8"
        strokeDasharray="10 3 2 3"
      />
      {labels.map((label) => {
        const point = pointAt(label, shape, mmToPx);
        const from = { x: middle.x + point.x, y: middle.y + point.y };
        return (
          <g key={label.name}>
            <Leader from={from} to={{ x: textX, y: label.y - 4 }} />
            <LabelText label={label} x={textX} />
          </g>
        );
      })}
    </svg>
  );
}
