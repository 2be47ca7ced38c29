"use client";

import { useId, type ReactNode } from "react";
import { HistogramDrawing } from "@/components/plot/histogram-drawing";
import {
  axisEnds,
  handlePlaces,
  movedTo,
  stepCount,
  stepNearest,
  valueAtStep,
  type Bin,
  type HandleEnd,
  type HistogramRange,
} from "@/components/plot/histogram-range";
import { useMeasuredWidth } from "@/components/plot/measured-width";
import { useDraft } from "@/components/ui/use-draft";

interface HistogramProps {
  /** what is counted: "Impedance" */
  name: string;
  /** ascending, each beginning where the one before ends */
  bins: readonly Bin[];
  range: HistogramRange;
  onChange: (range: HistogramRange) => void;
  /** where a handle stands */
  format: (value: number) => string;
  /** figure at the ends of the axis */
  formatEnd?: (value: number) => string;
  /** unit in words, for a screen reader */
  spoken: string;
  /** stands at the right of the name: the range as typed figures */
  typed?: ReactNode;
}

// The browser's own sliders do the work; their thumbs are only a place to take hold of, the drawing shows them. Each is
// wider than the axis by a thumb, so that the middle of the thumb goes from one end of the axis to the other.
const slider =
  "pointer-events-none absolute top-[25px] -left-3 m-0 h-7 w-[calc(100%+24px)] appearance-none bg-transparent outline-none phone:top-[17px] phone:-left-5.5 phone:h-11 phone:w-[calc(100%+44px)]";
const thumb =
  "[&::-webkit-slider-thumb]:pointer-events-auto [&::-webkit-slider-thumb]:h-7 [&::-webkit-slider-thumb]:w-6 [&::-webkit-slider-thumb]:cursor-ew-resize [&::-webkit-slider-thumb]:appearance-none phone:[&::-webkit-slider-thumb]:size-11 " +
  "[&::-moz-range-thumb]:pointer-events-auto [&::-moz-range-thumb]:h-7 [&::-moz-range-thumb]:w-6 [&::-moz-range-thumb]:cursor-ew-resize [&::-moz-range-thumb]:rounded-none [&::-moz-range-thumb]:border-0 [&::-moz-range-thumb]:bg-transparent phone:[&::-moz-range-thumb]:size-11";

interface EndProps extends Pick<HistogramProps, "name" | "bins" | "format" | "spoken"> {
  end: HandleEnd;
  at: number;
  isOnTop: boolean;
  move: (value: number) => void;
  settle: () => void;
}

function End({ name, bins, format, spoken, end, at, isOnTop, move, settle }: EndProps) {
  return (
    <input
      type="range"
      aria-label={`${name}, ${end === "from" ? "at least" : "at most"}`}
      aria-valuetext={`${format(at)} ${spoken}`.trim()}
      min={0}
      max={stepCount(bins)}
      step={1}
      value={stepNearest(bins, at)}
      onChange={(event) => move(valueAtStep(bins, Number(event.target.value)))}
      onPointerUp={settle}
      onKeyUp={settle}
      onBlur={settle}
      className={`${slider} ${thumb} ${end === "from" ? "peer/from" : "peer/to"} ${isOnTop ? "z-2" : "z-1"}`}
    />
  );
}

/** How many there are of each size, with two handles that keep a range of them. Arrow keys move the handles too. */
export function Histogram({ name, bins, range, onChange, format, formatEnd = format, spoken, typed }: HistogramProps) {
  const { ref, width } = useMeasuredWidth(252);
  const id = useId();
  const { shown, change, settle } = useDraft(range, onChange);
  const places = handlePlaces(bins, shown);
  const [low, high] = axisEnds(bins);
  const common = { name, bins, format, spoken, settle };
  return (
    <div role="group" aria-labelledby={id}>
      <div className="mb-1.25 flex items-baseline justify-between gap-2">
        <span id={id} className="text-label font-[560]">
          {name}
        </span>
        {typed}
      </div>
      {bins.length > 0 ? (
        <div ref={ref} className="relative">
          <End
            {...common}
            end="from"
            at={places[0]}
            // Where both handles meet at the right end, the one that can still move lies on top.
            isOnTop={places[0] > (low + high) / 2}
            move={(value) => change(movedTo(bins, shown, "from", value))}
          />
          <End
            {...common}
            end="to"
            at={places[1]}
            isOnTop={places[0] <= (low + high) / 2}
            move={(value) => change(movedTo(bins, shown, "to", value))}
          />
          <HistogramDrawing bins={bins} places={places} width={width} format={formatEnd} />
        </div>
      ) : (
        <p className="h-15.5 pt-9.5">
          <span className="block border-t border-rule" />
          <span className="sr-only">Nothing to count.</span>
        </p>
      )}
    </div>
  );
}
