import { PadDrawing } from "@/components/calculators/pad-drawing";
import { PadTable } from "@/components/calculators/pad-table";
import { Section } from "@/components/ui/section";
import type { PadShape } from "@/lib/calculators/pad";
import { decibels, inWords, scaled } from "@/lib/format/quantity";
import { returnLossDb } from "@/lib/line/reflection";

interface Props {
  shape: PadShape;
  sourceOhm: number;
  loadOhm: number;
  lossDb: number;
}

const titles = { T: "As a T", pi: "As a pi" };

function spokenOhms(value: number): string {
  if (value === 0) return "a wire";
  return value === Infinity ? "no resistor" : inWords(scaled("resistance", value));
}

/** One way of building the pad: drawn, exact, in E24 values, and what those give. */
export function PadColumn({ shape, sourceOhm, loadOhm, lossDb }: Props) {
  const { topology, exact } = shape;
  return (
    <Section title={titles[topology]}>
      <PadDrawing
        topology={topology}
        resistors={exact.resistors}
        sourceOhm={sourceOhm}
        loadOhm={loadOhm}
        name={`${titles[topology]}: ${exact.resistors.map(spokenOhms).join(", ")}`}
      />
      <PadTable shape={shape} />
      <Given shape={shape} lossDb={lossDb} />
    </Section>
  );
}

/** What the E24 values give in place of what was asked. */
function Given({ shape: { standard }, lossDb }: { shape: PadShape; lossDb: number }) {
  const { figures } = standard;
  const side = (ohm: number, reflection: number) => {
    const reached = returnLossDb(reflection);
    const words = reached < 80 ? inWords(decibels(reached, 1)) : "over 80\u00a0dB";
    return `${inWords(scaled("resistance", ohm))}, return loss ${words}`;
  };
  const off = figures.lossDb - lossDb;
  return (
    <dl className="mt-3 grid grid-cols-[auto_minmax(0,1fr)] gap-x-4 gap-y-1 text-label">
      <dt className="text-ink-2">E24 loses</dt>
      <dd>
        <b>{inWords(decibels(figures.lossDb))}</b>
        <span className="text-ink-2">
          {" "}
          ({off < 0 ? "\u2212" : "+"}
          {inWords(decibels(Math.abs(off)))})
        </span>
      </dd>
      <dt className="text-ink-2">shows the source</dt>
      <dd>{side(figures.inputOhm, figures.inputReflection)}</dd>
      <dt className="text-ink-2">shows the load</dt>
      <dd>{side(figures.outputOhm, figures.outputReflection)}</dd>
    </dl>
  );
}
