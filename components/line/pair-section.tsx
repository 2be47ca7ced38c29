import type { PairShape } from "@/components/line/cable-shape";
import { WireEnd } from "@/components/line/coax-section";
import { material } from "@/components/line/materials";

interface CoreProps {
  x: number;
  y: number;
  shape: PairShape;
  scale: number;
}

function Core({ x, y, shape, scale }: CoreProps) {
  const wire = Math.max(0.7, (shape.wireMm * scale) / 2);
  return (
    <>
      <circle
        cx={x.toFixed(2)}
        cy={y.toFixed(2)}
        r={((shape.coreMm * scale) / 2).toFixed(2)}
        fill="var(--dielectric)"
        stroke="var(--rule)"
        strokeWidth="0.8"
      />
      <WireEnd x={Number(x.toFixed(2))} y={Number(y.toFixed(2))} r={wire} isStranded={shape.isStranded} />
    </>
  );
}

/** Where each pair lies and how it is turned: one in the middle, more on a circle. */
export function pairPlaces(shape: PairShape, scale: number) {
  const core = shape.coreMm * scale;
  if (shape.pairCount === 1) return [{ x: 0, y: 0, turn: shape.isTwisted ? -0.5 : 0 }];
  const ring = core / Math.sin(Math.PI / shape.pairCount);
  const room = ((shape.screen?.innerMm ?? shape.outerMm * 0.86) * scale) / 2 - core;
  const radius = Math.max(Math.min(ring, room), core * 0.9);
  return Array.from({ length: shape.pairCount }, (_, k) => {
    const angle = (2 * Math.PI * k) / shape.pairCount + Math.PI / 4;
    // Each pair has a lay of its own, so no two stand turned alike.
    return { x: radius * Math.cos(angle), y: radius * Math.sin(angle), turn: angle + 0.9 + k * 0.7 };
  });
}

/** One or more pairs end-on, about the origin. */
export function PairSection({ shape, scale }: { shape: PairShape; scale: number }) {
  const px = (mm: number) => (mm * scale) / 2;
  const half = px(shape.coreMm);
  const inside = px(shape.screen?.innerMm ?? shape.outerMm * (shape.hasJacket ? 0.86 : 1));
  return (
    <>
      {shape.hasJacket && <circle r={px(shape.outerMm).toFixed(2)} fill="var(--jacket)" />}
      {shape.screen && (
        <circle
          r={px(shape.screen.outerMm).toFixed(2)}
          fill={shape.screen.covering === "braid" ? material.braid : "var(--shield)"}
        />
      )}
      <circle r={inside.toFixed(2)} fill="var(--filler)" />
      {pairPlaces(shape, scale).map(({ x, y, turn }) => {
        const [dx, dy] = [half * Math.cos(turn), half * Math.sin(turn)];
        return (
          <g key={`${x} ${y}`}>
            <Core x={x - dx} y={y - dy} shape={shape} scale={scale} />
            <Core x={x + dx} y={y + dy} shape={shape} scale={scale} />
          </g>
        );
      })}
      {shape.hasDrain && inside > 5 && (
        <circle cy={(-0.86 * inside).toFixed(2)} r={Math.max(0.8, inside * 0.06).toFixed(2)} fill="var(--shield-2)" />
      )}
    </>
  );
}
