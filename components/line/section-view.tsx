import { CoaxSection } from "@/components/line/coax-section";
import { cableShape, type DrawnCable } from "@/components/line/cable-shape";
import { PairSection } from "@/components/line/pair-section";

interface DrawingProps extends DrawnCable {
  x: number;
  y: number;
  /** px per millimetre; one scale for all drawings on a screen */
  mmToPx: number;
}

/** Smallest radius that still shows as a ring. */
const leastRadius = 3;
const unknownRadius = 8;

/** Radius of the drawing, px. */
export function sectionRadius(cable: DrawnCable, mmToPx: number): number {
  const outerMm = cableShape(cable)?.outerMm ?? cable.outerDiameterMm;
  return outerMm ? Math.max(leastRadius, (outerMm * mmToPx) / 2) : unknownRadius;
}

/** A cable seen end-on, about a point of a larger drawing. Dashed ring when its construction is not known. */
export function SectionDrawing({ x, y, mmToPx, ...cable }: DrawingProps) {
  const shape = cableShape(cable);
  if (!shape) {
    return (
      <circle
        cx={x}
        cy={y}
        r={sectionRadius(cable, mmToPx)}
        fill="none"
        stroke="var(--rule)"
        strokeWidth="1.5"
        strokeDasharray="3 3"
      />
    );
  }
  // A cable thinner than the least ring is drawn at that size; its proportions stay.
  const scale = Math.max(mmToPx, (2 * leastRadius) / shape.outerMm);
  return (
    <g transform={`translate(${x.toFixed(2)} ${y.toFixed(2)})`}>
      {shape.kind === "coax" ? (
        <CoaxSection shape={shape} scale={scale} />
      ) : (
        <PairSection shape={shape} scale={scale} />
      )}
    </g>
  );
}

interface SectionViewProps extends DrawnCable {
  mmToPx: number;
  /** side of the square it stands in, px; default just large enough */
  box?: number;
  /** what a screen reader says; without it the drawing is decoration */
  name?: string;
  className?: string;
}

/** A cable seen end-on, to scale. */
export function SectionView({ mmToPx, box, name, className, ...cable }: SectionViewProps) {
  const side = box ?? Math.ceil(2 * sectionRadius(cable, mmToPx)) + 2;
  return (
    <svg
      width={side}
      height={side}
      viewBox={`${-side / 2} ${-side / 2} ${side} ${side}`}
      role={name ? "img" : undefined}
      aria-label={name}
      aria-hidden={name ? undefined : true}
      className={`block shrink-0 overflow-visible ${className ?? ""}`}
    >
      <SectionDrawing x={0} y={0} mmToPx={mmToPx} {...cable} />
    </svg>
  );
}
