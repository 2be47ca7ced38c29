import { RoutePlot } from "@/components/plot/route-plot";
import { Section } from "@/components/ui/section";
import { StateGlyph, StateMark, type MarkedState } from "@/components/ui/state-mark";
import { withinWords } from "@/lib/cables/checking/check";
import { agreementOfEntry, type Check, type ImpedanceRoute, type Verdict } from "@/lib/cables/agreement";
import type { Cable } from "@/lib/cables/schema";
import { digits, inWords, scaled } from "@/lib/format/quantity";
import { agreementLimits, type PerLengthQuantity } from "@/lib/line/per-length";

const routeWords: Record<ImpedanceRoute["route"], string> = {
  stated: "Stated",
  capacitanceAndVelocity: "From C and velocity",
  model: "The model’s",
};

const checkWords: Record<Check["check"], string> = {
  triangle: "Impedance, velocity and C",
  model: "Model against stated figures",
  lossTable: "Model against the loss table",
  cutoff: "Second mode beyond the rating",
};

const oddWords: Record<PerLengthQuantity, string> = {
  z0: "the impedance",
  velocityFactor: "the velocity factor",
  delay: "the delay",
  capacitance: "the capacitance",
  inductance: "the inductance",
};

const marks: Record<Verdict, MarkedState> = { fine: "pass", look: "warn", contradiction: "fail" };
const verdictWords: Record<Verdict, string> = { fine: "agrees", look: "look at this", contradiction: "contradiction" };

function amount({ check, percent, frequencyHz }: Check): string {
  if (check === "cutoff") return inWords(scaled("frequency", frequencyHz, 3));
  const shown = digits(percent, 1);
  return check === "lossTable" ? `${shown} % rms` : `${Number(percent.toFixed(1)) > 0 ? "+" : ""}${shown} %`;
}

/** The worst of what can disagree; the cut-off is no matter of per cent. */
function Overall({ checks }: { checks: readonly Check[] }) {
  const worst = (["contradiction", "look", "fine"] as const).find((verdict) =>
    checks.some((check) => check.verdict === verdict),
  );
  if (!worst) return null;
  const most = checks
    .filter(({ check }) => check !== "cutoff")
    .reduce((far, { percent }) => Math.max(far, Math.abs(percent)), 0);
  return (
    <StateMark state={marks[worst]}>
      {worst === "fine" ? `within ${withinWords(most / 100)}` : verdictWords[worst]}
    </StateMark>
  );
}

/** Whether what the entry states agrees with itself and with the model. */
export function Agreement({ cable }: { cable: Cable }) {
  const { routes, checks, oddOneOut } = agreementOfEntry(cable);
  const stated = routes.find(({ route }) => route === "stated");
  const band =
    stated && ([stated.z0Ohm * (1 - agreementLimits.fine), stated.z0Ohm * (1 + agreementLimits.fine)] as const);
  return (
    <Section title="Do the figures agree?" aside={<Overall checks={checks} />}>
      <p className="mt-0.5 mb-1.5 text-label text-ink-2">
        Impedance by {routes.length === 1 ? "one route" : `${["", "", "two", "three"][routes.length]} routes`}, Ω
        {band && "; washed: within 3 %"}
      </p>
      <RoutePlot
        routes={routes.map(({ route, z0Ohm, fromOhm, toOhm }) => ({
          name: routeWords[route],
          value: z0Ohm,
          from: fromOhm,
          to: toOhm,
        }))}
        band={band}
        format={(value) => digits(value, 1)}
      />
      {checks.length === 0 ? (
        <p className="mt-1 text-label text-ink-2">Too little is stated to check one figure against another.</p>
      ) : (
        <ul className="mt-2 text-label">
          {checks.map((check) => (
            <li key={check.check} className="flex items-center gap-1.5 py-0.5">
              <StateGlyph state={marks[check.verdict]} />
              <span className="flex-1 text-ink-2">{checkWords[check.check]}</span>
              <span className="sr-only">{verdictWords[check.verdict]}:</span>
              <span className="figures">{amount(check)}</span>
            </li>
          ))}
        </ul>
      )}
      {oddOneOut && <p className="mt-1 text-label">Without {oddWords[oddOneOut]} the others agree.</p>}
    </Section>
  );
}
