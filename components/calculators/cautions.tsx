import { Section } from "@/components/ui/section";
import { StateNote } from "@/components/ui/state-mark";
import type { Caution } from "@/lib/calculators/cautions";

/** What to know before relying on the figures; nothing where there is nothing. */
export function Cautions({ cautions }: { cautions: readonly Caution[] }) {
  if (cautions.length === 0) return null;
  return (
    <Section title="Before you rely on it" rule="light" className="mt-5">
      <div className="mt-1 flex flex-col gap-1.5">
        {cautions.map(({ weight, text }) => (
          <StateNote key={text} state={weight}>
            {text}
          </StateNote>
        ))}
      </div>
    </Section>
  );
}
