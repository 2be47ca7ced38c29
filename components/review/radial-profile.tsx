import { cableShape, type CableShape, type DrawnCable } from "@/components/line/cable-shape";
import { material } from "@/components/line/materials";
import { digits } from "@/lib/format/quantity";

interface Layer {
  name: string;
  /** from the centre, mm */
  fromMm: number;
  toMm: number;
  fill: string;
}

/** The layers from the centre outwards, as radii; of a pair those of one insulated wire. */
export function radialLayers(shape: CableShape): Layer[] {
  const dielectric = shape.dielectric === "foam" ? material.foam : "var(--dielectric)";
  const innerMm = shape.kind === "coax" ? shape.innerMm : shape.wireMm;
  const coreMm = shape.kind === "coax" ? shape.dielectricMm : shape.coreMm;
  const layers: Layer[] = [
    { name: "inner conductor", fromMm: 0, toMm: innerMm / 2, fill: "var(--conductor)" },
    { name: "dielectric", fromMm: innerMm / 2, toMm: coreMm / 2, fill: dielectric },
  ];
  if (shape.kind === "pair") return layers;
  const screenMm = shape.screen?.outerMm ?? coreMm;
  const screen = shape.screen?.covering === "braid" ? material.braid : "var(--shield)";
  layers.push({ name: "shield", fromMm: coreMm / 2, toMm: screenMm / 2, fill: screen });
  if (shape.hasJacket)
    layers.push({ name: "jacket", fromMm: screenMm / 2, toMm: shape.outerMm / 2, fill: "var(--jacket)" });
  return layers;
}

/** Radii closer than this are the same edge, mm. */
const least = 0.0005;

interface Props {
  before: { revision: number; cable: DrawnCable };
  after: { revision: number; cable: DrawnCable };
}

const width = 250;
/** room at the end for the radius of an edge that lies there, and the unit */
const tail = 46;
const edgeLabelPx = 44;
const left = 18;
const rowHeight = 40;
const gap = 9;

/** Both revisions cut open from the centre outwards, on one scale, with the edges that moved. */
export function RadialProfile({ before, after }: Props) {
  const rows = [before, after].flatMap(({ revision, cable }) => {
    const shape = cableShape(cable);
    return shape ? [{ revision, layers: radialLayers(shape) }] : [];
  });
  const [first, second] = rows;
  if (!first || !second) return <p className="text-label text-ink-2">The construction is not given in both.</p>;
  const outer = Math.max(...rows.flatMap(({ layers }) => layers.map(({ toMm }) => toMm)));
  const x = (mm: number) => left + (mm / outer) * (width - left);
  const moved = second.layers.flatMap(({ name, toMm }) => {
    const was = first.layers.find((layer) => layer.name === name)?.toMm;
    return was !== undefined && Math.abs(toMm - was) > least ? [{ name, was, is: toMm }] : [];
  });
  const foot = 2 * rowHeight + gap;
  const [main] = moved;
  const unitAt = Math.max(width - 20, main ? x(Math.max(main.was, main.is)) + edgeLabelPx : 0);
  return (
    <figure>
      <svg
        viewBox={`0 0 ${width + tail} ${foot + 24}`}
        width={width + tail}
        role="img"
        aria-label={moved.length === 0 ? "No layer has moved" : movedWords(moved)}
        className="block max-w-full overflow-visible"
      >
        {rows.map(({ revision, layers }, i) => (
          <g key={revision} transform={`translate(0 ${i * (rowHeight + gap)})`}>
            <text x="0" y={rowHeight / 2 + 4} className="figures">
              {revision}
            </text>
            {layers.map(({ name, fromMm, toMm, fill }) => (
              <rect
                key={name}
                x={x(fromMm).toFixed(2)}
                width={Math.max(0.5, x(toMm) - x(fromMm)).toFixed(2)}
                height={rowHeight}
                fill={fill}
                stroke="var(--ink)"
                strokeWidth="0.8"
              />
            ))}
          </g>
        ))}
        <text x={x(0)} y={foot + 16} textAnchor="middle" className="figures">
          0
        </text>
        {main && <Edges was={main.was} is={main.is} x={x} foot={foot} />}
        <text x={unitAt} y={foot + 16}>
          mm
        </text>
      </svg>
      <figcaption className="mt-1 text-label text-ink-2">
        {moved.length === 0 ? "No layer has moved." : `${movedWords(moved)}.`}
      </figcaption>
    </figure>
  );
}

interface EdgesProps {
  was: number;
  is: number;
  x: (mm: number) => number;
  foot: number;
}

/** The edge that moved, in both places, with its radii. */
function Edges({ was, is, x, foot }: EdgesProps) {
  const [low, high] = was < is ? [was, is] : [is, was];
  return (
    <g stroke="var(--copper)">
      {[low, high].map((mm) => (
        <path key={mm} d={`M${x(mm).toFixed(1)} -4V${foot + 5}`} strokeWidth="1.25" />
      ))}
      {(
        [
          [low, "end", -4],
          [high, "start", 4],
        ] as const
      ).map(([mm, anchor, by]) => (
        <text
          key={mm}
          x={x(mm) + by}
          y={foot + 16}
          textAnchor={anchor}
          stroke="none"
          className="figures"
          style={{ fill: "var(--copper)", fontWeight: 650 }}
        >
          {digits(mm, 3)}
        </text>
      ))}
    </g>
  );
}

function movedWords(moved: readonly { name: string; was: number; is: number }[]): string {
  return moved
    .map(
      ({ name, was, is }) =>
        `${name} ${is > was ? "grows" : "shrinks"} by ${digits(Math.abs(is - was), 3)} mm all round`,
    )
    .join(", ");
}
