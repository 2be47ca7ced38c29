import { axisScale, roundedFromZero, type AxisScale } from "@/components/plot/axes";
import { greatestIndex, type Values } from "@/components/plot/curve";
import type { LineAxis } from "@/components/plot/line-axis";
import { GreatestRing, waveForm, WavePath } from "@/components/plot/wave-path";

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

function Ticks({ x, scale, format }: { x: AxisScale } & Pick<WaveDownProps, "scale" | "format">) {
  return x.ticks(4).map((tick) => (
    <g key={tick}>
      <path d={`M${x(tick)} ${scale.startX}V${scale.endX}`} stroke="var(--line)" />
      <text x={x(tick)} y={scale.startX - 8} textAnchor="middle" className="figures">
        {format(tick)}
      </text>
    </g>
  ));
}

/** Voltage along a line that runs down the page: a group for the strip's own drawing. */
export function WaveDown({ scale, fromX, toX, distancesM, voltageV, note, format }: WaveDownProps) {
  const x = axisScale("linear", roundedFromZero(voltageV, 4), [fromX, toX]);
  const at = (index: number, valueIndex = index) => {
    const [m, value] = [distancesM[index], voltageV[valueIndex]];
    return m === undefined || value === null || value === undefined ? null : { x: x(value), y: scale.x(m) };
  };
  const form = waveForm(voltageV, scale.endX - scale.startX, at);
  const wash = `M${fromX} ${scale.startX}${form.upper.replaceAll("M", "L")}L${fromX} ${scale.endX}Z`;
  return (
    <g>
      <Ticks x={x} scale={scale} format={format} />
      {form.upper && <path d={wash} fill="var(--copper-wash)" opacity="0.55" />}
      <WavePath form={form} colour="var(--series-1)" width={1.3} />
      <GreatestRing at={at(greatestIndex(voltageV))} />
      <text x={fromX} y={scale.startX - 24}>
        <tspan style={{ fill: "var(--series-1)", fontWeight: 600 }}>Voltage</tspan>
        <tspan dx="6">{note}</tspan>
      </text>
    </g>
  );
}
