import { sectionParts, type SectionPart } from "@/components/cables/section-parts";
import { cableShape, type CableShape, type DrawnCable } from "@/components/line/cable-shape";
import { material } from "@/components/line/materials";
import { digits } from "@/lib/format/quantity";

const width = 380;
const heightPx = 36;
const middleY = 26;

interface Bared {
  fromX: number;
  toX: number;
  thickness: number;
}

/** Where each layer lies bare: the sheath longest, since the name stands on it. */
function stretches(count: number): [number, number][] {
  const first = count > 3 ? 136 : 170;
  const each = (width - first) / Math.max(1, count - 1);
  return Array.from({ length: count }, (_, i) => [
    i === 0 ? 0 : first + (i - 1) * each,
    i === 0 ? first : first + i * each,
  ]);
}

/** What lies bare of a pair; the distance of its wires is no size of a layer. */
const pairWords: Record<SectionPart["layer"], string> = {
  ...{ jacket: "jacket", screen: "screen", dielectric: "cores", conductor: "wires" },
};

/** Thickness of a layer seen from the side, mm. */
function thicknessOf(layer: SectionPart["layer"], shape: CableShape): number {
  if (layer === "jacket") return shape.outerMm;
  if (layer === "screen") return shape.screen?.outerMm ?? shape.outerMm;
  if (layer === "conductor") return shape.kind === "coax" ? shape.innerMm : shape.wireMm;
  return shape.kind === "coax" ? shape.dielectricMm : shape.coreMm;
}

function fillOf(layer: SectionPart["layer"], shape: CableShape): string {
  if (layer === "jacket") return "var(--jacket)";
  if (layer === "screen") return shape.screen?.covering === "braid" ? material.braid : "var(--shield)";
  if (layer === "conductor") return "var(--conductor)";
  return shape.dielectric === "foam" ? material.foam : "var(--dielectric)";
}

function Layer({ fromX, toX, thickness, fill, y }: Bared & { fill: string; y: number }) {
  return (
    <rect
      x={fromX.toFixed(1)}
      y={(y - thickness / 2).toFixed(1)}
      width={(toX - fromX).toFixed(1)}
      height={thickness.toFixed(1)}
      fill={fill}
      stroke="var(--ink)"
      strokeWidth="0.8"
    />
  );
}

/** A layer laid bare; of a pair both cores. */
function BaredLayer({ part, shape, ...at }: { part: SectionPart; shape: CableShape } & Bared) {
  const fill = fillOf(part.layer, shape);
  const isCore = shape.kind === "pair" && (part.layer === "dielectric" || part.layer === "conductor");
  if (!isCore) return <Layer {...at} fill={fill} y={middleY} />;
  const spread = (thicknessOf("dielectric", shape) * heightPx) / shape.outerMm / 2 + 1.5;
  return [-spread, spread].map((by) => <Layer key={by} {...at} fill={fill} y={middleY + by} />);
}

/** A cable with one layer after another laid bare, from the sheath to the conductor. */
export function StripBack({ designation, ...cable }: DrawnCable & { designation: string }) {
  const shape = cableShape(cable);
  if (!shape) return null;
  const parts = sectionParts(cable);
  const places = stretches(parts.length);
  return (
    <svg
      width={width}
      height="84"
      viewBox={`0 0 ${width} 84`}
      role="img"
      aria-label={`${designation} laid bare: ${parts.map(({ name }) => name.toLowerCase()).join(", ")}`}
      className="block max-w-full overflow-visible"
    >
      {parts.map((part, i) => {
        const [fromX = 0, toX = 0] = places[i] ?? [];
        const thickness = Math.max(2, (thicknessOf(part.layer, shape) * heightPx) / shape.outerMm);
        const x = i === 0 ? 0 : (fromX + toX) / 2;
        return (
          <g key={part.name}>
            <BaredLayer part={part} shape={shape} fromX={fromX} toX={toX} thickness={thickness} />
            <text x={x} y="62" textAnchor={i === 0 ? "start" : "middle"}>
              {shape.kind === "pair" ? pairWords[part.layer] : part.name.toLowerCase()}
            </text>
            {part.sizeMm !== null && !(shape.kind === "pair" && part.layer === "dielectric") && (
              <text x={x} y="77" textAnchor={i === 0 ? "start" : "middle"} className="figures key">
                {digits(part.sizeMm, 2)}
              </text>
            )}
          </g>
        );
      })}
      {shape.hasJacket && (
        // A drawing of its own, so that a long name ends with the sheath.
        <svg width={(places[0]?.[1] ?? 0) - 8} height="60">
          <text x="10" y={middleY + 4} style={{ fill: "light-dark(var(--paper), var(--ink))", fontWeight: 600 }}>
            {designation}
          </text>
        </svg>
      )}
    </svg>
  );
}
