/** Source and load, drawn at the ends of the strip. `x` is where the line begins or ends. */
import type { StripEnd } from "@/components/line/strip-piece";

const ink = { fill: "none", stroke: "var(--ink)", strokeWidth: 1.6 } as const;

interface At {
  x: number;
  y: number;
}

/** A generator 28 px before the line. */
export function SourceSymbol({ x, y }: At) {
  const middle = x - 28;
  return (
    <g>
      <circle cx={middle} cy={y} r="15" {...ink} fill="var(--paper)" />
      <path d={`M${middle - 8} ${y}q4 -9 8 0t8 0`} {...ink} />
      <path d={`M${x - 13} ${y}H${x}`} {...ink} />
    </g>
  );
}

const loadPaths: Record<Exclude<StripEnd["kind"], "generator">, string> = {
  antenna: "M0 0h14v-26M14 -12l-9 -15M14 -12l9 -15",
  resistor: "M0 -17h10v6M0 0h3M10 11v6h-10M5 -11h10v22h-10z",
  open: "M0 -10h8M0 10h8M12 -10v0M12 10v0",
  short: "M0 -10h10v20h-10",
};

/** What the line ends in. */
export function LoadSymbol({ x, y, kind }: At & { kind: StripEnd["kind"] }) {
  if (kind === "generator") return <SourceSymbol x={x + 56} y={y} />;
  return (
    <g transform={`translate(${x} ${y})`}>
      <path d={loadPaths[kind]} {...ink} strokeWidth={kind === "antenna" ? 1.8 : 1.6} />
      {kind === "open" && (
        <path
          d="M8 -10m-2 0a2 2 0 1 0 4 0a2 2 0 1 0 -4 0M8 10m-2 0a2 2 0 1 0 4 0a2 2 0 1 0 -4 0"
          {...ink}
          fill="var(--paper)"
        />
      )}
    </g>
  );
}

/** The same ends on a line that runs down the page. */
export function SourceAbove({ x, y }: At) {
  return (
    <g>
      <circle cx={x} cy={y - 21} r="13" {...ink} fill="var(--paper)" />
      <path d={`M${x - 7} ${y - 21}q3.5 -8 7 0t7 0M${x} ${y - 8}V${y}`} {...ink} />
    </g>
  );
}

export function LoadBelow({ x, y, kind }: At & { kind: StripEnd["kind"] }) {
  if (kind === "antenna")
    return (
      <path d={`M${x} ${y}v22M${x - 10} ${y + 20}L${x} ${y + 11}L${x + 10} ${y + 20}`} {...ink} strokeWidth="1.8" />
    );
  if (kind === "generator") return <SourceAbove x={x} y={y + 42} />;
  return (
    <g transform={`translate(${x} ${y}) rotate(90)`}>
      <path d={loadPaths[kind]} {...ink} />
    </g>
  );
}
