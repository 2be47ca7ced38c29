interface Words {
  figure: { digits: string; unit: string };
  /** after the unit: "shorted", "both" */
  note?: string;
}

interface CutWordsProps extends Words {
  x: number;
  y: number;
  anchor?: "start" | "middle" | "end";
}

/** A length or a value in a drawing: the figure strong and mono, the rest text. */
export function CutWords({ x, y, figure, note, anchor = "middle" }: CutWordsProps) {
  return (
    <text x={x} y={y} textAnchor={anchor} style={{ fontSize: 12, fill: "var(--ink)" }}>
      <tspan className="figures" style={{ fontWeight: 600 }}>
        {figure.digits}
      </tspan>
      <tspan dx="3">
        {figure.unit}
        {note && `, ${note}`}
      </tspan>
    </text>
  );
}

interface DimensionProps extends Words {
  fromX: number;
  toX: number;
  y: number;
  /** the words stand under the line instead of over it */
  isBelow?: boolean;
}

/** A dimension line with its figure. */
export function Dimension({ fromX, toX, y, isBelow = false, ...words }: DimensionProps) {
  return (
    <g>
      <path d={`M${fromX} ${y - 4}v8M${toX} ${y - 4}v8M${fromX} ${y}H${toX}`} stroke="var(--ink)" fill="none" />
      <CutWords x={(fromX + toX) / 2} y={isBelow ? y + 15 : y - 7} {...words} />
    </g>
  );
}
