"use client";

import type { Route } from "next";
import { useState, type KeyboardEvent } from "react";
import { barDomain, barWidth, CableRow } from "@/components/cables/cable-row";
import { segments } from "@/components/cables/row-window";
import { useRowHeight, useRowWindow } from "@/components/cables/use-row-window";
import { RangeBarScale } from "@/components/plot/range-bar";
import { HeadCell, Table } from "@/components/ui/table";
import { entryAddress } from "@/lib/cables/entry-address";
import type { CableItem } from "@/lib/cables/schema";
import { frequency, inWords } from "@/lib/format/quantity";

interface Props {
  items: readonly CableItem[];
  /** how many the search finds, of which `items` are the first */
  total: number;
  /** of the thickest cable there may be in the list */
  thickestMm: number;
  lossAtHz: number;
  canStartRun: boolean;
  held: readonly string[];
  toggleHold: (item: CableItem) => void;
  /** the last of the rows have come in sight */
  onEnd: () => void;
}

function Scale({ mmToPx }: { mmToPx: number }) {
  return (
    <svg width={10 * mmToPx + 2} height="8" aria-hidden="true" className="mx-auto block">
      <path d={`M1 1v6M1 4h${10 * mmToPx}m0 -3v6`} fill="none" stroke="var(--ink-2)" />
    </svg>
  );
}

function Head({ lossAtHz, mmToPx }: { lossAtHz: number; mmToPx: number }) {
  const unit = (text: string) => <span className="block font-normal">{text}</span>;
  return (
    <thead className="sticky top-0 z-2 bg-paper phone:hidden">
      <tr aria-rowindex={1} className="[&>th]:border-ink [&>th]:align-top">
        <HeadCell className="w-16 min-w-16 text-center">
          <span className="block font-normal">10 mm</span>
          <Scale mmToPx={mmToPx} />
        </HeadCell>
        <HeadCell className="w-full">Cable</HeadCell>
        <HeadCell isRight>
          Z<sub>0</sub>
          {unit("Ω")}
        </HeadCell>
        <HeadCell isRight>Velocity{unit("factor")}</HeadCell>
        <HeadCell isRight className="w-22">
          dB/100 m{unit(inWords(frequency(lossAtHz)))}
        </HeadCell>
        <HeadCell className="w-34 pl-5 folded:hidden">
          10 MHz to 1 GHz
          <RangeBarScale domain={barDomain} width={barWidth} />
        </HeadCell>
        <HeadCell isRight className="folded:hidden">
          Delay{unit("ns/m")}
        </HeadCell>
        <HeadCell isRight>Outer{unit("mm")}</HeadCell>
        <HeadCell isRight className="folded:hidden">
          In runs
        </HeadCell>
        <HeadCell className="pl-6">State</HeadCell>
        <HeadCell aria-label="Use" />
        <HeadCell isRight>Hold</HeadCell>
      </tr>
    </thead>
  );
}

const columns = 12;
const mostMmToPx = 3;
/** Thicker ones than this are cut off at the edge of their row: one of them must not make dots of all the others. */
const thickestDrawnMm = 60;

/** px per millimetre, the same for every row: as large as the thickest cable lets it be. */
function scaleFor(thickestMm: number, rowHeight: number): number {
  return Math.round(10 * Math.min(mostMmToPx, (rowHeight - 6) / Math.min(thickestMm, thickestDrawnMm))) / 10;
}

/** Arrow keys go from one cable to the next, whatever in the row has the focus. */
function step(event: KeyboardEvent<HTMLElement>) {
  const by = { ArrowDown: 1, ArrowUp: -1 }[event.key];
  const row = (event.target as HTMLElement).closest("[data-index]");
  if (!by || !row || event.altKey || event.ctrlKey || event.metaKey) return;
  const next = Number(row.getAttribute("data-index")) + by;
  event.preventDefault();
  if (next < 0) document.querySelector<HTMLElement>("input[type=search]")?.focus();
  else event.currentTarget.querySelector<HTMLElement>(`[data-index="${next}"] a`)?.focus();
}

/**
 * The rows of the catalogue: each cable end-on, to one scale, with its figures. Of a long list only the rows in sight
 * are drawn.
 */
export function CableRows({ items, total, thickestMm, lossAtHz, canStartRun, held, toggleHold, onEnd }: Props) {
  const rowHeight = useRowHeight();
  const { ref, inSight } = useRowWindow(rowHeight, items.length, onEnd);
  const mmToPx = scaleFor(thickestMm, rowHeight);
  const [focused, setFocused] = useState<number | null>(null);
  return (
    <Table className="mt-1 phone:-mx-4 phone:w-screen" aria-rowcount={total + 1} aria-label="Cables">
      <Head lossAtHz={lossAtHz} mmToPx={mmToPx} />
      <tbody
        ref={ref}
        onKeyDown={step}
        onFocus={(event) => {
          const row = event.target.closest("[data-index]");
          setFocused(row ? Number(row.getAttribute("data-index")) : null);
        }}
        onBlur={() => setFocused(null)}
      >
        {segments(items.length, inSight, focused).map((segment) => {
          if (segment.kind === "gap")
            return (
              <tr key={`gap ${segment.from}`} aria-hidden="true">
                <td colSpan={columns} style={{ height: segment.rows * rowHeight }} className="p-0" />
              </tr>
            );
          const item = items[segment.index];
          if (!item) return null;
          return (
            <CableRow
              key={item.id}
              item={item}
              index={segment.index}
              href={entryAddress(item.id, { lossAtHz, held: [...held] }) as Route}
              canStartRun={canStartRun}
              isHeld={held.includes(item.id)}
              toggleHold={() => toggleHold(item)}
              mmToPx={mmToPx}
            />
          );
        })}
      </tbody>
    </Table>
  );
}
