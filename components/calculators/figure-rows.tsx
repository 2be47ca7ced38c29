import type { ReactNode } from "react";
import { Figure } from "@/components/ui/figure";
import { Cell, RowHead, Table } from "@/components/ui/table";
import type { Figure as Shown } from "@/lib/format/quantity";

export interface FigureRow {
  label: ReactNode;
  figure: Shown;
  /** how it is meant, under the label */
  note?: ReactNode;
  isStrong?: boolean;
}

/** Figures one under the other, each with its name; units in one column. */
export function FigureRows({ rows, unitSlot = 5 }: { rows: readonly FigureRow[]; unitSlot?: number }) {
  return (
    <Table className="mt-1">
      <tbody>
        {rows.map(({ label, figure, note, isStrong }, i) => (
          <tr key={i}>
            <RowHead>
              {label}
              {note && <span className="block text-note text-ink-3">{note}</span>}
            </RowHead>
            <Cell isRight className="whitespace-nowrap">
              <Figure {...figure} isStrong={isStrong} unitSlot={unitSlot} className="text-control" />
            </Cell>
          </tr>
        ))}
      </tbody>
    </Table>
  );
}
