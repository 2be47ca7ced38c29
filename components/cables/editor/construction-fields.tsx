"use client";

import type { ReactNode } from "react";
import { useWatch } from "react-hook-form";
import { useEntryForm } from "@/components/cables/editor/entry-form";
import { FigureInput } from "@/components/cables/editor/figure-input";
import { GivenFigures } from "@/components/cables/editor/given-figures";
import { SourceFields } from "@/components/cables/editor/source-fields";
import { TypedSection } from "@/components/cables/editor/typed-section";
import type { SectionPart } from "@/components/cables/section-parts";
import { Checkbox } from "@/components/ui/checkbox";
import { Field } from "@/components/ui/field";
import { Section } from "@/components/ui/section";
import { Select } from "@/components/ui/select";
import { StateNote } from "@/components/ui/state-mark";

const rowHeight = 68;
/** From the top of a layer's row to the middle of its fields. */
const fieldsAt = 44;

interface Layer {
  layer: SectionPart["layer"];
  name: string;
  fields: ReactNode;
}

function useLayers(): Layer[] {
  const { form } = useEntryForm();
  const kind = useWatch({ control: form.control, name: "kind" });
  const word = (
    name: "build.jacket" | "build.screenName" | "build.dielectricName" | "build.conductor",
    label: string,
    placeholder = label.toLowerCase(),
  ) => (
    <Field
      label={label}
      isLabelHidden
      placeholder={placeholder}
      autoComplete="off"
      maxLength={60}
      {...form.register(name)}
    />
  );
  const size = (name: "outer" | "shield" | "screenBore" | "insulation" | "conductor", label: string) => (
    <FigureInput name={name} label={label} isLabelHidden />
  );
  const isPair = kind === "pair";
  return [
    {
      ...{ layer: "jacket", name: "Jacket" },
      fields: (
        <>
          {size("outer", "Outer diameter")}
          {word("build.jacket", "Material of the jacket")}
        </>
      ),
    },
    {
      ...{ layer: "screen", name: isPair ? "Screen, bore" : "Shield, thickness" },
      fields: (
        <>
          {isPair ? size("screenBore", "Bore of the screen") : size("shield", "Thickness of the shield")}
          {word("build.screenName", "Make of the screen")}
        </>
      ),
    },
    {
      ...{ layer: "dielectric", name: isPair ? "Spacing of the wires" : "Dielectric" },
      fields: (
        <>
          {size("insulation", isPair ? "Spacing of the wires" : "Diameter of the dielectric")}
          <Select label="Kind of dielectric" isLabelHidden {...form.register("build.dielectric")}>
            <option value="foam">Foam</option>
            <option value="solid">Solid</option>
            <option value="airSpaced">Air-spaced</option>
          </Select>
          {word("build.dielectricName", "Material of the dielectric", "material")}
          <FigureInput name="permittivity" label="Permittivity" isLabelHidden placeholder="ε" />
        </>
      ),
    },
    {
      ...{ layer: "conductor", name: isPair ? "Wire" : "Inner conductor" },
      fields: (
        <>
          {size("conductor", isPair ? "Diameter of a wire" : "Diameter of the inner conductor")}
          {word("build.conductor", "Make of the conductor", "make")}
          <Select label="Metal" isLabelHidden {...form.register("metal")}>
            <option value="copper">Copper</option>
            <option value="silver">Silver</option>
            <option value="aluminium">Aluminium</option>
          </Select>
          <Checkbox className="self-center" {...form.register("build.isStranded")}>
            stranded
          </Checkbox>
        </>
      ),
    },
  ];
}

/** What the sizes and materials do not tell. */
function MoreOfIt() {
  const { form } = useEntryForm();
  const kind = useWatch({ control: form.control, name: "kind" });
  const layers = ["foil", "braid", "doubleBraid", "strip", "tube", "corrugated", "drain"] as const;
  const words = {
    foil: "foil",
    braid: "braid",
    doubleBraid: "double braid",
    strip: "strip",
    tube: "tube",
    corrugated: "corrugated",
    drain: "drain wire",
  };
  return (
    <details className="mt-2">
      <summary className="link text-label">Loss tangent, factors, layers of the screen</summary>
      <div className="mt-2 grid grid-cols-4 gap-x-3 gap-y-2.5 phone:grid-cols-2">
        <FigureInput name="tangent" label="Loss tangent" />
        {kind === "pair" ? (
          <FigureInput name="lay" hint="for one turn" />
        ) : (
          <>
            <FigureInput name="strandFactor" hint="of high-frequency loss" />
            <FigureInput name="braidFactor" hint="of high-frequency loss" />
          </>
        )}
        <Field label="Pairs" inputMode="numeric" autoComplete="off" {...form.register("build.pairCount")} />
      </div>
      <fieldset className="mt-2 flex flex-wrap gap-x-4">
        <legend className="text-note text-ink-2">Layers of the screen</legend>
        {layers.map((layer) => (
          <Checkbox key={layer} value={layer} {...form.register("build.screen")}>
            {words[layer]}
          </Checkbox>
        ))}
      </fieldset>
    </details>
  );
}

/** The construction, typed beside its drawing. */
export function ConstructionFields() {
  const { form, edited } = useEntryForm();
  const layers = useLayers();
  const kind = useWatch({ control: form.control, name: "kind" });
  const refusal = edited.worked.ways.construction?.refusal;
  const height = layers.length * rowHeight + 12;
  return (
    <Section
      title="1 Construction"
      note="type beside the drawing; it redraws to scale as you type"
      aside={
        <Select label="Kind of construction" isLabelHidden controlSize="small" {...form.register("kind")}>
          <option value="coax">Coaxial</option>
          <option value="pair">Pair</option>
          <option value="none">Not known</option>
        </Select>
      }
    >
      {kind !== "none" && (
        <>
          <div className="mt-2 grid grid-cols-[290px_minmax(0,1fr)] phone:grid-cols-1">
            <TypedSection
              height={height}
              layers={layers.map(({ layer }, i) => ({ layer, y: i * rowHeight + fieldsAt }))}
            />
            <div>
              {layers.map(({ layer, name, fields }) => (
                <fieldset key={layer} style={{ minHeight: rowHeight }} className="pt-1">
                  <legend className="float-left mb-1 w-full text-label font-[560]">{name}</legend>
                  <div className="clear-left grid grid-cols-4 gap-2 phone:grid-cols-2">{fields}</div>
                </fieldset>
              ))}
            </div>
          </div>
          <MoreOfIt />
        </>
      )}
      {refusal && (
        <StateNote state="fail" className="mt-2">
          {refusal}
        </StateNote>
      )}
      {kind !== "none" && <GivenFigures />}
      <SourceFields way="construction" />
    </Section>
  );
}
