/** The small drawings of what stands on a line, about a point on its axis. All in ink; x to the load, y downwards. */

const ink = { fill: "none", stroke: "var(--ink)", strokeWidth: 1.6 } as const;
const box = { fill: "var(--paper)", stroke: "var(--ink)", strokeWidth: 1.4 } as const;

interface At {
  x: number;
  y: number;
}

/** Two plugs face to face. */
export function Joint({ x, y, half = 17 }: At & { half?: number }) {
  return (
    <g>
      <rect x={x - 3.5} y={y - half} width="7" height={2 * half} {...box} />
      <path d={`M${x} ${y - half}v${2 * half}`} stroke="var(--ink)" strokeWidth="1" />
    </g>
  );
}

/** The body a stub hangs from; a slot through it where the stub is in series. */
export function Tee({ x, y, isSeries = false }: At & { isSeries?: boolean }) {
  return (
    <g>
      <rect x={x - 7} y={y - 10} width="14" height="20" {...box} strokeWidth="1.5" />
      {isSeries && <path d={`M${x - 2} ${y - 10}v13M${x + 2} ${y - 10}v13`} {...ink} strokeWidth="1.1" />}
    </g>
  );
}

/** An end plate that gathers several cables. */
export function Plate({ x, y, half }: At & { half: number }) {
  return <rect x={x - 4} y={y - half} width="8" height={2 * half} {...box} />;
}

/** Path of a part lying along x over 40 px, from −20 to 20. */
const partPaths = {
  coil: "M-20 0q5 -12 10 0q5 -12 10 0q5 -12 10 0q5 -12 10 0",
  capacitor: "M-20 0H-3M-3 -9V9M3 -9V9M3 0H20",
  resistor: "M-20 0H-13M13 0H20M-13 -5.5H13V5.5H-13Z",
} as const;

export type PartShape = keyof typeof partPaths;

/** A part in the line. */
export function SeriesPart({ x, y, part, reach = 29 }: At & { part: PartShape; reach?: number }) {
  return (
    <g transform={`translate(${x} ${y})`}>
      <path d={`M${-reach} 0H-20M20 0H${reach}`} {...ink} />
      <path d={partPaths[part]} {...ink} strokeWidth="1.8" />
    </g>
  );
}

/** A part from the line to the return, hanging below it. */
export function ShuntPart({ x, y, part, half }: At & { part: PartShape; half: number }) {
  const hanging = {
    capacitor: "M0 0V16M-9 16H9M-9 21H9M0 21V34M-7 34H7",
    coil: "M0 0V6q10 3.5 0 7q10 3.5 0 7q10 3.5 0 7V34M-7 34H7",
    resistor: "M0 0V8M-5 8H5V27H-5ZM0 27V34M-7 34H7",
  };
  return (
    <g transform={`translate(${x} ${y})`}>
      <rect x="-9" y={-half - 1} width="18" height={2 * half + 2} fill="var(--paper)" />
      <path d="M-10 0H10" {...ink} strokeWidth="1.7" />
      <path d={hanging[part]} {...ink} strokeWidth="1.8" />
    </g>
  );
}

/** A box with a few letters in it: a pad. */
export function Box({ x, y, inside, width = 62 }: At & { inside: string; width?: number }) {
  return (
    <g>
      <rect x={x - width / 2} y={y - 16} width={width} height="32" {...box} strokeWidth="1.6" />
      <text x={x} y={y + 4} textAnchor="middle" className="figures" style={{ fill: "var(--ink)", fontSize: 12 }}>
        {inside}
      </text>
    </g>
  );
}

/** Two windings. */
export function Transformer({ x, y }: At) {
  const winding = (side: 1 | -1) =>
    `M${side * 5} -14q${side * 8} 3.5 0 7q${side * 8} 3.5 0 7q${side * 8} 3.5 0 7q${side * 8} 3.5 0 7`;
  return (
    <g transform={`translate(${x} ${y})`}>
      <path d={`${winding(-1)}${winding(1)}M-20 -14H-5M-20 14H-5M5 -14H20M5 14H20M-22 -14V14M22 -14V14`} {...ink} />
      <path d="M-1.2 -15V15M1.2 -15V15" {...ink} strokeWidth="1" />
    </g>
  );
}

/** Says that a piece is drawn longer than to scale. */
export function BreakMark({ x, y, half }: At & { half: number }) {
  const slash = (at: number) => `M${at - 2.5} ${half + 3}L${at + 2.5} ${-half - 3}`;
  return (
    <g transform={`translate(${x} ${y})`}>
      <path d={`M-5 ${half + 4}L0 ${-half - 4}H5L0 ${half + 4}Z`} fill="var(--paper)" />
      <path d={`${slash(-2.5)}${slash(2.5)}`} {...ink} strokeWidth="1.2" />
    </g>
  );
}
