"use client";

import { Section } from "@/components/ui/section";
import { Cell, HeadCell, RowHead, Table } from "@/components/ui/table";
import { digits } from "@/lib/format/quantity";
import type { ToleranceResult } from "@/lib/line/tolerance";
import type { NamedSpread } from "@/lib/runs/spread";

const barPx = 110;
const mostRows = 14;

/** What moves the worst figure most, each alone from limit to limit. */
export function Contributors({ result, spread }: { result: ToleranceResult; spread: readonly NamedSpread[] }) {
  const names = new Map(spread.map(({ path, name }) => [path, name]));
  const known = result.contributors.filter(({ path }) => names.has(path));
  const most = Math.max(0, ...known.map(({ effectDb }) => effectDb));
  const shown = known.slice(0, mostRows);
  return (
    <Section title="What matters most">
      <p className="text-label text-ink-2">
        How far the worst return loss or loss over the frequencies shown moves while one quantity alone goes from limit
        to limit.
      </p>
      <Table className="mt-1">
        <thead>
          <tr>
            <HeadCell>Quantity</HeadCell>
            <HeadCell isRight>dB</HeadCell>
            <HeadCell aria-label="Share" className="w-30 phone:hidden" />
          </tr>
        </thead>
        <tbody>
          {shown.map(({ path, effectDb }) => (
            <tr key={path}>
              <RowHead>{names.get(path)}</RowHead>
              <Cell isRight className="figures">
                {digits(effectDb, 2)}
              </Cell>
              <Cell className="pl-3 phone:hidden">
                <svg width={barPx} height="9" aria-hidden="true" className="inline-block">
                  <rect width={most > 0 ? (effectDb / most) * barPx : 0} height="9" fill="var(--copper-fill)" />
                </svg>
              </Cell>
            </tr>
          ))}
        </tbody>
      </Table>
      {known.length > shown.length && (
        <p className="mt-1 text-note text-ink-3">{known.length - shown.length} more matter less.</p>
      )}
    </Section>
  );
}
