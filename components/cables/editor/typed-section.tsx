"use client";

import { Leader, pointAt } from "@/components/cables/dimensioned-section";
import { sectionParts, type SectionPart } from "@/components/cables/section-parts";
import { cableShape } from "@/components/line/cable-shape";
import { Dimension } from "@/components/line/dimension";
import { SectionDrawing } from "@/components/line/section-view";
import { useEntryForm } from "@/components/cables/editor/entry-form";
import { digits } from "@/lib/format/quantity";

const width = 290;
const diameter = 200;

interface Props {
  /** of the whole drawing, px */
  height: number;
  /** where the fields of each layer stand, px from the top */
  layers: readonly { layer: SectionPart["layer"]; y: number }[];
}

/** The cable end-on as it is typed, with a leader from each part to its fields. */
export function TypedSection({ height, layers }: Props) {
  const { edited, form } = useEntryForm();
  const { construction, build } = edited.read;
  const family = form.getValues("family");
  const isPossible = edited.worked.ways.construction?.refusal === undefined;
  const drawn = {
    construction: isPossible ? construction : null,
    build,
    family,
    outerDiameterMm: construction?.outerDiameterMm ?? null,
  };
  const shape = cableShape(drawn);
  const middle = { x: 130, y: height / 2 - 14 };
  if (!shape || !construction)
    return (
      <svg width={width} height={height} role="img" aria-label="Nothing can be drawn yet" className="block max-w-full">
        <circle
          cx={middle.x}
          cy={middle.y}
          r={diameter / 2}
          fill="none"
          stroke="var(--rule)"
          strokeWidth="1.5"
          strokeDasharray="4 4"
        />
        <text x={middle.x} y={middle.y + 4} textAnchor="middle">
          two sizes draw it
        </text>
      </svg>
    );
  const mmToPx = diameter / shape.outerMm;
  const inner = construction.kind === "coax" ? construction.dielectricMm : construction.spacingMm;
  const half = (inner * mmToPx) / 2;
  const foot = middle.y + diameter / 2 + 22;
  return (
    <svg
      width={width}
      height={height}
      role="img"
      aria-label={`Cross-section, ${digits(shape.outerMm, 2)} millimetres across`}
      className="block max-w-full overflow-visible"
    >
      <SectionDrawing x={middle.x} y={middle.y} mmToPx={mmToPx} {...drawn} />
      <g stroke="var(--ink-2)" strokeDasharray="3 3">
        <path d={`M${middle.x - half} ${middle.y}V${foot}M${middle.x + half} ${middle.y}V${foot}`} />
      </g>
      <Dimension
        fromX={middle.x - half}
        toX={middle.x + half}
        y={foot}
        figure={{ digits: digits(inner, 2), unit: "mm" }}
      />
      <g className="phone:hidden">
        {sectionParts(drawn).map((part) => {
          const row = layers.find(({ layer }) => layer === part.layer);
          if (!row) return null;
          const point = pointAt(part, shape, mmToPx);
          const from = { x: middle.x + point.x, y: middle.y + point.y };
          return <Leader key={part.name} from={from} to={{ x: width, y: row.y }} />;
        })}
      </g>
    </svg>
  );
}
