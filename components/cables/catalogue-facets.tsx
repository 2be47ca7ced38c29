"use client";

import { FamilyChecks, StateChecks } from "@/components/cables/facet-checks";
import {
  diameterFacet,
  impedanceFacet,
  lossFacet,
  velocityFacet,
  type MeasureFacet,
} from "@/components/cables/measure-facets";
import { MeasureRange } from "@/components/cables/measure-range";
import type { ChangeAsked } from "@/components/cables/use-catalogue-address";
import type { HistogramRange } from "@/components/plot/histogram-range";
import { QuantityField } from "@/components/ui/quantity-field";
import type { CatalogueAsked } from "@/lib/cables/address";
import type { Facets } from "@/lib/cables/query";
import { frequency } from "@/lib/format/quantity";

export interface FacetsProps {
  asked: CatalogueAsked;
  change: ChangeAsked;
  facets: Facets | undefined;
}

/** A frequency as it stands in a field. */
export function frequencyText(hertz: number): string {
  const { digits, unit } = frequency(hertz);
  return `${digits.replace(/\u202f/g, "")} ${unit}`;
}

export function LossFrequency({ asked, change, className }: Omit<FacetsProps, "facets"> & { className?: string }) {
  return (
    <div className={`flex items-center justify-between gap-3 ${className ?? ""}`}>
      <span className="text-label font-[560]" aria-hidden="true">
        Loss at
      </span>
      <QuantityField
        label="Loss at"
        isLabelHidden
        controlSize="small"
        kind="frequency"
        value={asked.lossAtHz}
        text={frequencyText}
        onValue={(lossAtHz) => lossAtHz !== undefined && change({ lossAtHz })}
        refuse={(hertz) => (hertz > 0 ? (hertz < 1e12 ? undefined : "Below 1000 GHz.") : "More than 0.")}
        className="w-26 phone:w-40"
      />
    </div>
  );
}

/** One range of the catalogue's figures. */
export function MeasureFacetRange({ facet, asked, change, facets }: FacetsProps & { facet: MeasureFacet }) {
  const set = (range: HistogramRange | undefined) =>
    change(({ ranges }) => {
      const { [facet.measure]: _before, ...rest } = ranges;
      return { ranges: range ? { ...rest, [facet.measure]: range } : rest };
    });
  return (
    <MeasureRange facet={facet} bins={facets?.[facet.measure] ?? []} range={asked.ranges[facet.measure]} change={set} />
  );
}

/** Everything the catalogue can be narrowed by, each with how many cables it leaves. */
export function CatalogueFacets(props: FacetsProps) {
  const { asked, change, facets } = props;
  return (
    <div className="mt-2 flex flex-col gap-2.25">
      <MeasureFacetRange {...props} facet={impedanceFacet} />
      <MeasureFacetRange {...props} facet={velocityFacet} />
      <div>
        <LossFrequency asked={asked} change={change} className="mb-1" />
        <MeasureFacetRange {...props} facet={lossFacet} />
      </div>
      <MeasureFacetRange {...props} facet={diameterFacet} />
      <FamilyChecks chosen={asked.families} counted={facets?.family} set={(families) => change({ families })} />
      <StateChecks chosen={asked.states} counted={facets?.state} set={(states) => change({ states })} />
    </div>
  );
}
