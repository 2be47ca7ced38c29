"use client";

import { Strip } from "@/components/line/strip";
import { scaleOfPieces } from "@/components/line/strip-piece";
import { ChartFrame } from "@/components/plot/chart-frame";
import { useMeasuredWidth } from "@/components/plot/measured-width";
import { useRunEditor } from "@/components/runs/run-editor";
import { RunFrame } from "@/components/runs/run-frame";
import { stripEnds, stripPieces } from "@/components/runs/strip-pieces";
import { TimeConditions } from "@/components/runs/time-conditions";
import { TimeDrawing } from "@/components/runs/time-drawing";
import { TimeReadings } from "@/components/runs/time-readings";
import { TapTable } from "@/components/runs/tap-table";
import { useTime, type Timing } from "@/components/runs/use-time";
import { StateNote } from "@/components/ui/state-mark";
import { useIsPhone } from "@/components/ui/use-is-phone";
import { inWords, scaled, significantDigits } from "@/lib/format/quantity";
import { thinned } from "@/lib/runs/curves";

/** The run over time: its wave fronts between what the source sees and what the load sees. */
export function TimeView() {
  const timing = useTime();
  const { signals, trouble, isBehind } = timing;
  return (
    <RunFrame head={<TimeReadings timing={timing} />}>
      <TimeConditions timing={timing} />
      {trouble && (
        <div className="mt-5">
          <StateNote state="warn">{trouble}</StateNote>
        </div>
      )}
      {signals && (
        <div className={`mt-5 ${isBehind ? "opacity-60" : ""}`}>
          <Lattice timing={timing} signals={signals} />
          <TapTable signals={signals} />
        </div>
      )}
    </RunFrame>
  );
}

/** Where the lattice and the two ends stand across a width, px. */
function places(width: number, isPhone: boolean) {
  if (isPhone) {
    const middle = width / 2;
    return {
      start: 46,
      end: width - 14,
      left: [46, middle - 16],
      right: [middle + 16, width - 14],
      endsTop: 610,
    } as const;
  }
  const [start, end] = [Math.round(width * 0.22), Math.round(width * 0.78)];
  return { start, end, left: [76, start - 34], right: [end + 34, width - 56], endsTop: undefined } as const;
}

type Signals = NonNullable<Timing["signals"]>;

function Lattice({ timing, signals }: { timing: Timing; signals: Signals }) {
  const { draft, lines, faults } = useRunEditor();
  const { drive, windowS, ground } = timing;
  const { ref, width } = useMeasuredWidth(1384);
  const isPhone = useIsPhone() === true;
  const { start, end, left, right, endsTop } = places(width, isPhone);
  const pieces = stripPieces(draft, lines, faults, undefined);
  const scale = scaleOfPieces(pieces, start, end);
  const { sourceName, loadName } = draft;
  const rows = Array.from(signals.timeS, (timeS, k) => [
    inWords(scaled("time", timeS, 4)),
    significantDigits(signals.source.volts[k], 4),
    significantDigits(signals.load.volts[k], 4),
  ]);
  if (!drive) return null;
  return (
    <div ref={ref}>
      {!isPhone && (
        <div className="phone:hidden" inert>
          <Strip
            pieces={pieces}
            {...stripEnds(draft)}
            selected={null}
            onSelect={() => undefined}
            scale={scale}
            width={width}
          />
        </div>
      )}
      <ChartFrame
        title="Wave fronts"
        note={`what ${sourceName} sees at the left, ${loadName} at the right, in volts; time runs down`}
        summary={summaryOf(signals, sourceName, loadName)}
        figures={{ head: ["Time", `${sourceName}, V`, `${loadName}, V`], rows: thinned(rows, 200) }}
      >
        <TimeDrawing
          {...{ scale, width, signals, ground, drive, windowS, sourceName, loadName, left, right, endsTop }}
        />
      </ChartFrame>
      <Key omitted={signals.omittedRays} hasGround={ground !== null} />
    </div>
  );
}

function summaryOf({ readings, source }: Signals, sourceName: string, loadName: string): string {
  const { reachedS, settledV } = readings;
  const reached = Number.isFinite(reachedS)
    ? `${loadName} reaches half its level after ${inWords(scaled("time", reachedS, 3))}`
    : `${loadName} does not reach half its level in this time`;
  const rests = Number.isFinite(settledV) ? `${inWords(scaled("voltage", settledV, 3))}` : "no level";
  const atSource = Number.isFinite(source.settledV) ? inWords(scaled("voltage", source.settledV, 3)) : "no level";
  return `${reached} and settles at ${rests}; ${sourceName} settles at ${atSource}`;
}

function Key({ omitted, hasGround }: { omitted: number; hasGround: boolean }) {
  return (
    <p className="mt-1 flex flex-wrap items-center gap-x-5 gap-y-1 text-note text-ink-2">
      <span className="inline-flex items-center gap-2">
        <svg width="30" height="6" aria-hidden="true">
          <path d="M0 3H30" stroke="var(--ink)" strokeWidth="2.5" />
        </svg>
        rising front, volts on the line
      </span>
      <span className="inline-flex items-center gap-2">
        <svg width="30" height="6" aria-hidden="true">
          <path d="M0 3H30" stroke="var(--ink)" strokeDasharray="6 4" />
        </svg>
        falling front
      </span>
      {hasGround ? (
        <>
          <Swatch colour="var(--sea)" words="below the settled level" />
          <Swatch colour="var(--copper-fill)" words="above it" />
        </>
      ) : (
        <span>The ground is not tinted: too many edges fit this window, or the line never comes to rest.</span>
      )}
      <span>Fronts are those of lossless lines{omitted > 0 && `; ${omitted} below 1 % of the edge are left out`}.</span>
    </p>
  );
}

function Swatch({ colour, words }: { colour: string; words: string }) {
  return (
    <span className="inline-flex items-center gap-2">
      <svg width="22" height="11" aria-hidden="true">
        <rect width="22" height="11" fill={colour} opacity="0.6" />
      </svg>
      {words}
    </span>
  );
}
