"use client";

import { CableCombobox } from "@/components/cables/cable-combobox";
import { useRunEditor } from "@/components/runs/run-editor";
import { lineOf } from "@/lib/cables/line";
import type { Cable } from "@/lib/cables/schema";
import { call } from "@/lib/http/call";

interface Props {
  cableId: string;
  choose: (cableId: string) => void;
  label?: string;
  /** what stands in the field where the line is none of the catalogue's */
  whenNone?: string;
  /** choosing changes nothing in the run, so readers may */
  isAlwaysOpen?: boolean;
}

/** The cable of a piece. One that is new to the run is fetched before it is put in. */
export function CablePicker({ cableId, choose, label = "Cable", whenNone, isAlwaysOpen = false }: Props) {
  const { lines, addLine, canEdit } = useRunEditor();
  async function take(chosen: string) {
    if (!lines.has(chosen)) addLine(lineOf(await call<Cable>(`/cables/${chosen}`)));
    choose(chosen);
  }
  return (
    <CableCombobox
      label={label}
      chosen={lines.get(cableId)?.designation ?? whenNone ?? null}
      cableId={cableId}
      choose={take}
      isDisabled={!canEdit && !isAlwaysOpen}
      className="w-38 phone:w-full"
    />
  );
}
