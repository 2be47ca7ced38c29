"use client";

import { Ruler } from "@/components/line/ruler";
import type { LineScale } from "@/components/line/line-scale";
import { roundedFromZero } from "@/components/plot/axes";
import { LatticeGround } from "@/components/plot/lattice-ground";
import { LatticeRays, type DrawnRay } from "@/components/plot/lattice-rays";
import { SignalDown } from "@/components/plot/signal-down";
import { Moment, useTimeCursor } from "@/components/runs/time-moment";
import { voltTick } from "@/components/runs/wave-chart";
import { digits, inWords, scaled, unitFor } from "@/lib/format/quantity";
import type { Drive } from "@/lib/line/time/drive";
import type { Ground, TimeSignals } from "@/lib/runs/time/signals";

interface TimeDrawingProps {
  scale: LineScale;
  width: number;
  signals: TimeSignals;
  ground: Ground | null;
  drive: Drive;
  windowS: number;
  sourceName: string;
  loadName: string;
  /** where what the ends see is drawn: from and to, px */
  left: readonly [number, number];
  right: readonly [number, number];
  /** px above the ends' drawings where these stand under the lattice */
  endsTop?: number;
}

const top = 64;
const heightPx = 462;
const endsHeightPx = 250;

/** Ends of a volt axis that holds everything both ends see. */
export function voltRange({ source, load }: TimeSignals): [number, number] {
  const all = [...source.volts, ...load.volts];
  const [, high] = roundedFromZero(all);
  const [, low] = roundedFromZero(all.map((volt) => -volt));
  const least = all.reduce((a, b) => Math.min(a, b), 0);
  const most = all.reduce((a, b) => Math.max(a, b), 0);
  // What rings a little below nothing does not get half of the axis.
  return [least < -0.02 * most ? -low : 0, most > 0 ? high : 0];
}

function drawnRays({ rays }: TimeSignals, scale: LineScale, windowS: number, y: (timeS: number) => number): DrawnRay[] {
  return rays.flatMap(({ element, isForward, startS, endS, volt }) => {
    const place = scale.places[element];
    if (!place || place.toX - place.fromX < 1 || startS >= windowS) return [];
    const [fromX, toX] = isForward ? [place.fromX, place.toX] : [place.toX, place.fromX];
    const part = Math.min(1, (windowS - startS) / (endS - startS));
    return [{ fromX, fromY: y(startS), toX: fromX + (toX - fromX) * part, toY: y(Math.min(endS, windowS)), volt }];
  });
}

function timeTicks(windowS: number): number[] {
  const rough = windowS / 9;
  const decade = 10 ** Math.floor(Math.log10(rough));
  const step = [1, 2, 5, 10].map((nice) => nice * decade).find((nice) => nice >= rough) ?? rough;
  return Array.from({ length: Math.floor(windowS / step + 1e-9) + 1 }, (_, n) => n * step);
}

const signed = (volt: number) => `${volt < 0 ? "\u2212" : "+"}${voltTick(Math.abs(volt))}`;

