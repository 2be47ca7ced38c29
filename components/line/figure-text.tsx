import type { PieceFigure } from "@/components/line/strip-piece";

interface FigureTextProps {
  x: number;
  y: number;
  figures: readonly PieceFigure[];
  anchor?: "start" | "middle" | "end";
}

/** Figures with their units in a drawing: figures mono, units text. */
export function FigureText({ x, y, figures, anchor = "start" }: FigureTextProps) {
  if (figures.length === 0) return null;
  return (
    <text x={x} y={y} textAnchor={anchor}>
      {figures.map(({ digits, unit }, i) => (
        <tspan key={i} dx={i === 0 ? undefined : 7}>
          <tspan className="figures">{digits}</tspan>
          {unit && `\u00a0${unit}`}
        </tspan>
      ))}
    </text>
  );
}
