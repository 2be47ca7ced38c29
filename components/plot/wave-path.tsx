/** The drawn form of one wave, for a line that runs across the page or down it. */
import { polyline, type Values } from "@/components/plot/curve";
import { envelope, isTooDense, type EnvelopePoint } from "@/components/plot/ripple";

type Point = { x: number; y: number } | null;

export interface WaveForm {
  /** ripples too many to draw one by one: only the curves that hold them */
  isDense: boolean;
  /** the wave, or the upper of the two curves */
  upper: string;
  /** the lower curve; empty for a wave drawn whole */
  lower: string;
  /** between the two curves */
  band: string;
}

/**
 * @param at - place of the value of one sample at the position of another; null where there is none
 * @param lengthPx - length of the line on the screen
 */
export function waveForm(values: Values, lengthPx: number, at: (index: number, valueIndex: number) => Point): WaveForm {
  const isDense = isTooDense(values, lengthPx);
  if (!isDense) return { isDense, upper: polyline(values.map((_, i) => at(i, i))), lower: "", band: "" };
  const held = envelope(values);
  const points = (through: EnvelopePoint[]) => through.map(({ atIndex, valueIndex }) => at(atIndex, valueIndex));
  const [upper, lower] = [points(held.upper), points(held.lower)];
  return {
    isDense,
    upper: polyline(upper),
    lower: polyline(lower),
    band: `${polyline([...upper, ...lower.toReversed()])}Z`,
  };
}

interface WavePathProps {
  form: WaveForm;
  colour: string;
  /** the second quantity: thinner, and dashed where only the curves that hold it are drawn */
  isSecond?: boolean;
  width?: number;
}

export function WavePath({ form, colour, isSecond = false, width = isSecond ? 1.1 : 1.75 }: WavePathProps) {
  const opacity = isSecond ? 0.85 : 1;
  if (!form.isDense)
    return (
      <path d={form.upper} fill="none" stroke={colour} strokeWidth={width} opacity={opacity} strokeLinejoin="round" />
    );
  return (
    <g fill="none" stroke={colour} strokeWidth={isSecond ? 1 : 1.5} strokeDasharray={isSecond ? "7 3" : undefined}>
      {!isSecond && <path d={form.band} fill={colour} stroke="none" opacity="0.18" />}
      <path d={form.upper} />
      <path d={form.lower} />
    </g>
  );
}

/** The open ring on the greatest value. */
export function GreatestRing({ at }: { at: Point }) {
  if (!at) return null;
  return <circle cx={at.x} cy={at.y} r="3.2" fill="var(--paper)" stroke="var(--series-1)" strokeWidth="1.6" />;
}
