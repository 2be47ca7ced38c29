"use client";

import { useState, type ReactNode } from "react";
import { LossFrequency, MeasureFacetRange, type FacetsProps } from "@/components/cables/catalogue-facets";
import { FamilyChecks, StateChecks } from "@/components/cables/facet-checks";
import {
  axisFigure,
  diameterFacet,
  impedanceFacet,
  lossFacet,
  velocityFacet,
  type MeasureFacet,
} from "@/components/cables/measure-facets";
import { familyWords, stateWords } from "@/components/cables/words";
import { Bars } from "@/components/plot/histogram-drawing";
import { axisEnds, handlePlaces, type Bin, type HistogramRange } from "@/components/plot/histogram-range";
import { frequency } from "@/lib/format/quantity";

type Card = MeasureFacet["measure"] | "family" | "state";

const miniature = { width: 92, height: 20 };

function Miniature({ bins, range }: { bins: readonly Bin[]; range: HistogramRange | undefined }) {
  const [low, high] = axisEnds(bins);
  const x = (value: number) => (miniature.width * (value - low)) / (high - low || 1);
  return (
    <svg {...miniature} viewBox="0 0 92 38" preserveAspectRatio="none" aria-hidden="true" className="mt-1 block">
      <Bars bins={bins} places={handlePlaces(bins, range ?? {})} x={x} />
    </svg>
  );
}

interface CardButtonProps {
  title: string;
  isOpen: boolean;
  toggle: () => void;
  /** what is kept, in a few signs */
  kept: string;
  children?: ReactNode;
}

function CardButton({ title, isOpen, toggle, kept, children }: CardButtonProps) {
  return (
    <li>
      <button
        type="button"
        aria-expanded={isOpen}
        onClick={toggle}
        className={`flex h-19 w-28 flex-col border border-rule border-b-[1.5px] px-2.5 py-1.5 text-left text-note ${isOpen ? "border-b-copper bg-copper-wash" : "border-b-ink"}`}
      >
        <span className="text-ink-2">{title}</span>
        {children}
        <span className={`mt-auto truncate text-ink ${children ? "figures" : "text-label"}`}>{kept}</span>
      </button>
    </li>
  );
}

function keptRange(facet: MeasureFacet, bins: readonly Bin[], range: HistogramRange | undefined): string {
  const [low, high] = axisEnds(bins);
  return `${axisFigure(range?.from ?? low)}–${axisFigure(range?.to ?? high)}${facet.unit && ` ${facet.unit}`}`;
}

/** The facets of a phone: cards scrolled sideways, each opening what it keeps. */
export function FacetCards(props: FacetsProps) {
  const { asked, change, facets } = props;
  const [open, setOpen] = useState<Card | null>(null);
  const toggle = (card: Card) => setOpen(open === card ? null : card);
  const { digits, unit } = frequency(asked.lossAtHz);
  const measures = [
    { facet: impedanceFacet, title: "Impedance" },
    { facet: lossFacet, title: `Loss at ${digits}${unit === "MHz" ? "" : ` ${unit}`}` },
    { facet: diameterFacet, title: "Outer, mm" },
    { facet: velocityFacet, title: "Velocity" },
  ];
  const opened = measures.find(({ facet }) => facet.measure === open)?.facet;
  return (
    <div className="mt-2">
      <ul className="-mx-4 flex gap-2 overflow-x-auto px-4 pb-1">
        {measures.map(({ facet, title }) => {
          const { measure } = facet;
          const bins = facets?.[measure] ?? [];
          return (
            <CardButton
              key={measure}
              title={title}
              isOpen={open === measure}
              toggle={() => toggle(measure)}
              kept={bins.length > 0 ? keptRange(facet, bins, asked.ranges[measure]) : "–"}
            >
              <Miniature bins={bins} range={asked.ranges[measure]} />
            </CardButton>
          );
        })}
        <CardButton
          title="Construction"
          isOpen={open === "family"}
          toggle={() => toggle("family")}
          kept={asked.families.map((family) => familyWords[family]).join(", ") || "All"}
        />
        <CardButton
          title="State"
          isOpen={open === "state"}
          toggle={() => toggle("state")}
          kept={asked.states.map((state) => stateWords[state].word).join(", ") || "Approved"}
        />
      </ul>
      {open && (
        <div className="mt-2 border-b border-rule pb-3">
          {open === "lossDbPer100m" && <LossFrequency asked={asked} change={change} className="mb-1" />}
          {opened && <MeasureFacetRange {...props} facet={opened} />}
          {open === "family" && (
            <FamilyChecks chosen={asked.families} counted={facets?.family} set={(families) => change({ families })} />
          )}
          {open === "state" && (
            <StateChecks chosen={asked.states} counted={facets?.state} set={(states) => change({ states })} />
          )}
        </div>
      )}
    </div>
  );
}
