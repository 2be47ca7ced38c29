/** A range on one log axis with a dot at one value in it: the loss of a cable from 10 MHz to 1 GHz, and at the chosen frequency. */
import { axisScale } from "@/components/plot/axes";

interface RangeBarProps {
  domain: readonly [number, number];
  /** grid lines, values of the axis */
  marks: readonly number[];
  from: number;
  to: number;
  dot: number | null;
  width: number;
  height: number;
}

export function RangeBar({ domain, marks, from, to, dot, width, height }: RangeBarProps) {
  const x = axisScale("log", domain, [4, width - 4]);
  const within = (value: number) => x(Math.min(domain[1], Math.max(domain[0], value)));
  const middle = height / 2;
  return (
    <svg width={width} height={height} aria-hidden="true" className="block overflow-visible">
      {marks.map((mark) => (
        <path key={mark} d={`M${x(mark).toFixed(1)} 0V${height}`} stroke="var(--line)" />
      ))}
      <rect
        x={within(from)}
        y={middle - 2}
        width={Math.max(0, within(to) - within(from))}
        height="4"
        fill="var(--ghost)"
      />
      <path
        d={`M${within(from).toFixed(1)} ${middle - 4}v8M${within(to).toFixed(1)} ${middle - 4}v8`}
        stroke="var(--ink-2)"
        strokeWidth="1.2"
      />
      {dot !== null && (
        <circle cx={within(dot)} cy={middle} r="4" fill="var(--copper)" stroke="var(--paper)" strokeWidth="1" />
      )}
    </svg>
  );
}
