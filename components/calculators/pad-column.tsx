import { PadDrawing } from "@/components/calculators/pad-drawing";
import { Section } from "@/components/ui/section";
import { Cell, HeadCell, RowHead, Table } from "@/components/ui/table";
import type { PadShape } from "@/lib/calculators/pad";
import { decibels, digits, inWords, scaled } from "@/lib/format/quantity";
import { returnLossDb } from "@/lib/line/reflection";

interface Props {
  shape: PadShape;
  sourceOhm: number;
  loadOhm: number;
  lossDb: number;
}

const titles = { T: "As a T", pi: "As a pi" };
const armNames = {
  T: ["Series, source side", "Across", "Series, load side"],
  pi: ["Across, source side", "Series", "Across, load side"],
};

/** A resistor as it is bought: a wire for none in line, nothing for none across. */
function ohms(value: number, significant: number): string {
  if (value === 0) return "a wire";
  return value === Infinity ? "none" : inWords(scaled("resistance", value, significant));
}

const watts = (value: number) => inWords(scaled("power", value, 3));

/** One way of building the pad: drawn, exact, in E24 values, and what those give. */
export function PadColumn({ shape, sourceOhm, loadOhm, lossDb }: Props) {
  const { topology, exact, standard } = shape;
  return (
    <Section title={titles[topology]}>
      <PadDrawing
        topology={topology}
        resistors={exact.resistors}
        sourceOhm={sourceOhm}
        loadOhm={loadOhm}
        name={`${titles[topology]}: ${exact.resistors.map((value) => ohms(value, 4)).join(", ")}`}
      />
      <Table>
        <thead>
          <tr>
            <HeadCell>From the source</HeadCell>
            <HeadCell isRight>exact</HeadCell>
            <HeadCell isRight>takes</HeadCell>
            <HeadCell isRight>E24</HeadCell>
            <HeadCell isRight>takes</HeadCell>
          </tr>
        </thead>
        <tbody className="[&_td]:whitespace-nowrap">
          {armNames[topology].map((name, k) => (
            <tr key={name}>
              <RowHead>{name}</RowHead>
              <Cell isRight className="figures">
                {ohms(exact.resistors[k] ?? NaN, 4)}
              </Cell>
              <Cell isRight className="figures">
                {watts(exact.powersW[k] ?? NaN)}
              </Cell>
              <Cell isRight className="figures">
                <b>{ohms(standard.resistors[k] ?? NaN, 2)}</b>
              </Cell>
              <Cell isRight className="figures">
                {watts(standard.powersW[k] ?? NaN)}
              </Cell>
            </tr>
          ))}
          <tr>
            <RowHead>The load gets</RowHead>
            <Cell />
            <Cell isRight className="figures">
              {watts(exact.loadW)}
            </Cell>
            <Cell />
            <Cell isRight className="figures">
              {watts(standard.loadW)}
            </Cell>
          </tr>
        </tbody>
      </Table>
      <Given shape={shape} lossDb={lossDb} />
    </Section>
  );
}

/** What the E24 values give in place of what was asked. */
function Given({ shape: { standard }, lossDb }: { shape: PadShape; lossDb: number }) {
  const { figures } = standard;
  const side = (ohm: number, reflection: number) => {
    const reached = returnLossDb(reflection);
    return `${inWords(scaled("resistance", ohm, 4))}, return loss ${Number.isFinite(reached) && reached < 80 ? `${digits(reached, 1)} dB` : "over 80 dB"}`;
  };
  const off = figures.lossDb - lossDb;
  return (
    <dl className="mt-3 grid grid-cols-[auto_minmax(0,1fr)] gap-x-4 gap-y-1 text-label">
      <dt className="text-ink-2">E24 loses</dt>
      <dd>
        <b className="figures">{inWords(decibels(figures.lossDb))}</b>
        <span className="text-ink-2">
          {" "}
          ({off < 0 ? "\u2212" : "+"}
          {digits(Math.abs(off), 2)} dB)
        </span>
      </dd>
      <dt className="text-ink-2">shows the source</dt>
      <dd>{side(figures.inputOhm, figures.inputReflection)}</dd>
      <dt className="text-ink-2">shows the load</dt>
      <dd>{side(figures.outputOhm, figures.outputReflection)}</dd>
    </dl>
  );
}
