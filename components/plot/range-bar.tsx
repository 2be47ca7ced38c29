interface RangeBarProps {
  /** ends of the bar, above 0 */
  range: readonly [number, number];
  /** the dot; null without one */
  at: number | null;
  /** ends of the axis; the same for every row of a list */
  domain?: readonly [number, number];
  /** what a screen reader says */
  name?: string;
  width?: number;
  height?: number;
}

const usualDomain = [0.3, 100] as const;
const ticks = [1, 10, 100];

/** Places on the log axis, px; what lies beyond it is put on its ends. Its own two lines: the list is light without a library of scales. */
function placeOn([low, high]: readonly [number, number], width: number) {
  const place = (value: number) => (width * Math.log(value / low)) / Math.log(high / low);
  return (value: number) => Math.round(10 * Math.max(0, Math.min(width, place(value)))) / 10;
}

/** One bar on a log axis with a dot at the chosen place: how far a quantity reaches, and where it is now. */
export function RangeBar({ range, at, domain = usualDomain, name, width = 112, height = 34 }: RangeBarProps) {
  const x = placeOn(domain, width);
  const y = height / 2;
  const [from, to] = [x(range[0]), x(range[1])];
  return (
    <svg
      width={width}
      height={height}
      role={name ? "img" : undefined}
      aria-label={name}
      aria-hidden={name ? undefined : true}
      className="block overflow-visible"
    >
      {ticks.map((tick) => (
        <path key={tick} d={`M${x(tick)} 0V${height}`} stroke="var(--line)" />
      ))}
      <path d={`M${from} ${y}H${to}`} stroke="var(--ghost)" strokeWidth="5" />
      <path d={`M${from} ${y - 5}v10M${to} ${y - 5}v10`} stroke="var(--ink-2)" strokeWidth="1.2" />
      {at !== null && at > 0 && (
        <circle cx={x(at)} cy={y} r="4" fill="var(--series-1)" stroke="var(--paper)" strokeWidth="1.2" />
      )}
    </svg>
  );
}

/** The figures of the axis, for the head of the column. */
export function RangeBarScale({
  domain = usualDomain,
  width = 112,
}: {
  domain?: readonly [number, number];
  width?: number;
}) {
  const x = placeOn(domain, width);
  return (
    <svg width={width} height="14" aria-hidden="true" className="block overflow-visible">
      {ticks.map((tick) => (
        <text key={tick} x={x(tick)} y="11" textAnchor="middle" className="figures">
          {tick}
        </text>
      ))}
    </svg>
  );
}
