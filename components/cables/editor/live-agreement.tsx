"use client";

import { useWatch } from "react-hook-form";
import { useEntryForm } from "@/components/cables/editor/entry-form";
import { usualHz } from "@/components/cables/editor/given-figures";
import { IfApproved } from "@/components/cables/editor/if-approved";
import { RoutePlot } from "@/components/plot/route-plot";
import { Section } from "@/components/ui/section";
import { StateGlyph, StateMark, type MarkedState } from "@/components/ui/state-mark";
import type { Verdict } from "@/lib/cables/agreement";
import type { Check } from "@/lib/cables/checks";
import { lossDbPer100m } from "@/lib/cables/model";
import { type Route, type RouteName, routesOf } from "@/lib/cables/ways/routes";
import { digits, frequency, inWords, significantDigits } from "@/lib/format/quantity";
import { nominalFigures } from "@/lib/line/cable";
import { agreementLimits } from "@/lib/line/per-length";

const routeWords: Record<RouteName, string> = {
  construction: "Construction",
  nominal: "Nominal",
  velocityAndC: "Velocity and C",
  impedanceAndC: "Impedance and C",
  inductanceAndC: "L and C",
  readings: "Meter readings",
  sweep: "Sweep of a sample",
  lossTable: "Loss table",
};

const marks: Record<Verdict, MarkedState> = { fine: "pass", look: "warn", contradiction: "fail" };
const verdictWords: Record<Verdict, string> = { fine: "agrees", look: "look at this", contradiction: "contradiction" };
const order: Verdict[] = ["contradiction", "look", "fine"];

interface RoutesProps {
  title: string;
  unit: string;
  routes: readonly Route[];
  /** what the model has; the band lies about it */
  ruling: number;
  /** of the unit shown, in one of the SI */
  scale?: number;
  format: (value: number) => string;
}

function Routes({ title, unit, routes, ruling, scale = 1, format }: RoutesProps) {
  if (routes.length === 0) return null;
  const band = [ruling * (1 - agreementLimits.fine) * scale, ruling * (1 + agreementLimits.fine) * scale] as const;
  return (
    <div className="mt-2.5">
      <h3 className="text-label">
        {title} <span className="unit font-[400]">{unit}</span>
      </h3>
      <RoutePlot
        routes={routes.map(({ route, value, spread }) => ({
          name: routeWords[route],
          value: value * scale,
          from: (value - spread) * scale,
          to: (value + spread) * scale,
        }))}
        band={band}
        format={format}
      />
    </div>
  );
}

function Checks({ checks }: { checks: readonly Check[] }) {
  const sorted = [...checks].sort((a, b) => order.indexOf(a.verdict) - order.indexOf(b.verdict));
  return (
    <ul className="mt-3 text-label" aria-label="Checks">
      {sorted.map(({ check, verdict, sentence }) => (
        <li key={check} className="flex items-start gap-2 border-b border-line py-1.25">
          <span className="mt-0.5">
            <StateGlyph state={marks[verdict]} />
          </span>
          <span className="sr-only">{verdictWords[verdict]}:</span>
          <span className={verdict === "fine" ? "text-ink-2" : ""}>{sentence}</span>
        </li>
      ))}
    </ul>
  );
}

/** A round frequency in the middle of the rows, where ways to the loss are compared. */
function comparedAt(frequencies: readonly number[]): number {
  if (frequencies.length === 0) return usualHz;
  const middle = Math.sqrt(Math.min(...frequencies) * Math.max(...frequencies));
  return Number(middle.toPrecision(2));
}

/** Every way on one axis, and what the checks say; it follows the typing. */
export function LiveAgreement() {
  const { edited, isBehind, form } = useEntryForm();
  const family = useWatch({ control: form.control, name: "family" });
  const { worked, checks, read } = edited;
  const { model, uncertainty } = worked;
  const open = checks.filter(({ verdict }) => verdict !== "fine").length;
  const worst = order.find((verdict) => checks.some((check) => check.verdict === verdict));
  const atHz = comparedAt((read.inputs.lossTable?.rows ?? []).map(({ frequencyHz }) => frequencyHz));
  const routes = routesOf({ inputs: read.inputs, family }, worked, atHz);
  const figures = model && nominalFigures(model);
  const percent = (share: number) => `±${digits(100 * share, 1)} %`;
  return (
    <Section
      title="Live agreement"
      note="Each way on one axis. The band is what a reviewer accepts without a note."
      isNoteBelow
      className={isBehind ? "opacity-60" : ""}
      aside={
        worst && (
          <span role="status">
            <StateMark state={marks[worst]}>
              {open === 0 ? "agrees with itself" : `${open} ${open === 1 ? "thing" : "things"} to look at`}
            </StateMark>
          </span>
        )
      }
    >
      {!figures && <p className="mt-2 text-label text-ink-2">{worked.missing}</p>}
      {figures && model && uncertainty && (
        <>
          <Routes title="Impedance" unit="Ω" routes={routes.z0} ruling={figures.z0} format={(v) => digits(v, 1)} />
          <Routes
            title="Velocity factor"
            unit=""
            routes={routes.velocityFactor}
            ruling={figures.velocityFactor}
            format={(v) => digits(v, 3)}
          />
          <Routes
            title={`Loss at ${inWords(frequency(atHz))}`}
            unit="dB/100 m"
            routes={routes.loss}
            ruling={lossDbPer100m(model, atHz) / 100}
            scale={100}
            format={(v) => significantDigits(v, 3)}
          />
          <p className="mt-2 text-label text-ink-2">
            The model: <span className="figures text-ink">{digits(figures.z0, 1)}</span> Ω {percent(uncertainty.z0)},
            velocity <span className="figures text-ink">{digits(figures.velocityFactor, 3)}</span>{" "}
            {percent(uncertainty.velocityFactor)}, loss {percent(uncertainty.loss)}; 95 % of cases.
          </p>
          <Checks checks={checks} />
        </>
      )}
      {worked.notes.map((note) => (
        <p key={note} className="mt-1.5 text-note text-ink-3">
          {note}
        </p>
      ))}
      <IfApproved />
    </Section>
  );
}
