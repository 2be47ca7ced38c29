import { digits } from "@/lib/format/quantity";
import type { LineScale } from "@/components/line/line-scale";

interface RulerProps {
  scale: LineScale;
  /** y of the ruler's line */
  y: number;
}

const niceSteps = [1, 2, 5];
const mostMarks = 1000;

/** Step between figures of a ruler of `totalM` metres that has room for about `count` of them. */
export function rulerStep(totalM: number, count: number): number {
  if (!(totalM > 0)) return 1;
  const rough = totalM / Math.max(1, count);
  const decade = 10 ** Math.floor(Math.log10(rough));
  return decade * (niceSteps.find((nice) => nice * decade >= rough * 0.999) ?? 10);
}

/** Places of the marks: `isMajor` ones carry a figure. */
export function rulerMarks(scale: LineScale, perMark = 90): { m: number; isMajor: boolean }[] {
  const step = rulerStep(scale.totalM, (scale.endX - scale.startX) / perMark);
  const minor = step / 5;
  // A line too short to be divided has one mark.
  const count = minor > 0 ? Math.min(mostMarks, Math.floor(scale.totalM / minor + 1e-9)) : 0;
  return Array.from({ length: count + 1 }, (_, i) => ({ m: i * minor, isMajor: i % 5 === 0 }));
}

function decimalsOf(step: number): number {
  return Math.max(0, -Math.floor(Math.log10(step) + 1e-9));
}

/** The metres under the strip, from the source. */
export function Ruler({ scale, y }: RulerProps) {
  const step = rulerStep(scale.totalM, (scale.endX - scale.startX) / 90);
  const end = digits(scale.totalM, scale.totalM < 100 ? 1 : 0);
  return (
    <g>
      <path d={`M${scale.startX} ${y}H${scale.endX}`} stroke="var(--rule)" />
      {rulerMarks(scale).map(({ m, isMajor }) => {
        const x = scale.x(m);
        const isByTheEnd = scale.endX - x < 26;
        return (
          <g key={m}>
            <path d={`M${x.toFixed(1)} ${y}v${isMajor ? -7 : -4}`} stroke="var(--rule)" />
            {isMajor && !isByTheEnd && (
              <text x={x.toFixed(1)} y={y + 13} textAnchor="middle" className="figures">
                {digits(m, decimalsOf(step))}
              </text>
            )}
          </g>
        );
      })}
      {scale.totalM > 0 && (
        <text x={scale.endX - 12} y={y + 13}>
          <tspan className="figures">{end}</tspan>
          {"\u00a0m"}
        </text>
      )}
    </g>
  );
}
