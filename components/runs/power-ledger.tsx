import { Cell, HeadCell, RowHead, Table } from "@/components/ui/table";
import { Section } from "@/components/ui/section";
import { digits, frequency, inWords } from "@/lib/format/quantity";
import type { Analysis } from "@/lib/runs/analysis";

interface Props {
  analysis: Analysis;
  names: string[];
  designHz: number;
  sourceName: string;
  loadName: string;
}

interface Row {
  name: string;
  lengthM: number | null;
  delayS: number | null;
  lossDb: number;
}

const barPx = 100;

function Bar({ lossDb, most, isHatched }: { lossDb: number; most: number; isHatched: boolean }) {
  const width = most > 0 && Number.isFinite(lossDb) ? Math.max(0, (lossDb / most) * barPx) : 0;
  return (
    <svg width={barPx} height="9" aria-hidden="true" className="inline-block">
      {isHatched ? (
        <rect x=".5" y=".5" width={Math.max(0, width - 1)} height="8" fill="url(#rw-hatch)" stroke="var(--rule)" />
      ) : (
        <rect width={width} height="9" fill="var(--copper-fill)" />
      )}
    </svg>
  );
}

/** Where the power goes along the line: each piece's matched loss, what mismatch and standing waves add, and the sum. */
export function PowerLedger({ analysis, names, designHz, sourceName, loadName }: Props) {
  const { pieces, spot } = analysis;
  const rows: Row[] = pieces
    .map(({ lengthM, delayS, matchedLossDb }, i) => ({ name: names[i] ?? "", lengthM, delayS, lossDb: matchedLossDb }))
    .filter((row) => row.lossDb > 0 || row.lengthM !== null);
  const added = spot.mismatchLossDb + spot.extraLossDb;
  const most = Math.max(added, ...rows.map((row) => row.lossDb));
  const total = (key: "lengthM" | "delayS", scale: number, decimals: number) =>
    digits(rows.reduce((sum, row) => sum + (row[key] ?? 0), 0) * scale, decimals);
  return (
    <Section title="Where the power goes">
      <Table className="mt-1">
        <thead>
          <tr>
            <HeadCell>Along the line, {inWords(frequency(designHz))}</HeadCell>
            <HeadCell isRight>m</HeadCell>
            <HeadCell isRight>ns</HeadCell>
            <HeadCell isRight>dB</HeadCell>
            <HeadCell aria-label="Share" className="w-28 phone:hidden" />
          </tr>
        </thead>
        <tbody>
          {rows.map((row, i) => (
            <tr key={i}>
              <RowHead>{row.name}</RowHead>
              <Cell isRight className="figures">
                {row.lengthM === null ? "" : digits(row.lengthM, 2)}
              </Cell>
              <Cell isRight className="figures">
                {row.delayS === null ? "" : digits(row.delayS * 1e9, 1)}
              </Cell>
              <Cell isRight className="figures">
                {digits(row.lossDb, 3)}
              </Cell>
              <Cell className="pl-3 text-left phone:hidden">
                <Bar lossDb={row.lossDb} most={most} isHatched={false} />
              </Cell>
            </tr>
          ))}
          <tr>
            <RowHead className="whitespace-nowrap phone:whitespace-normal">Mismatch and standing waves</RowHead>
            <Cell />
            <Cell />
            <Cell isRight className="figures">
              {digits(added, 3)}
            </Cell>
            <Cell className="pl-3 text-left phone:hidden">
              <Bar lossDb={added} most={most} isHatched />
            </Cell>
          </tr>
        </tbody>
        <tfoot>
          <tr className="font-[640]">
            <RowHead className="border-0">
              <b>
                {sourceName} to {loadName}
              </b>
            </RowHead>
            <Cell isRight className="figures border-0">
              {total("lengthM", 1, 2)}
            </Cell>
            <Cell isRight className="figures border-0">
              {total("delayS", 1e9, 1)}
            </Cell>
            <Cell isRight className="figures border-0">
              {digits(spot.transducerLossDb, 3)}
            </Cell>
            <Cell className="border-0 phone:hidden" />
          </tr>
        </tfoot>
      </Table>
    </Section>
  );
}
