"use client";

import { useState } from "react";
import { familyWords, stateWords } from "@/components/cables/words";
import { Field } from "@/components/ui/field";
import type { CatalogueAsked } from "@/lib/cables/address";
import type { Facets } from "@/lib/cables/query";
import type { CableState, Family } from "@/lib/cables/schema";
import { asTyped, readQuantity } from "@/lib/format/read-quantity";

interface Props {
  asked: CatalogueAsked;
  change: (part: Partial<CatalogueAsked>) => void;
  facets: Facets | undefined;
}

export function CatalogueFilters({ asked, change, facets }: Props) {
  return (
    <div className="mt-4 flex flex-col gap-4">
      <LossFrequency hertz={asked.lossAtHz} set={(lossAtHz) => change({ lossAtHz })} />
      <Checks<Family>
        title="Construction"
        values={Object.keys(familyWords) as Family[]}
        words={(family) => familyWords[family]}
        chosen={asked.families}
        count={(family) => facets?.family.find(({ value }) => value === family)?.count ?? 0}
        set={(families) => change({ families })}
      />
      <Checks<CableState>
        title="State"
        values={["approved", "inReview", "draft", "quarantined", "superseded", "withdrawn"]}
        words={(state) => (state === "approved" ? "Approved, restricted too" : stateWords[state].word)}
        chosen={asked.states.length > 0 ? asked.states : ["approved"]}
        count={(state) =>
          (facets?.state ?? [])
            .filter(({ value }) => value === state || (state === "approved" && value === "restricted"))
            .reduce((sum, { count }) => sum + count, 0)
        }
        set={(states) => change({ states: states.length === 1 && states[0] === "approved" ? [] : states })}
      />
    </div>
  );
}

function LossFrequency({ hertz, set }: { hertz: number; set: (hertz: number) => void }) {
  const [text, setText] = useState(asTyped("frequency", hertz));
  const read = readQuantity("frequency", text);
  const isRead = read.ok && read.value > 0;
  function take(next: string) {
    setText(next);
    const now = readQuantity("frequency", next);
    if (now.ok && now.value > 0) set(now.value);
  }
  return (
    <Field
      label="Loss at"
      isFigure
      value={text}
      onChange={(event) => take(event.target.value)}
      error={isRead ? undefined : read.ok ? "More than 0." : read.message}
      className="w-40"
    />
  );
}

interface ChecksProps<V extends string> {
  title: string;
  values: V[];
  words: (value: V) => string;
  chosen: V[];
  count: (value: V) => number;
  /** none chosen means all */
  set: (chosen: V[]) => void;
}

function Checks<V extends string>({ title, values, words, chosen, count, set }: ChecksProps<V>) {
  return (
    <fieldset className="border-t border-rule pt-2">
      <legend className="float-left mb-1 w-full text-label font-[560] text-ink-2">{title}</legend>
      {values.map((value) => (
        <label key={value} className="clear-both flex min-h-6.5 items-center gap-2 text-label phone:min-h-11">
          <input
            type="checkbox"
            checked={chosen.includes(value)}
            onChange={(event) =>
              set(event.target.checked ? [...chosen, value] : chosen.filter((other) => other !== value))
            }
            className="size-4"
          />
          <span className="flex-1">{words(value)}</span>
          <span className="figures text-ink-2">{count(value)}</span>
        </label>
      ))}
    </fieldset>
  );
}
