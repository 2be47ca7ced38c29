/** A wave front of the lattice, on the drawing. */
export interface DrawnRay {
  fromX: number;
  fromY: number;
  toX: number;
  toY: number;
  volt: number;
}

interface LatticeRaysProps {
  rays: readonly DrawnRay[];
  /** volt of the thickest ray */
  mostV: number;
  format: (volt: number) => string;
}

/** Rays that carry their figure, at most. */
const mostLabelled = 14;
const labelPx = { width: 40, height: 15 };

/** The largest rays long enough for a figure, none over another. */
function labelled(rays: readonly DrawnRay[]): DrawnRay[] {
  const length = (ray: DrawnRay) => Math.hypot(ray.toX - ray.fromX, ray.toY - ray.fromY);
  const bySize = rays.filter((ray) => length(ray) > 60).sort((a, b) => Math.abs(b.volt) - Math.abs(a.volt));
  const taken: DrawnRay[] = [];
  for (const ray of bySize) {
    const [x, y] = middle(ray);
    const isFree = taken.every((other) => {
      const [otherX, otherY] = middle(other);
      return Math.abs(otherX - x) > labelPx.width + 6 || Math.abs(otherY - y) > labelPx.height + 3;
    });
    if (isFree) taken.push(ray);
    if (taken.length === mostLabelled) break;
  }
  return taken;
}

const middle = ({ fromX, fromY, toX, toY }: DrawnRay): [number, number] => [(fromX + toX) / 2, (fromY + toY) / 2];

/** Wave fronts over distance and time: width follows size, solid rising, dashed falling. */
export function LatticeRays({ rays, mostV, format }: LatticeRaysProps) {
  return (
    <g>
      {rays.map(({ fromX, fromY, toX, toY, volt }, i) => (
        <path
          key={i}
          d={`M${fromX.toFixed(1)} ${fromY.toFixed(1)}L${toX.toFixed(1)} ${toY.toFixed(1)}`}
          stroke="var(--ink)"
          strokeWidth={Math.max(0.5, 3 * Math.sqrt(Math.abs(volt) / mostV)).toFixed(2)}
          strokeDasharray={volt < 0 ? "6 4" : undefined}
          opacity={Math.abs(volt) < 0.05 * mostV ? 0.55 : 1}
        />
      ))}
      {labelled(rays).map((ray, i) => {
        const [x, y] = middle(ray);
        return (
          <g key={i}>
            <rect
              x={x - labelPx.width / 2}
              y={y - labelPx.height / 2}
              {...labelPx}
              fill="var(--paper)"
              opacity="0.86"
            />
            <text x={x} y={y} dy="0.36em" textAnchor="middle" className="figures" style={{ fill: "var(--ink)" }}>
              {format(ray.volt)}
            </text>
          </g>
        );
      })}
    </g>
  );
}
