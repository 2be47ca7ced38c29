/**
 * Circles of equal resistance and arcs of equal reactance in the plane of Γ, for impedances over the reference:
 * resistance r is the circle about r/(1+r) of radius 1/(1+r); reactance x the circle about 1 + j/x of radius 1/|x|.
 */

const coarse = { r: [0.2, 0.5, 1, 2, 5], x: [0.2, 0.5, 1, 2, 5] };
const middle = { r: [0.2, 0.3, 0.5, 0.7, 1, 1.4, 2, 3, 5], x: [0.2, 0.4, 0.7, 1, 1.5, 2.5] };
const fine = {
  r: [0.4, 0.5, 0.6, 0.7, 0.8, 0.9, 1, 1.1, 1.25, 1.4, 1.6, 1.8, 2, 2.5],
  x: [0.1, 0.2, 0.3, 0.4, 0.5, 0.6, 0.8, 1],
};

interface SmithGridProps {
  /** px of |Γ| = 1 */
  r: number;
  /** |Γ| at the frame */
  edge: number;
}

export function SmithGrid({ r, edge }: SmithGridProps) {
  const lines = edge > 0.8 ? coarse : edge > 0.45 ? middle : fine;
  return (
    <g fill="none" stroke="var(--line)">
      {lines.x.map((x) => (
        <g key={`x${x}`}>
          <circle cx={r} cy={-r / x} r={r / x} />
          <circle cx={r} cy={r / x} r={r / x} />
        </g>
      ))}
      {lines.r.map((resistance) => (
        <circle
          key={`r${resistance}`}
          cx={(r * resistance) / (1 + resistance)}
          r={r / (1 + resistance)}
          stroke={resistance === 1 ? "var(--rule)" : undefined}
        />
      ))}
      <path d={`M${-r} 0H${r}`} stroke="var(--rule)" />
    </g>
  );
}
