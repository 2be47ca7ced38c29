"use client";

import dynamic from "next/dynamic";
import { figureName, figureValue } from "@/components/cables/figure-words";
import { Section } from "@/components/ui/section";
import { differencePercent } from "@/lib/cables/compare";
import type { LotList as Listed } from "@/lib/cables/lots/schema";
import { lossDbPer100m } from "@/lib/cables/model";
import type { Cable, Figure } from "@/lib/cables/schema";
import { digits } from "@/lib/format/quantity";
import { nominalFigures } from "@/lib/line/cable";
import type { LineModel } from "@/lib/line/element";

// Reads typed quantities; fetched when somebody opens it.
const AddLot = dynamic(() => import("@/components/cables/add-lot").then((file) => file.AddLot));

/** What the entry's model has for a measured figure, SI; null where it says nothing of it. */
function nominalOf({ quantity, fromHz }: Figure, model: LineModel): number | null {
  if (quantity === "z0Ohm") return nominalFigures(model).z0;
  if (quantity === "velocityFactor") return nominalFigures(model).velocityFactor;
  if (quantity === "r0OhmPerM") return model.conductors.reduce((sum, { r0OhmPerM }) => sum + r0OhmPerM, 0);
  if (quantity === "lossDbPerM" && fromHz !== undefined) return lossDbPer100m(model, fromHz) / 100;
  return null;
}

function Measured({ figure, model }: { figure: Figure; model: LineModel }) {
  const { digits: value, unit } = figureValue(figure.quantity, figure.valueSi);
  const apart = differencePercent(figure.valueSi, nominalOf(figure, model));
  const isWarm = figure.temperatureC !== undefined && figure.temperatureC !== 20;
  return (
    <li className="flex justify-between gap-3">
      <span className="text-ink-2">{figureName(figure)}</span>
      <span className="text-right">
        <span className="figures">{value}</span> <span className="unit">{unit}</span>
        <span className="ml-2 inline-block w-16 text-right text-note text-ink-3">
          {isWarm
            ? `${digits(figure.temperatureC ?? 20, 0)} °C`
            : apart !== null && `${apart > 0 ? "+" : ""}${digits(apart, 1)} %`}
        </span>
      </span>
    </li>
  );
}

interface Props {
  path: string;
  cable: Cable;
  lots: Listed;
  onAdded: () => void;
}

/** Deliveries that were measured, against the model: kept apart from what is nominal. */
export function LotList({ path, cable, lots: { items, mayAdd }, onAdded }: Props) {
  return (
    <Section title="Measured lots" note={items.length > 0 ? "against the model at 20 °C" : undefined} isNoteBelow>
      {items.length === 0 && <p className="text-label text-ink-3">No lot of it has been measured.</p>}
      <ul className="text-label">
        {items.map(({ id, lot, reel, lengthM, figures, note, measuredAt, addedByName }) => (
          <li key={id} className="border-b border-line py-1.25">
            <p className="flex flex-wrap justify-between gap-x-3">
              <b className="break-words">
                {lot}
                {reel && `, reel ${reel}`}
              </b>
              <span className="text-note text-ink-3">
                {measuredAt}, {addedByName}
                {lengthM !== null && `, ${digits(lengthM, 1)} m`}
              </span>
            </p>
            <ul>
              {figures.map((figure, i) => (
                <Measured key={i} figure={figure} model={cable.model} />
              ))}
            </ul>
            {note && <p className="text-note text-ink-2">{note}</p>}
          </li>
        ))}
      </ul>
      {mayAdd && (
        <details className="mt-2 text-label">
          <summary className="link cursor-pointer phone:min-h-11">Add a measured lot</summary>
          <AddLot path={path} onAdded={onAdded} />
        </details>
      )}
    </Section>
  );
}
