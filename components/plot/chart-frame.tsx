"use client";

import { useState, type ReactNode } from "react";

export interface FiguresTable {
  head: readonly string[];
  rows: readonly (readonly (string | number)[])[];
}

interface ChartFrameProps {
  title: string;
  /** unit, direction, what the shading is */
  note?: ReactNode;
  /** the chart in one sentence; names it for a screen reader */
  summary: string;
  /** the same data as a table */
  figures: FiguresTable;
  /** stands beside the figures switch */
  aside?: ReactNode;
  level?: 2 | 3;
  className?: string;
  children: ReactNode;
}

function Figures({ figures, summary }: { figures: FiguresTable; summary: string }) {
  return (
    <div className="max-h-80 overflow-auto" tabIndex={0} role="group" aria-label={summary}>
      <table className="w-full border-collapse text-label">
        <thead className="sticky top-0 bg-paper">
          <tr>
            {figures.head.map((word) => (
              <th
                key={word}
                scope="col"
                className="border-b border-rule py-1 pl-3 text-right font-[560] text-ink-2 first:pl-0 first:text-left"
              >
                {word}
              </th>
            ))}
          </tr>
        </thead>
        <tbody>
          {figures.rows.map((row, i) => (
            <tr key={i}>
              {row.map((cell, j) => (
                <td key={j} className="figures border-b border-line py-0.75 pl-3 text-right first:pl-0 first:text-left">
                  {cell}
                </td>
              ))}
            </tr>
          ))}
        </tbody>
      </table>
    </div>
  );
}

/** Title of a chart, and the switch that replaces it with its figures. */
export function ChartFrame({
  title,
  note,
  summary,
  figures,
  aside,
  level = 2,
  className = "",
  children,
}: ChartFrameProps) {
  const [isTable, setTable] = useState(false);
  const Heading = level === 2 ? "h2" : "h3";
  return (
    <figure className={`m-0 min-w-0 ${className}`}>
      <figcaption className="flex flex-wrap items-baseline gap-x-3.5">
        <Heading className="text-body">{title}</Heading>
        {note && <span className="text-label text-ink-2">{note}</span>}
        <span className="ml-auto flex items-baseline gap-4 print:hidden">
          {aside}
          <button
            type="button"
            aria-pressed={isTable}
            onClick={() => setTable(!isTable)}
            className="link min-h-6 text-label"
          >
            {isTable ? "Picture" : "Figures"}
          </button>
        </span>
      </figcaption>
      {isTable ? (
        <Figures figures={figures} summary={summary} />
      ) : (
        <div role="group" aria-label={summary}>
          {children}
        </div>
      )}
    </figure>
  );
}
