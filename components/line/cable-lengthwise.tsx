import { cableShape, type CoaxShape, type DrawnCable, type PairShape } from "@/components/line/cable-shape";
import { material } from "@/components/line/materials";
import { strands } from "@/components/ui/strands";

interface Stretch {
  fromX: number;
  toX: number;
  /** of the axis */
  y: number;
  mmToPx: number;
}

interface LayerProps extends Omit<Stretch, "mmToPx"> {
  height: number;
  fill: string;
}

function Layer({ fromX, toX, y, height, fill }: LayerProps) {
  return (
    <rect
      x={fromX.toFixed(1)}
      y={(y - height / 2).toFixed(2)}
      width={Math.max(0, toX - fromX).toFixed(1)}
      height={height.toFixed(2)}
      fill={fill}
    />
  );
}

/** Thickness on the strip, px: to scale, but never so thin that the layers inside cannot be told apart. */
export function thickness(cable: DrawnCable, mmToPx: number): number {
  const outerMm = cableShape(cable)?.outerMm ?? cable.outerDiameterMm ?? 5;
  return Math.min(44, Math.max(7, outerMm * mmToPx));
}

/** Spaces each layer at least this far from the next, px a side. */
const leastLayer = 1.1;

function CoaxStretch({ shape, outer, ...at }: { shape: CoaxShape; outer: number } & Omit<Stretch, "mmToPx">) {
  const px = outer / shape.outerMm;
  const conductor = Math.max(2, shape.innerMm * px);
  const screen = shape.screen
    ? Math.min(shape.screen.outerMm * px, outer - (shape.hasJacket ? 2 * leastLayer : 0))
    : outer;
  const dielectric = Math.max(conductor + 2, Math.min(shape.dielectricMm * px, screen - 2 * 0.8));
  const braid = shape.screen?.covering === "braid" ? material.braid : "var(--shield)";
  return (
    <>
      <Layer {...at} height={outer} fill={shape.hasJacket ? "var(--jacket)" : "var(--shield-2)"} />
      <Layer {...at} height={screen} fill={braid} />
      <Layer
        {...at}
        height={dielectric}
        fill={shape.dielectric === "foam" && dielectric > 12 ? material.foam : "var(--dielectric)"}
      />
      <Layer {...at} height={conductor} fill="var(--conductor)" />
    </>
  );
}

function Twist({ shape, outer, fromX, toX, y }: { shape: PairShape; outer: number } & Omit<Stretch, "mmToPx">) {
  const amplitude = Math.max(2, outer * 0.26);
  const width = Math.max(1.4, outer * 0.17);
  const paths = strands({
    fromX,
    toX,
    middleY: y,
    amplitude,
    pitch: outer * (shape.isTwisted ? 0.62 : 1.1),
    topAtX: fromX + outer * 0.3,
  });
  return (
    <g fill="none" stroke="var(--strand)" strokeWidth={width}>
      <path d={paths.second} />
      <path d={paths.first} stroke="var(--filler)" strokeWidth={width * 1.4} />
      <path d={paths.first} />
      <path d={paths.secondGap} stroke="var(--filler)" strokeWidth={width * 1.4} />
      <path d={paths.secondRising} />
    </g>
  );
}

function PairStretch({ shape, outer, ...at }: { shape: PairShape; outer: number } & Omit<Stretch, "mmToPx">) {
  const inside = outer * (shape.screen ? 0.76 : 0.84);
  return (
    <>
      <Layer {...at} height={outer} fill={shape.hasJacket ? "var(--jacket)" : "var(--filler)"} />
      {shape.screen && (
        <Layer
          {...at}
          height={outer * 0.86}
          fill={shape.screen.covering === "braid" ? material.braid : "var(--shield)"}
        />
      )}
      <Layer {...at} height={inside} fill="var(--filler)" />
      <Twist shape={shape} outer={outer} {...at} />
    </>
  );
}

/** A cable cut open along its length, between two places of a larger drawing; dashed when its construction is not known. */
export function CableLengthwise({ fromX, toX, y, mmToPx, ...cable }: Stretch & DrawnCable) {
  const shape = cableShape(cable);
  const outer = thickness(cable, mmToPx);
  if (!shape) {
    return (
      <g>
        <Layer fromX={fromX} toX={toX} y={y} height={outer} fill="var(--sailcloth)" />
        <rect
          x={fromX}
          y={y - outer / 2}
          width={Math.max(0, toX - fromX)}
          height={outer}
          fill="none"
          stroke="var(--rule)"
          strokeWidth="1.4"
          strokeDasharray="5 5"
        />
        <path d={`M${fromX} ${y}H${toX}`} stroke="var(--rule)" strokeWidth="1.4" />
      </g>
    );
  }
  const at = { fromX, toX, y };
  return shape.kind === "coax" ? (
    <CoaxStretch shape={shape} outer={outer} {...at} />
  ) : (
    <PairStretch shape={shape} outer={outer} {...at} />
  );
}
