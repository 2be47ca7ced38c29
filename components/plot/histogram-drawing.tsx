import { axisEnds, type Bin, type HandleEnd } from "@/components/plot/histogram-range";

const barsHeight = 38;
const handle = { width: 8, height: 12 };

/** Part of a bin that lies in the range, from 0 to 1. */
function share({ from, to }: Bin, [low, high]: readonly [number, number]): number {
  return Math.max(0, Math.min(to, high) - Math.max(from, low)) / (to - from);
}

interface BarsProps {
  bins: readonly Bin[];
  /** the ends of the range */
  places: [number, number];
  x: (value: number) => number;
}

/** The bars of a histogram, 38 px high; what lies in the range is strong. */
export function Bars({ bins, places, x }: BarsProps) {
  const most = bins.reduce((max, { count }) => Math.max(max, count), 1);
  return bins.map((bin) => {
    const [left, right] = [x(bin.from) + 0.75, x(bin.to) - 0.75];
    // What is there is seen, however few beside many.
    const height = bin.count === 0 ? 0 : Math.max(1.5, (barsHeight * bin.count) / most);
    const part = share(bin, places);
    const common = { y: (barsHeight - height).toFixed(1), height: height.toFixed(1) };
    const strongFrom = Math.max(left, x(places[0]));
    return (
      <g key={bin.from}>
        <rect {...common} x={left.toFixed(1)} width={Math.max(0, right - left).toFixed(1)} fill="var(--line)" />
        {part > 0 && (
          <rect
            {...common}
            x={strongFrom.toFixed(1)}
            width={Math.max(0, Math.min(right, x(places[1])) - strongFrom).toFixed(1)}
            fill="var(--copper-fill)"
          />
        )}
      </g>
    );
  });
}

function Handle({ at, end }: { at: number; end: HandleEnd }) {
  const [left, top] = [at - handle.width / 2, barsHeight + 0.5 - handle.height / 2];
  return (
    <g>
      <rect
        data-ring={end}
        x={left - 4}
        y={top - 4}
        width={handle.width + 8}
        height={handle.height + 8}
        fill="none"
        stroke="var(--sea)"
        strokeWidth="2"
        visibility="hidden"
      />
      <rect
        x={left}
        y={top}
        width={handle.width}
        height={handle.height}
        fill="var(--paper)"
        stroke="var(--copper)"
        strokeWidth="1.6"
      />
    </g>
  );
}

interface DrawingProps {
  bins: readonly Bin[];
  /** figure at the ends of the axis */
  format: (value: number) => string;
  places: [number, number];
  width: number;
}

/** Bars, axis and handles. Stands after the two sliders it shows: it rings the one that has the focus. */
export function HistogramDrawing({ bins, places, width, format }: DrawingProps) {
  const [low, high] = axisEnds(bins);
  const x = (value: number) => (width * (value - low)) / (high - low || 1);
  const y = barsHeight + 0.5;
  return (
    <svg
      width={width}
      height="62"
      aria-hidden="true"
      className="block overflow-visible peer-focus-visible/from:[&_[data-ring=from]]:visible peer-focus-visible/to:[&_[data-ring=to]]:visible"
    >
      <Bars bins={bins} places={places} x={x} />
      <path d={`M0 ${y}H${width}`} stroke="var(--rule)" />
      <path
        d={`M${x(places[0]).toFixed(1)} ${y}H${x(places[1]).toFixed(1)}`}
        stroke="var(--copper)"
        strokeWidth="2.5"
      />
      <Handle at={x(places[0])} end="from" />
      <Handle at={x(places[1])} end="to" />
      <text y="59" className="figures">
        {format(low)}
      </text>
      <text x={width} y="59" textAnchor="end" className="figures">
        {format(high)}
      </text>
    </svg>
  );
}
