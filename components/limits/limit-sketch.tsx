import { polyline } from "@/components/plot/curve";
import { limitOver, limitRange, type LimitLine } from "@/lib/limit-lines/limit";

const [width, height, margin] = [150, 34, 3];
const places = 61;

/** The line over the logarithm of frequency, its own range filling the width; higher is more. Says nothing by itself. */
export function LimitSketch({ line }: { line: LimitLine }) {
  const [from, to] = limitRange(line.curve) ?? [1, 10];
  const frequencies = Array.from({ length: places }, (_, i) =>
    i === places - 1 ? to : from * (to / from) ** (i / (places - 1)),
  );
  const values = limitOver(line, frequencies, line.perLengthM);
  const finite = values.filter((value) => Number.isFinite(value));
  const [least, most] = [Math.min(...finite), Math.max(...finite)];
  const points = [...values].map((value, i) => ({
    x: margin + (i / (places - 1)) * (width - 2 * margin),
    y: most === least ? height / 2 : height - margin - ((value - least) / (most - least)) * (height - 2 * margin),
  }));
  return (
    <svg width={width} height={height} viewBox={`0 0 ${width} ${height}`} aria-hidden="true">
      <path d={`M0 ${height - 0.5}H${width}`} stroke="var(--line)" />
      <path d={polyline(points)} fill="none" stroke="var(--series-1)" strokeWidth="1.6" />
    </svg>
  );
}
