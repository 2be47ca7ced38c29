"use client";

import { ConditionForm } from "@/components/runs/condition-form";
import { useRunEditor } from "@/components/runs/run-editor";
import { optionalQuantity, quantity, type LeafField, type TypedField } from "@/lib/runs/leaf/field";
import type { RunDraft } from "@/lib/runs/edit";

/** What the figures are given at: the parts of a run that are not pieces of its line. */
type Conditions = Pick<RunDraft, "designHz" | "availablePowerW" | "temperatureC" | "bandHz">;

const positive = { isPositive: true };

const spot: LeafField<Conditions>[] = [
  quantity<Conditions>({ key: "designHz", label: "Frequency", kind: "frequency", bounds: positive }),
  {
    ...optionalQuantity<Conditions>({
      key: "availablePowerW",
      label: "Available power",
      kind: "power",
      bounds: { ...positive, most: 1e9 },
    }),
    write: (edited: Conditions, value: number | undefined) => ({ ...edited, availablePowerW: value ?? null }),
  },
  quantity<Conditions>({
    key: "temperatureC",
    label: "Temperature",
    kind: "temperature",
    width: "narrow",
    bounds: { least: -200, most: 400 },
  }),
];

const bandEnd = (index: 0 | 1, label: string): TypedField<Conditions> => {
  const shape = quantity<{ end: number }>({ key: "end", label, kind: "frequency", bounds: positive });
  return {
    ...shape,
    isShown: undefined,
    name: `bandHz_${index}`,
    text: ({ bandHz, designHz }: Conditions) => shape.text({ end: bandHz?.[index] ?? designHz }),
    write: (edited: Conditions, value: number) => {
      const [from, to] = edited.bandHz ?? [edited.designHz, edited.designHz];
      // The other end gives way, so that a band is never upside down while its first end is being typed.
      const next: [number, number] = index === 0 ? [value, Math.max(value, to)] : [Math.min(from, value), value];
      return { ...edited, bandHz: next };
    },
  };
};

const band = [bandEnd(0, "Band from"), bandEnd(1, "to")];

function useConditions() {
  const { draft, edit } = useRunEditor();
  const { designHz, availablePowerW, temperatureC, bandHz } = draft;
  return {
    edited: { designHz, availablePowerW, temperatureC, bandHz },
    write: (next: Conditions, tag: string) => edit({ ...draft, ...next }, tag),
  };
}

interface Look {
  isInline?: boolean;
}

export function FrequencyCondition() {
  return <ConditionForm fields={spot.slice(0, 1)} {...useConditions()} />;
}

export function SpotConditions({ isInline }: Look) {
  return <ConditionForm fields={spot} isInline={isInline} {...useConditions()} />;
}

export function BandConditions({ isInline }: Look) {
  return <ConditionForm fields={band} isInline={isInline} {...useConditions()} />;
}
