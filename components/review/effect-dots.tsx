import type { Effect } from "@/lib/runs/effects/schema";

const width = 124;
const height = 18;
const middle = height / 2;

/** What is now as a ring, what would be as a disc, and the limit as a bar; the axis is the run's own. */
export function EffectDots({ effect }: { effect: Effect }) {
  const { now, then, atLeast, atMost } = effect;
  const limits = [atLeast, atMost].filter((limit) => limit !== null);
  const values = [now.value, then.value].filter((value) => value !== null);
  if (values.length === 0) return null;
  const most = Math.max(...values, ...limits, 1e-12) * 1.08;
  const x = (value: number) => 4 + Math.max(0, value / most) * (width - 8);
  const colour = then.isMet === false ? "var(--fail)" : "var(--copper-fill)";
  return (
    <svg
      viewBox={`0 0 ${width} ${height}`}
      width={width}
      height={height}
      aria-hidden="true"
      className="block max-w-full"
    >
      <path d={`M0 ${middle}H${width}`} stroke="var(--hemp)" strokeWidth="2.5" />
      {limits.map((limit) => (
        <path key={limit} d={`M${x(limit)} 1.5V${height - 1.5}`} stroke="var(--ink)" strokeWidth="1.75" />
      ))}
      {then.value !== null && <circle cx={x(then.value)} cy={middle} r="4.2" fill={colour} />}
      {now.value !== null && (
        <circle cx={x(now.value)} cy={middle} r="4.2" fill="none" stroke="var(--ink)" strokeWidth="1.4" />
      )}
    </svg>
  );
}
