interface ReadoutProps {
  x: number;
  fromY: number;
  toY: number;
  /** px between which the words must stand */
  limits: readonly [number, number];
  /** one line each; the first is the place */
  words: readonly string[];
}

const perCharacter = 6.4;

/** The cursor of a plot: a line, and beside it what is there. */
export function Readout({ x, fromY, toY, limits, words }: ReadoutProps) {
  const width = Math.max(0, ...words.map((word) => word.length)) * perCharacter + 12;
  const isLeft = x + width + 8 > limits[1];
  const left = Math.max(limits[0], isLeft ? x - width - 6 : x + 6);
  return (
    <g pointerEvents="none">
      <path d={`M${x.toFixed(1)} ${fromY}V${toY}`} stroke="var(--ink)" strokeDasharray="2 3" />
      <rect
        x={left}
        y={fromY + 2}
        width={width}
        height={words.length * 14 + 6}
        fill="var(--paper)"
        stroke="var(--rule)"
      />
      {words.map((word, i) => (
        <text key={word} x={left + 6} y={fromY + 15 + i * 14} className="figures" style={{ fill: "var(--ink)" }}>
          {word}
        </text>
      ))}
    </g>
  );
}
