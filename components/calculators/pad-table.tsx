import { Figure } from "@/components/ui/figure";
import { Cell, HeadCell, RowHead, Table } from "@/components/ui/table";
import type { PadShape } from "@/lib/calculators/pad";
import { scaled, type Figure as Shown } from "@/lib/format/quantity";

const armNames = {
  T: ["Series, source side", "Across", "Series, load side"],
  pi: ["Across, source side", "Series", "Across, load side"],
};

/** A resistor as it is bought: a wire for none in line, nothing for none across. */
function ohms(value: number, significant: number): Shown {
  const words = value === 0 ? "a wire" : value === Infinity ? "none" : null;
  return words === null ? scaled("resistance", value, significant) : { digits: words, unit: "", spoken: "" };
}

const watts = (value: number) => scaled("power", value, 3);

/** The three resistors, exact and in E24 values, with the power each takes. */
export function PadTable({ shape: { topology, exact, standard } }: { shape: PadShape }) {
  return (
    <Table>
      <thead>
        <tr>
          <HeadCell className="phone:whitespace-normal">From the source</HeadCell>
          <HeadCell isRight>exact</HeadCell>
          <HeadCell isRight className="phone:hidden">
            takes
          </HeadCell>
          <HeadCell isRight>E24</HeadCell>
          <HeadCell isRight>takes</HeadCell>
        </tr>
      </thead>
      <tbody>
        {armNames[topology].map((name, k) => (
          <tr key={name}>
            <RowHead>{name}</RowHead>
            <Cell isRight>
              <Figure {...ohms(exact.resistors[k] ?? NaN, 4)} />
            </Cell>
            <Cell isRight className="phone:hidden">
              <Figure {...watts(exact.powersW[k] ?? NaN)} />
            </Cell>
            <Cell isRight>
              <Figure {...ohms(standard.resistors[k] ?? NaN, 2)} isStrong />
            </Cell>
            <Cell isRight>
              <Figure {...watts(standard.powersW[k] ?? NaN)} />
            </Cell>
          </tr>
        ))}
        <tr>
          <RowHead>The load gets</RowHead>
          <Cell />
          <Cell isRight className="phone:hidden">
            <Figure {...watts(exact.loadW)} />
          </Cell>
          <Cell />
          <Cell isRight>
            <Figure {...watts(standard.loadW)} />
          </Cell>
        </tr>
      </tbody>
    </Table>
  );
}
