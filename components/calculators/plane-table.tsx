import { Section } from "@/components/ui/section";
import { Cell, HeadCell, RowHead, Table } from "@/components/ui/table";
import type { MismatchResult, PlaneReading } from "@/lib/calculators/mismatch";
import { decibels, inWords, ratio, scaled } from "@/lib/format/quantity";

interface Props {
  result: MismatchResult;
  lossDb: number;
  given: "forward" | "net";
}

interface Row {
  label: string;
  text: (reading: PlaneReading) => string;
  isStrong?: boolean;
}

const watts = (value: number) => inWords(scaled("power", value, 4));
const volts = (value: number) => inWords(scaled("voltage", value, 3));
const amperes = (value: number) => inWords(scaled("current", value, 3));
/** A sine's peak over its rms. */
const crest = Math.SQRT2;

const rows: Row[] = [
  { label: "VSWR", text: ({ vswr }) => ratio(vswr, 3).digits },
  {
    label: "Return loss",
    text: ({ returnLossDb }) => inWords(decibels(Number.isFinite(returnLossDb) ? returnLossDb : null)),
  },
  { label: "Forward power", text: ({ forwardW }) => watts(forwardW) },
  { label: "Reflected power", text: ({ reflectedW }) => watts(reflectedW) },
  { label: "Net power, toward the load", text: ({ netW }) => watts(netW), isStrong: true },
  { label: "Highest voltage, rms", text: ({ extremes }) => volts(extremes.highestV) },
  { label: "Highest voltage, peak", text: ({ extremes }) => volts(extremes.highestV * crest), isStrong: true },
  { label: "Lowest voltage, rms", text: ({ extremes }) => volts(extremes.lowestV) },
  { label: "Highest current, rms", text: ({ extremes }) => amperes(extremes.highestA) },
  { label: "Highest current, peak", text: ({ extremes }) => amperes(extremes.highestA * crest) },
  { label: "Lowest current, rms", text: ({ extremes }) => amperes(extremes.lowestA) },
];

/** What a meter reads at both ends of the line, and what the line takes from the power on the way. */
export function PlaneTable({ result, lossDb, given }: Props) {
  const { near, load, totalLossDb, extraLossDb } = result;
  return (
    <Section
      title="Power, volts and amperes"
      note={`from ${watts(given === "forward" ? near.forwardW : near.netW)} ${given} at the near end`}
    >
      <Table className="mt-1">
        <thead>
          <tr>
            <HeadCell>Within half a wavelength of</HeadCell>
            <HeadCell isRight>the near end</HeadCell>
            <HeadCell isRight>the load</HeadCell>
          </tr>
        </thead>
        <tbody>
          {rows.map(({ label, text, isStrong }) => (
            <tr key={label}>
              <RowHead>{label}</RowHead>
              {[near, load].map((reading, i) => (
                <Cell key={i} isRight className={`figures whitespace-nowrap ${isStrong ? "font-[650]" : ""}`}>
                  {text(reading)}
                </Cell>
              ))}
            </tr>
          ))}
        </tbody>
      </Table>
      <p className="mt-3 text-label text-ink-2">
        {lossDb === 0
          ? "Without loss both ends read the same."
          : `The line loses ${inWords(decibels(totalLossDb))} of the net power: ${inWords(decibels(lossDb))} matched, ${inWords(decibels(extraLossDb, 3))} more for the standing wave.`}
      </p>
    </Section>
  );
}
