import type { ReactNode } from "react";
import { Figure } from "@/components/ui/figure";
import { Section } from "@/components/ui/section";
import { StateNote, type MarkedState } from "@/components/ui/state-mark";
import { Cell, HeadCell, RowHead, Table } from "@/components/ui/table";
import { insulationsOf } from "@/lib/calculators/dielectrics";
import type { PerLength } from "@/lib/calculators/per-length";
import { digits, inWords, significantDigits, type Figure as Shown } from "@/lib/format/quantity";
import { agreementLimits, type PerLengthQuantity } from "@/lib/line/per-length";

interface Named {
  name: string;
  unit: string;
  /** from SI to the unit */
  scale: number;
}

const named: Record<PerLengthQuantity, Named> = {
  z0: { name: "impedance", unit: "Ω", scale: 1 },
  velocityFactor: { name: "velocity factor", unit: "", scale: 1 },
  delay: { name: "delay", unit: "ns/m", scale: 1e9 },
  capacitance: { name: "capacitance", unit: "pF/m", scale: 1e12 },
  inductance: { name: "inductance", unit: "nH/m", scale: 1e9 },
};

function figureOf(quantity: PerLengthQuantity, value: number): Shown {
  const { unit, scale } = named[quantity];
  return { digits: significantDigits(value * scale, 3), unit, spoken: unit };
}

const written = (quantity: PerLengthQuantity, value: number) => inWords(figureOf(quantity, value));

const signed = (share: number) => `${share < 0 ? "\u2212" : "+"}${digits(Math.abs(share) * 100, 1)}\u00a0%`;

const marks: Record<PerLength["grade"], MarkedState> = {
  alone: "none",
  fine: "pass",
  look: "warn",
  contradiction: "fail",
};

/** Whether the figures that were given agree, by how much not, and which of them may be the wrong one. */
export function Agreement({ result }: { result: PerLength }) {
  const { agreement, grade, alternatives } = result;
  return (
    <Section
      title="Do they agree?"
      note={`${percent(agreementLimits.fine)} is rounding, beyond ${percent(agreementLimits.look)} is a contradiction`}
    >
      <StateNote state={marks[grade]} className="mt-2">
        {verdict(result)}
      </StateNote>
      {agreement.compared.length > 0 && <ComparedTable result={result} />}
      {alternatives.length > 0 && <Alternatives result={result} />}
    </Section>
  );
}

const capital = (text = "") => text.charAt(0).toUpperCase() + text.slice(1);
const percent = (share: number) => `${digits(share * 100, 0)}\u00a0%`;

function verdict({ agreement, grade }: PerLength): ReactNode {
  const { from, compared, worst, oddOneOut } = agreement;
  const [first, second] = from.map((quantity) => named[quantity].name);
  if (grade === "alone") return `From ${first} and ${second} alone. A third figure would be held against them.`;
  if (grade === "fine")
    return `What is given agrees within ${digits(worst * 100, 1)}\u00a0%; rounding explains up to ${percent(agreementLimits.fine)}.`;
  const furthest = compared.reduce((most, next) => (Math.abs(next.deviation) > Math.abs(most.deviation) ? next : most));
  const { quantity, value, implied, deviation } = furthest;
  const how = grade === "look" ? "worth a look" : "a contradiction";
  return (
    <>
      {capital(first)} and {second} make the {named[quantity].name} {written(quantity, implied)}; given is{" "}
      {written(quantity, value)}, <b>{signed(deviation)}</b>: {how}.
      {oddOneOut && ` Without the ${named[oddOneOut].name} the others agree, so look there first.`}
    </>
  );
}

function ComparedTable({ result: { agreement } }: { result: PerLength }) {
  return (
    <Table className="mt-2">
      <thead>
        <tr>
          <HeadCell>Given besides</HeadCell>
          <HeadCell isRight>given</HeadCell>
          <HeadCell isRight>follows</HeadCell>
          <HeadCell isRight>apart</HeadCell>
        </tr>
      </thead>
      <tbody>
        {agreement.compared.map(({ quantity, value, implied, deviation }) => (
          <tr key={quantity}>
            <RowHead>{capital(named[quantity].name)}</RowHead>
            <Cell isRight>
              <Figure {...figureOf(quantity, value)} />
            </Cell>
            <Cell isRight>
              <Figure {...figureOf(quantity, implied)} />
            </Cell>
            <Cell isRight className="figures">
              {signed(deviation)}
            </Cell>
          </tr>
        ))}
      </tbody>
    </Table>
  );
}

/** Each of three as the wrong one: what the other two make of it, and which insulation that would be. */
function Alternatives({ result: { alternatives } }: { result: PerLength }) {
  return (
    <>
      <p className="mt-4 text-label text-ink-2">Three figures cannot say which of them is wrong. It could be</p>
      <Table>
        <tbody>
          {alternatives.map(({ quantity, given, others }) => {
            const insulations = insulationsOf(others.velocityFactor);
            return (
              <tr key={quantity}>
                <RowHead>
                  the {named[quantity].name}, if it is {written(quantity, others[quantity])} and not{" "}
                  {written(quantity, given)}
                </RowHead>
                <Cell className="pl-3">
                  velocity factor {significantDigits(others.velocityFactor, 3)},{" "}
                  {insulations.length > 0 ? `as with ${insulations.join(" or ")}` : "unusual for a coaxial cable"}
                </Cell>
              </tr>
            );
          })}
        </tbody>
      </Table>
    </>
  );
}
