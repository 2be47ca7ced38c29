import type { ReactNode } from "react";
import { Checkbox } from "@/components/ui/checkbox";
import { SectionView } from "@/components/line/section-view";
import { familyWords, stateWords } from "@/components/cables/words";
import type { Build, CableState, Construction, Family } from "@/lib/cables/schema";

interface ChecksProps<V extends string> {
  title: string;
  values: readonly V[];
  words: (value: V) => ReactNode;
  /** those that are shown */
  chosen: readonly V[];
  count: (value: V) => number;
  set: (chosen: V[]) => void;
}

/** Kinds to show or leave out, each with how many there are. One stays: nothing at all is no choice. */
function Checks<V extends string>({ title, values, words, chosen, count, set }: ChecksProps<V>) {
  const toggle = (value: V, isOn: boolean) => {
    const next = values.filter((other) => (other === value ? isOn : chosen.includes(other)));
    if (next.length > 0) set(next);
  };
  return (
    <fieldset className="border-t border-rule pt-1.75">
      <legend className="float-left mb-0.5 w-full text-label font-[560]">{title}</legend>
      {values.map((value) => (
        <Checkbox
          key={value}
          className="clear-both"
          checked={chosen.includes(value)}
          onChange={(event) => toggle(value, event.target.checked)}
        >
          <span className="flex flex-1 items-center gap-2">{words(value)}</span>
          <span className="figures text-ink-2">{count(value)}</span>
        </Checkbox>
      ))}
    </fieldset>
  );
}

type Counted<V> = readonly { value: V; count: number }[] | undefined;

interface Props<V> {
  /** none: what is usual */
  chosen: readonly V[];
  counted: Counted<V>;
  set: (chosen: V[]) => void;
}

const countOf = <V,>(counted: Counted<V>, value: V) => counted?.find((each) => each.value === value)?.count ?? 0;

// Three cables that stand for their kind; nobody's entry.
const screenOf = (screen: Build["screen"]): Build => ({
  ...{ conductor: "", isStranded: false, dielectric: "solid", dielectricName: "", screenName: "", jacket: "PE" },
  ...{ screen, pairCount: 1 },
});
const exemplars: Record<Family, { construction: Construction; build: Build }> = {
  coaxial: {
    construction: { kind: "coax", innerMm: 1.8, dielectricMm: 6.3, relativePermittivity: 2.3, lossTangent: 0 },
    build: screenOf(["braid"]),
  },
  twistedPair: {
    construction: { kind: "pair", wireMm: 1.3, spacingMm: 2.9, effectivePermittivity: 2, lossTangent: 0, layMm: 60 },
    build: screenOf([]),
  },
  twinaxial: {
    construction: { kind: "pair", wireMm: 1.3, spacingMm: 2.9, effectivePermittivity: 2, lossTangent: 0 },
    build: screenOf(["braid"]),
  },
};
const families = Object.keys(familyWords) as Family[];

export function FamilyChecks({ chosen, counted, set }: Props<Family>) {
  return (
    <Checks
      title="Construction"
      values={families}
      words={(family) => (
        <>
          <SectionView {...exemplars[family]} family={family} outerDiameterMm={9.9} mmToPx={2} box={22} />
          {familyWords[family]}
        </>
      )}
      chosen={chosen.length > 0 ? chosen : families}
      count={(family) => countOf(counted, family)}
      set={(next) => set(next.length === families.length ? [] : next)}
    />
  );
}

const states = ["approved", "inReview", "draft", "quarantined", "superseded", "withdrawn"] as const;

/** Restricted entries are approved ones with a use condition: they come and go with those. */
export function StateChecks({ chosen, counted, set }: Props<CableState>) {
  return (
    <Checks<CableState>
      title="State"
      values={states}
      words={(state) => (state === "approved" ? "Approved, restricted too" : stateWords[state].word)}
      chosen={chosen.length > 0 ? chosen : ["approved"]}
      count={(state) => countOf(counted, state) + (state === "approved" ? countOf(counted, "restricted") : 0)}
      set={(next) => set(next.length === 1 && next[0] === "approved" ? [] : next)}
    />
  );
}
