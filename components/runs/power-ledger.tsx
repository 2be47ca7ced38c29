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
    .map((piece, i) => ({
      name: names[i] ?? "",
      lengthM: piece.lengthM,
      delayS: piece.delayS,
      lossDb: piece.isMatched ? piece.matchedLossDb : piece.lossDb,
    }))
    .filter((row) => row.lossDb > 0 || row.lengthM !== null);
  // Of cables, joints and pads the loss between matched ends stands in the rows, of other pieces what they really lose;
  // what is left of the whole is what mismatch and standing waves add.
  const added = spot.transducerLossDb - rows.reduce((sum, row) => sum + row.lossDb, 0);
  const most = Math.max(added, ...rows.map((row) => row.lossDb));
  const onPath = pieces.filter(({ pathM }) => pathM > 0);
  const pathM = onPath.reduce((sum, piece) => sum + piece.pathM, 0);
  // Different cables side by side have no one delay, and then the path has none either.
  const pathS = onPath.some(({ delayS }) => delayS === null)
    ? null
    : onPath.reduce((sum, { delayS }) => sum + (delayS ?? 0), 0);
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
              <RowHead className="wrap-anywhere">{row.name}</RowHead>
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
            <RowHead className="wrap-anywhere border-0">
              <b>
                {sourceName} to {loadName}
              </b>
            </RowHead>
            <Cell isRight className="figures border-0">
              {digits(pathM, 2)}
            </Cell>
            <Cell isRight className="figures border-0">
              {digits(pathS === null ? null : pathS * 1e9, 1)}
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
