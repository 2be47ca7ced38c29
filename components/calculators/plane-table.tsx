import { Figure } from "@/components/ui/figure";
import { Section } from "@/components/ui/section";
import { Cell, HeadCell, RowHead, Table } from "@/components/ui/table";
import type { MismatchResult, PlaneReading } from "@/lib/calculators/mismatch";
import { decibels, inWords, ratio, scaled, type Figure as Shown } from "@/lib/format/quantity";

interface Props {
  result: MismatchResult;
  lossDb: number;
  given: "forward" | "net";
}

interface Row {
  label: string;
  figure: (reading: PlaneReading) => Shown;
  isStrong?: boolean;
}

const watts = (value: number) => scaled("power", value, 4);
const volts = (value: number) => scaled("voltage", value, 3);
const amperes = (value: number) => scaled("current", value, 3);
/** A sine's peak over its rms. */
const crest = Math.SQRT2;

const rows: Row[] = [
  { label: "VSWR", figure: ({ vswr }) => ratio(vswr, 3) },
  {
    label: "Return loss",
    figure: ({ returnLossDb }) => decibels(returnLossDb),
  },
  { label: "Forward power", figure: ({ forwardW }) => watts(forwardW) },
  { label: "Reflected power", figure: ({ reflectedW }) => watts(reflectedW) },
  { label: "Net power, toward the load", figure: ({ netW }) => watts(netW), isStrong: true },
  { label: "Highest voltage, rms", figure: ({ extremes }) => volts(extremes.highestV) },
  { label: "Highest voltage, peak", figure: ({ extremes }) => volts(extremes.highestV * crest), isStrong: true },
  { label: "Lowest voltage, rms", figure: ({ extremes }) => volts(extremes.lowestV) },
  { label: "Highest current, rms", figure: ({ extremes }) => amperes(extremes.highestA) },
  { label: "Highest current, peak", figure: ({ extremes }) => amperes(extremes.highestA * crest) },
  { label: "Lowest current, rms", figure: ({ extremes }) => amperes(extremes.lowestA) },
];

/** What a meter reads at both ends of the line, and what the line takes from the power on the way. */
export function PlaneTable({ result, lossDb, given }: Props) {
  const { near, load, totalLossDb, extraLossDb } = result;
  return (
    <Section
      title="Power, volts and amperes"
      note={`from ${inWords(watts(given === "forward" ? near.forwardW : near.netW))} ${given} at the near end`}
    >
      <Table className="mt-1">
        <thead>
          <tr>
            <HeadCell className="phone:whitespace-normal">Within half a wavelength of</HeadCell>
            <HeadCell isRight>the near end</HeadCell>
            <HeadCell isRight>the load</HeadCell>
          </tr>
        </thead>
        <tbody>
          {rows.map(({ label, figure, isStrong }) => (
            <tr key={label}>
              <RowHead>{label}</RowHead>
              {[near, load].map((reading, i) => (
                <Cell key={i} isRight>
                  <Figure {...figure(reading)} isStrong={isStrong} unitSlot={2.4} />
                </Cell>
              ))}
            </tr>
          ))}
        </tbody>
      </Table>
      <p className="mt-3 text-label text-ink-2">
        {lossDb === 0
          ? "Without loss both ends read the same."
          : totalLossDb === Infinity
            ? "The load takes nothing: all of the net power stays in the line."
            : `The line loses ${inWords(decibels(totalLossDb))} of the net power: ${inWords(decibels(lossDb))} matched, ${inWords(decibels(extraLossDb, 3))} more for the standing wave.`}
      </p>
    </Section>
  );
}
