"use client";

import { useRunEditor } from "@/components/runs/run-editor";
import { pieceName } from "@/components/runs/strip-pieces";
import { Section } from "@/components/ui/section";
import { Cell, HeadCell, RowHead, Table } from "@/components/ui/table";
import { digits, inWords, scaled } from "@/lib/format/quantity";
import type { TimeSignals } from "@/lib/runs/time/signals";

const time = (value: number) => inWords(scaled("time", value, 3));
const volt = (value: number) => inWords(scaled("voltage", value, 3));

/** What each tap of a bus sees; nothing where the run has none. */
export function TapTable({ signals: { taps } }: { signals: TimeSignals }) {
  const { draft, lines } = useRunEditor();
  if (taps.length === 0) return null;
  return (
    <Section title="At the taps" className="mt-6">
      <Table className="mt-1">
        <thead>
          <tr>
            <HeadCell>Tap</HeadCell>
            <HeadCell isRight>Reached</HeadCell>
            <HeadCell isRight className="phone:hidden">
              10–90 %
            </HeadCell>
            <HeadCell isRight>Overshoot</HeadCell>
            <HeadCell isRight>Settled</HeadCell>
            <HeadCell isRight>Level</HeadCell>
          </tr>
        </thead>
        <tbody>
          {taps.map(({ element, readings }) => (
            <tr key={element}>
              <RowHead>{pieceName(draft.circuit.elements, element, lines)}</RowHead>
              <Cell isRight>{time(readings.reachedS)}</Cell>
              <Cell isRight className="phone:hidden">
                {time(readings.riseS)}
              </Cell>
              <Cell isRight>{digits(readings.overshoot * 100, 1)} %</Cell>
              <Cell isRight>{time(readings.settlingS)}</Cell>
              <Cell isRight>{volt(readings.settledV)}</Cell>
            </tr>
          ))}
        </tbody>
      </Table>
    </Section>
  );
}
