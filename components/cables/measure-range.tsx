"use client";

import type { MeasureFacet } from "@/components/cables/measure-facets";
import { axisFigure, shortFigure } from "@/components/cables/measure-facets";
import { axisEnds, type Bin, type HistogramRange } from "@/components/plot/histogram-range";
import { Histogram } from "@/components/plot/histogram";
import { useTypedQuantity } from "@/components/ui/typed-quantity";

interface Props {
  facet: MeasureFacet;
  bins: readonly Bin[];
  range: HistogramRange | undefined;
  change: (range: HistogramRange | undefined) => void;
}

const isEmpty = ({ from, to }: HistogramRange) => from === undefined && to === undefined;
const plainText = (value: number) =>
  shortFigure(value, 6)
    .replace(/\u202f/g, "")
    .replace("\u2212", "-");

interface EndProps extends Omit<Props, "bins"> {
  end: "from" | "to";
  /** the end of the axis: what stands there while nothing binds */
  axisEnd: number;
}

function useEnd({ facet, range = {}, change, end }: Omit<EndProps, "axisEnd">) {
  const other = end === "from" ? range.to : range.from;
  return useTypedQuantity({
    kind: facet.kind,
    usualUnit: facet.usualUnit,
    isOptional: true,
    value: range[end],
    text: plainText,
    onValue: (si) => {
      const value = si === undefined ? undefined : Number((si * facet.perSi).toPrecision(12));
      const { [end]: _before, ...rest } = range;
      const next = value === undefined ? rest : { ...rest, [end]: value };
      change(isEmpty(next) ? undefined : next);
    },
    refuse: (si) => {
      const value = si * facet.perSi;
      if (value < 0) return `${facet.name} is not below 0.`;
      if (other === undefined) return undefined;
      if (end === "from" ? value > other : value < other)
        return end === "from"
          ? `Not above ${shortFigure(other)}, its upper end.`
          : `Not below ${shortFigure(other)}, its lower end.`;
      return undefined;
    },
  });
}

function EndInput({
  name,
  typed,
  placeholder,
}: {
  name: string;
  typed: ReturnType<typeof useEnd>;
  placeholder: string;
}) {
  return (
    <input
      {...typed.input}
      aria-label={name}
      aria-invalid={typed.error ? true : undefined}
      placeholder={placeholder}
      inputMode="decimal"
      className="figures h-5.5 w-11 rounded-t border-b border-transparent bg-transparent px-0.5 text-center text-label text-ink outline-none placeholder:text-ink-2 hover:border-rule focus:border-copper focus:bg-field focus-visible:outline-2 focus-visible:outline-sea aria-invalid:border-fail phone:h-11 phone:w-18 phone:border-rule phone:text-section"
    />
  );
}

/** One figure of the catalogue: how many cables have which, and the range that is kept, by handles or typed. */
export function MeasureRange({ facet, bins, range, change }: Props) {
  const from = useEnd({ facet, range, change, end: "from" });
  const to = useEnd({ facet, range, change, end: "to" });
  const [low, high] = axisEnds(bins);
  const isCounted = bins.length > 0;
  const error = from.error ?? to.error;
  return (
    <div>
      <Histogram
        name={facet.name}
        bins={bins}
        range={range ?? {}}
        onChange={(next) => change(isEmpty(next) ? undefined : next)}
        format={shortFigure}
        formatEnd={axisFigure}
        spoken={facet.spoken}
        typed={
          <span className="flex items-baseline text-label text-ink-2">
            <EndInput
              name={`${facet.name}, typed lower end`}
              typed={from}
              placeholder={isCounted ? axisFigure(low) : ""}
            />
            <span aria-hidden="true">–</span>
            <EndInput
              name={`${facet.name}, typed upper end`}
              typed={to}
              placeholder={isCounted ? axisFigure(high) : ""}
            />
            {facet.unit && <span className="unit">{facet.unit}</span>}
          </span>
        }
      />
      {error && (
        <p role="alert" className="mt-0.5 text-note text-fail">
          {error}
        </p>
      )}
    </div>
  );
}
