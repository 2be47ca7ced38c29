import { figureName, figureValue, toleranceWords } from "@/components/cables/figure-words";
import { Figure as FigureView } from "@/components/ui/figure";
import { Section } from "@/components/ui/section";
import { Cell, RowHead, Table } from "@/components/ui/table";
import type { Cable, Figure } from "@/lib/cables/schema";
import { digits, frequency, scaled } from "@/lib/format/quantity";

interface Row {
  name: string;
  digits: string;
  unit: string;
  /** the least or the most, or the kind of figure */
  boundWords?: string;
  /** tolerance, or the least or the most */
  bound?: string;
}

const kindWords: Record<Figure["kind"], string> = {
  nominal: "nominal",
  typical: "typical",
  minimum: "at least",
  maximum: "at most",
  measured: "measured",
  derived: "worked out",
};

const isBound = ({ kind }: Figure) => kind === "maximum" || kind === "minimum";

/** A figure with what bounds it: its tolerance, else the least or the most stated of the same thing. */
function figureRow(figure: Figure, figures: readonly Figure[]): Row {
  const { quantity, valueSi, toleranceSi, kind, fromHz } = figure;
  const bound = figures.find((other) => isBound(other) && other.quantity === quantity && other.fromHz === fromHz);
  const row = { name: figureName(figure), ...figureValue(quantity, valueSi) };
  if (toleranceSi) return { ...row, bound: toleranceWords(quantity, toleranceSi) };
  if (!bound || bound === figure) return { ...row, boundWords: kindWords[kind] };
  return { ...row, boundWords: kindWords[bound.kind], bound: figureValue(quantity, bound.valueSi).digits };
}

function limitRows({ limits, construction }: Cable): Row[] {
  const { maxFrequencyHz, maxVoltageV, minBendMm, minTemperatureC, maxTemperatureC } = limits;
  const rows: Row[] = [];
  if (construction?.outerDiameterMm !== undefined)
    rows.push({ name: "Outer diameter", digits: digits(construction.outerDiameterMm, 1), unit: "mm" });
  if (minBendMm !== undefined)
    rows.push({ name: "Bend radius", digits: digits(minBendMm, 0), unit: "mm", boundWords: "at least" });
  if (minTemperatureC !== undefined || maxTemperatureC !== undefined) {
    const [low, high] = [minTemperatureC, maxTemperatureC].map((celsius) =>
      celsius === undefined ? "…" : digits(celsius, 0),
    );
    rows.push({ name: "Temperature", digits: `${low} to ${high}`, unit: "°C" });
  }
  if (maxFrequencyHz !== undefined)
    rows.push({ name: "Frequency", ...frequency(maxFrequencyHz), boundWords: "at most" });
  if (maxVoltageV !== undefined)
    rows.push({ name: "Voltage", ...scaled("voltage", maxVoltageV, 3), boundWords: "at most" });
  return rows;
}

/** What the entry states with its tolerances, and what it may be put to. */
export function Tolerances({ cable }: { cable: Cable }) {
  const { figures } = cable;
  const hasPartner = (bound: Figure) =>
    figures.some((other) => !isBound(other) && other.quantity === bound.quantity && other.fromHz === bound.fromHz);
  // A bound stands beside the figure it bounds; alone it has a row of its own.
  const shown = figures.filter((figure) => !isBound(figure) || !hasPartner(figure));
  const rows = [...shown.map((figure) => figureRow(figure, figures)), ...limitRows(cable)];
  return (
    <Section title="Tolerances and limits">
      {rows.length === 0 ? (
        <p className="mt-1 text-label text-ink-2">The entry states no figures beyond its model.</p>
      ) : (
        <Table className="mt-0.5">
          <tbody>
            {rows.map(({ name, digits: shownDigits, unit, boundWords, bound }, i) => (
              <tr key={i}>
                <RowHead className="text-ink-2">{name}</RowHead>
                <Cell isRight className="whitespace-nowrap">
                  <FigureView digits={shownDigits} unit={unit} unitSlot={4.6} />
                </Cell>
                <Cell isRight className="w-26 whitespace-nowrap text-ink-2">
                  {boundWords} {bound && <span className="figures">{bound}</span>}
                </Cell>
              </tr>
            ))}
          </tbody>
        </Table>
      )}
    </Section>
  );
}
