"use client";

import { useRunEditor } from "@/components/runs/run-editor";
import { pieceName } from "@/components/runs/strip-pieces";
import { Select } from "@/components/ui/select";
import type { RunDraft } from "@/lib/runs/edit";

interface Place {
  place: number;
  label: string;
}

/** Where a match can stand, from the load back to the source; a place is the number of pieces behind it. */
function placesOf({ circuit, sourceName, loadName }: RunDraft, names: readonly string[]): Place[] {
  const count = circuit.elements.length;
  const isRepeated = (name: string) => names.filter((other) => other === name).length > 1;
  const before = names.map((name, i) => ({
    place: count - i,
    label:
      i === 0
        ? `${sourceName || "Source"}, before ${name}`
        : `before ${name}${isRepeated(name) ? `, piece ${i + 1}` : ""}`,
  }));
  return [{ place: 0, label: loadName || "Load" }, ...before.toReversed()];
}

interface Props {
  /** pieces between the match and the load */
  place: number;
  choose: (place: number) => void;
}

/** At which plane of the run the match stands. */
export function MatchPlace({ place, choose }: Props) {
  const { draft, lines } = useRunEditor();
  const { elements } = draft.circuit;
  const names = elements.map((_, i) => pieceName(elements, i, lines));
  return (
    <Select
      label="Match at"
      value={place}
      className="w-56 phone:w-full"
      onChange={(event) => choose(Number(event.target.value))}
    >
      {placesOf(draft, names).map((each) => (
        <option key={each.place} value={each.place}>
          {each.label}
        </option>
      ))}
    </Select>
  );
}
