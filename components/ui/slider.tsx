"use client";

import { useId } from "react";

interface SliderProps {
  /** for a screen reader */
  label: string;
  min: number;
  max: number;
  step: number;
  value: number;
  onChange: (value: number) => void;
  /** the stretch that counts, drawn strong on the track */
  band?: readonly [number, number];
  /** the value in words, for a screen reader */
  valueText?: string;
  /** at the left and at the right end of the track */
  before?: string;
  after?: string;
}

/** One value on a track, with the band it should stay in. */
export function Slider({ label, min, max, step, value, onChange, band, valueText, before, after }: SliderProps) {
  const id = useId();
  const share = (at: number) => `${(100 * (Math.max(min, Math.min(max, at)) - min)) / (max - min)}%`;
  return (
    <div className="flex items-center gap-3 text-control text-ink-2">
      {before && <span className="whitespace-nowrap">{before}</span>}
      <label htmlFor={id} className="sr-only">
        {label}
      </label>
      <span className="relative h-11 flex-1">
        <span className="absolute inset-x-0 top-1/2 h-px bg-rule" />
        {band && (
          <span
            className="absolute top-1/2 h-0.75 -translate-y-1/2 bg-copper"
            style={{ left: share(band[0]), right: `calc(100% - ${share(band[1])})` }}
          />
        )}
        <input
          id={id}
          type="range"
          min={min}
          max={max}
          step={step}
          value={value}
          aria-valuetext={valueText}
          onChange={(event) => onChange(Number(event.target.value))}
          className="absolute inset-0 w-full appearance-none bg-transparent [&::-moz-range-thumb]:h-5 [&::-moz-range-thumb]:w-3 [&::-moz-range-thumb]:rounded [&::-moz-range-thumb]:border-2 [&::-moz-range-thumb]:border-ink [&::-moz-range-thumb]:bg-paper [&::-webkit-slider-thumb]:h-5 [&::-webkit-slider-thumb]:w-3 [&::-webkit-slider-thumb]:appearance-none [&::-webkit-slider-thumb]:rounded [&::-webkit-slider-thumb]:border-2 [&::-webkit-slider-thumb]:border-ink [&::-webkit-slider-thumb]:bg-paper"
        />
      </span>
      {after && <span className="whitespace-nowrap">{after}</span>}
    </div>
  );
}
