interface FigureProps {
  digits: string;
  unit?: string;
  /** the unit spelt out, for screen readers */
  spoken?: string;
  /** best or chosen */
  isStrong?: boolean;
  /** fixed place for the unit, ems, so that figures align down a column */
  unitSlot?: number;
  className?: string;
}

/** A figure and its unit: the figure mono, the unit text. */
export function Figure({ digits, unit = "", spoken, isStrong = false, unitSlot, className = "" }: FigureProps) {
  return (
    <span className={`whitespace-nowrap ${className}`}>
      <span className={`figures ${isStrong ? "font-[650]" : ""}`}>{digits}</span>
      {(unit || unitSlot !== undefined) && (
        <span
          aria-hidden={spoken !== undefined}
          className="unit ml-[0.22em] inline-block text-left"
          style={unitSlot === undefined ? undefined : { width: `${unitSlot}em` }}
        >
          {unit}
        </span>
      )}
      {spoken !== undefined && <span className="sr-only"> {spoken}</span>}
    </span>
  );
}
