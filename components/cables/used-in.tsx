"use client";

import type { Route } from "next";
import Link from "next/link";
import { useState } from "react";
import { Figure } from "@/components/ui/figure";
import { Section } from "@/components/ui/section";
import { metres } from "@/lib/format/quantity";
import type { RunUse } from "@/lib/runs/uses/service";

interface Props {
  total: number;
  items: readonly RunUse[];
}

const few = 3;
const width = 96;

/** The run as a line from source to load, and where on it the cable lies. */
function Place({ totalLengthM, stretches, stubsAtM }: Pick<RunUse, "totalLengthM" | "stretches" | "stubsAtM">) {
  const x = (m: number) => (totalLengthM > 0 ? (width * m) / totalLengthM : 0);
  return (
    <svg width={width} height="12" aria-hidden="true" className="block shrink-0">
      <path d={`M0 6H${width}`} stroke="var(--ghost)" strokeWidth="2" />
      {stretches.map(({ fromM, toM }) => (
        <rect
          key={fromM}
          x={x(fromM).toFixed(1)}
          y="2"
          width={Math.max(1.5, x(toM) - x(fromM)).toFixed(1)}
          height="8"
          fill="var(--copper-fill)"
        />
      ))}
      {stubsAtM.map((m, i) => (
        <path key={i} d={`M${x(m).toFixed(1)} 6v6`} stroke="var(--copper-fill)" strokeWidth="3" />
      ))}
    </svg>
  );
}

/** The runs a cable is used in, with how much of it and where along the run. */
export function UsedIn({ total, items }: Props) {
  const [isWhole, setWhole] = useState(false);
  const shown = isWhole ? items : items.slice(0, few);
  return (
    <Section
      title={total === 0 ? "Used in no run yet" : `Used in ${total} ${total === 1 ? "run" : "runs"}`}
      aside={
        items.length > few && (
          <button type="button" className="link min-h-6 text-label" onClick={() => setWhole(!isWhole)}>
            {isWhole ? "Show few" : "Show all"}
          </button>
        )
      }
    >
      <ul className="text-label">
        {shown.map(({ runId, number, name, cableLengthM, ...place }) => (
          <li key={runId} className="flex items-center gap-3 border-b border-line py-1">
            <Link href={`/runs/${runId}` as Route} prefetch={false} className="link min-w-0 flex-1 truncate phone:py-3">
              {number} {name}
            </Link>
            <Figure {...metres(cableLengthM)} />
            <Place {...place} />
          </li>
        ))}
      </ul>
      {isWhole && total > items.length && <p className="mt-1 text-note text-ink-3">The {items.length} changed last.</p>}
    </Section>
  );
}