/** Fronts over distance and time, with what each end sees at the lattice's own edges. */
export function TimeDrawing(props: TimeDrawingProps) {
  const { scale, width, signals, ground, windowS, left, right, endsTop } = props;
  const { startX, endX } = scale;
  const y = (timeS: number) => top + (timeS / windowS) * heightPx;
  const range = voltRange(signals);
  const biggest = Math.max(Math.abs(range[0]), Math.abs(range[1]), Number.MIN_VALUE);
  const { at, handlers } = useTimeCursor(windowS, y);
  const ends = endsTop === undefined ? { top, height: heightPx, y } : endsUnder(endsTop, windowS);
  const total = endsTop === undefined ? top + heightPx + 26 : endsTop + endsHeightPx + 40;
  const index = at === null ? -1 : Math.round((at / windowS) * (signals.timeS.length - 1));
  return (
    <div className="relative" style={{ height: total }}>
      {ground && (
        <div className="absolute" style={{ left: startX, top }}>
          <LatticeGround
            field={ground}
            x={(m) => scale.x(m) - startX}
            width={Math.max(1, Math.round(endX - startX))}
            height={heightPx}
            fullV={biggest / 2}
          />
        </div>
      )}
      <svg
        {...handlers}
        tabIndex={0}
        role="group"
        aria-label="Arrow keys up and down read out along the time"
        width="100%"
        height={total}
        viewBox={`0 0 ${width} ${total}`}
        className="relative block touch-pan-y overflow-visible"
      >
        <Ruler scale={scale} y={top - 22} />
        {scale.boundariesX.map((x) => (
          <path key={x} d={`M${x} ${top}V${top + heightPx}`} stroke="var(--rule)" />
        ))}
        <rect x={startX} y={top} width={endX - startX} height={heightPx} fill="none" stroke="var(--ink)" />
        <LatticeRays rays={drawnRays(signals, scale, windowS, y)} mostV={biggest} format={signed} />
        <g transform={`translate(${left[0]} 0)`}>
          <SignalDown {...endProps(props, "source", range)} {...ends} width={left[1] - left[0]} isMirrored />
        </g>
        <g transform={`translate(${right[0]} 0)`}>
          <SignalDown {...endProps(props, "load", range)} {...ends} width={right[1] - right[0]} />
        </g>
        {endsTop === undefined && (
          <>
            <EndTitle x={left[1]} words={`At ${props.sourceName}`} note="volts, growing to the left" anchor="end" />
            <EndTitle
              x={right[0]}
              words={`At ${props.loadName}`}
              note={props.drive.kind === "step" ? "volts, the band is settled ±5 %" : "volts"}
              anchor="start"
            />
          </>
        )}
        <TimeAxis x={left[0] - 8} windowS={windowS} y={ends.y} />
        {endsTop !== undefined && <TimeAxis x={startX - 6} windowS={windowS} y={y} />}
        {at !== null && index >= 0 && (
          <Moment {...props} y={y(at)} atS={at} source={signals.source.volts[index]} load={signals.load.volts[index]} />
        )}
      </svg>
    </div>
  );
}

function endsUnder(endsTop: number, windowS: number) {
  return {
    top: endsTop,
    height: endsHeightPx,
    y: (timeS: number) => endsTop + (timeS / windowS) * endsHeightPx,
  };
}

/** What one end's drawing is given beside its place. */
function endProps({ signals, drive }: TimeDrawingProps, end: "source" | "load", range: [number, number]) {
  const { volts, settledV } = signals[end];
  const common = { timeS: signals.timeS, volts, range, settledV, format: voltTick };
  const { settlingS, overshoot } = signals.readings;
  if (end === "source" || drive.kind !== "step") return common;
  const peakAt = volts.reduce((most, volt, k) => (Math.abs(volt) > Math.abs(volts[most]!) ? k : most), 0);
  return {
    ...common,
    bandV: 0.05 * Math.abs(settledV),
    ...(settlingS > 0 && { mark: { timeS: settlingS, words: `settled ${inWords(scaled("time", settlingS, 3))}` } }),
    ...(overshoot > 0.02 && {
      peak: {
        timeS: signals.timeS[peakAt]!,
        volt: volts[peakAt]!,
        words: inWords(scaled("voltage", volts[peakAt], 3)),
      },
    }),
  };
}

function EndTitle({ x, words, note, anchor }: { x: number; words: string; note: string; anchor: "start" | "end" }) {
  const short = words.length > 26 ? `${words.slice(0, 25)}…` : words;
  return (
    <g>
      <text x={x} y={14} textAnchor={anchor} style={{ fontSize: 13, fontWeight: 600, fill: "var(--ink)" }}>
        {short}
      </text>
      <text x={x} y={29} textAnchor={anchor}>
        {note}
      </text>
    </g>
  );
}

function TimeAxis({ x, windowS, y }: { x: number; windowS: number; y: (timeS: number) => number }) {
  const ticks = timeTicks(windowS);
  const unit = unitFor("time", windowS);
  const step = (ticks[1] ?? windowS) / unit.factor;
  const decimals = Math.max(0, -Math.floor(Math.log10(step) + 1e-9));
  return (
    <g>
      {ticks.map((tick) => (
        <text key={tick} x={x} y={y(tick)} dy="0.36em" textAnchor="end" className="figures">
          {digits(tick / unit.factor, decimals)}
        </text>
      ))}
      <text x={x} y={y(windowS) + 18} textAnchor="end">
        {unit.symbol}
      </text>
    </g>
  );
}
