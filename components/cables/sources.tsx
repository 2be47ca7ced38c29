import { conditionWords, figureName, quantityName, toleranceWords } from "@/components/cables/figure-words";
import { Section } from "@/components/ui/section";
import type { Cable, Figure } from "@/lib/cables/schema";

/** Figures by where they came from, in the order in which the sources first appear. */
function bySource(figures: readonly Figure[]): [string, Figure[]][] {
  const sources = new Map<string, Figure[]>();
  for (const figure of figures) sources.set(figure.source, [...(sources.get(figure.source) ?? []), figure]);
  return [...sources];
}

const namesOf = (figures: readonly Figure[]) => [...new Set(figures.map(({ quantity }) => quantityName(quantity)))];

/** The parts of a source beyond its title, issue and page, which its one line has. */
function provenanceWords({ provenance }: Figure): string {
  if (!provenance) return "";
  const { enteredBy, checkedBy, instrument, calibration } = provenance;
  const parts = [
    enteredBy && `entered by ${enteredBy}`,
    checkedBy && `checked by ${checkedBy}`,
    instrument && `instrument ${instrument}`,
    calibration && `calibration ${calibration}`,
  ];
  return parts.filter(Boolean).join("; ");
}

function Line({ figure }: { figure: Figure }) {
  const { asTyped, kind, quantity, toleranceSi } = figure;
  const words = [kind, toleranceSi ? toleranceWords(quantity, toleranceSi) : "", conditionWords(figure)];
  const provenance = provenanceWords(figure);
  return (
    <li className="flex justify-between gap-3 py-0.5">
      <span className="text-ink-2">{figureName(figure)}</span>
      <span className="text-right">
        <span className="figures">{asTyped}</span>
        <span className="block text-note text-ink-3">{words.filter(Boolean).join(", ")}</span>
        {provenance && <span className="block text-note text-ink-3">{provenance}</span>}
      </span>
    </li>
  );
}

/** Where each figure of an entry came from, as its source gives it. */
export function Sources({ cable }: { cable: Cable }) {
  const sources = bySource(cable.figures);
  return (
    <Section title="Where each figure came from">
      <ul className="text-label">
        {sources.map(([source, figures]) => (
          <li key={source} className="border-b border-line py-1.25">
            <details>
              <summary className="grid cursor-pointer grid-cols-[132px_1fr] gap-2 marker:content-none [&::-webkit-details-marker]:hidden">
                <span className="text-ink-2">{namesOf(figures).join(", ")}</span>
                <span className="underline decoration-line underline-offset-3">{source}</span>
              </summary>
              <ul className="mt-1 border-l border-rule pl-2.5">
                {figures.map((figure, i) => (
                  <Line key={i} figure={figure} />
                ))}
              </ul>
            </details>
          </li>
        ))}
        <li className="grid grid-cols-[132px_1fr] gap-2 border-b border-line py-1.25">
          <span className="text-ink-2">Construction, limits</span>
          <span>the entry names no source for them</span>
        </li>
      </ul>
    </Section>
  );
}
