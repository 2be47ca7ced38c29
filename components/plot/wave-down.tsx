import { axisScale, roundedFromZero } from "@/components/plot/axes";
import { greatestIndex, polyline, type Values } from "@/components/plot/curve";
import type { LineAxis } from "@/components/plot/line-axis";
import { envelope, isTooDense, type EnvelopePoint } from "@/components/plot/ripple";

interface WaveDownProps {
  /** the strip's own scale, running down */
  scale: LineAxis;
  fromX: number;
  toX: number;
  distancesM: readonly number[];
  voltageV: Values;
  /** after the name: "rms, at 25 W" */
  note: string;
  format: (value: number) => string;
}

/** Voltage along a line that runs down the page: a group for the strip's own drawing. */
export function WaveDown({ scale, fromX, toX, distancesM, voltageV, note, format }: WaveDownProps) {
  const x = axisScale("linear", roundedFromZero(voltageV, 4), [fromX, toX]);
  const at = (index: number, valueIndex = index) => {
    const [m, value] = [distancesM[index], voltageV[valueIndex]];
    return m === undefined || value === null || value === undefined ? null : { x: x(value), y: scale.x(m) };
  };
  const isDense = isTooDense(voltageV, scale.endX - scale.startX);
  const held = envelope(voltageV);
  const line = (points: EnvelopePoint[]) => polyline(points.map(({ atIndex, valueIndex }) => at(atIndex, valueIndex)));
  const outer = isDense ? line(held.upper) : polyline(voltageV.map((_, i) => at(i)));
  const greatest = at(greatestIndex(voltageV));
  return (
    <g>
      {x.ticks(4).map((tick) => (
        <g key={tick}>
          <path d={`M${x(tick).toFixed(1)} ${scale.startX}V${scale.endX}`} stroke="var(--line)" />
          <text x={x(tick)} y={scale.startX - 8} textAnchor="middle" className="figures">
            {format(tick)}
          </text>
        </g>
      ))}
      {outer && (
        <path
          d={`M${fromX} ${scale.startX}${outer.replaceAll("M", "L")}L${fromX} ${scale.endX}Z`}
          fill="var(--copper-wash)"
          opacity="0.55"
        />
      )}
      {isDense ? (
        <path d={`${outer}${line(held.lower)}`} fill="none" stroke="var(--series-1)" strokeWidth="1.5" />
      ) : (
        <path d={outer} fill="none" stroke="var(--series-1)" strokeWidth="1.3" strokeLinejoin="round" />
      )}
      {greatest && (
        <circle
          cx={greatest.x}
          cy={greatest.y}
          r="3.2"
          fill="var(--paper)"
          stroke="var(--series-1)"
          strokeWidth="1.6"
        />
      )}
      <text x={fromX} y={scale.startX - 24}>
        <tspan style={{ fill: "var(--series-1)", fontWeight: 600 }}>Voltage</tspan>
        <tspan dx="6">{note}</tspan>
      </text>
    </g>
  );
}
