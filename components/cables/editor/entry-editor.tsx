"use client";

import { useDeferredValue, useMemo, useState } from "react";
import { useForm, useWatch } from "react-hook-form";
import { ConstructionFields } from "@/components/cables/editor/construction-fields";
import { EditorHead } from "@/components/cables/editor/editor-head";
import { EntryFormContext } from "@/components/cables/editor/entry-form";
import { LiveAgreement } from "@/components/cables/editor/live-agreement";
import { LossFields } from "@/components/cables/editor/loss-fields";
import { NominalFields } from "@/components/cables/editor/nominal-fields";
import { Particulars } from "@/components/cables/editor/particulars";
import { ReadingFields } from "@/components/cables/editor/reading-fields";
import { EntryConflict } from "@/components/cables/editor/save-note";
import { useEntrySaving } from "@/components/cables/editor/use-entry-saving";
import { useUndo } from "@/components/cables/editor/use-undo";
import { WayList } from "@/components/cables/editor/way-list";
import { CursorProvider } from "@/components/plot/cursor";
import { editedEntry } from "@/lib/cables/editor/entry-draft";
import { entryKey } from "@/lib/cables/editor/held-entry";
import { startTexts } from "@/lib/cables/editor/start-texts";
import { emptyTexts, type EntryTexts, type SourceWay } from "@/lib/cables/editor/texts";
import type { CableRevision } from "@/lib/cables/revisions/schema";

export interface EntryEditorProps {
  /** the open draft; null for an entry that is not there yet */
  revision: CableRevision | null;
  /** of a new entry, brought along from a search */
  designation?: string;
  person: { id: string; name: string };
}

const sections: Record<SourceWay, () => React.ReactNode> = {
  construction: () => <ConstructionFields />,
  nominal: () => <NominalFields />,
  lossTable: () => <LossFields />,
  readings: () => <ReadingFields />,
};
const ways = Object.keys(sections) as SourceWay[];

/** The ways that have been begun; of an entry that is new, the two that most people start with. */
function begun(texts: EntryTexts): SourceWay[] {
  const { figures, rows, kind } = texts;
  const has: Record<SourceWay, boolean> = {
    construction: kind !== "none",
    nominal: figures.z0 !== "" || figures.velocity !== "" || figures.c !== "",
    lossTable: rows.length > 0,
    readings: figures.sample !== "",
  };
  const open = ways.filter((way) => has[way]);
  return open.length > 1 ? open : [...new Set<SourceWay>(["construction", "nominal", "lossTable", ...open])];
}

/** One entry being written: four ways in, one model out, checked as it is typed. */
export function EntryEditor({ revision, designation = "", person }: EntryEditorProps) {
  const [start] = useState<EntryTexts>(() => (revision ? startTexts(revision) : { ...emptyTexts, designation }));
  const form = useForm<EntryTexts>({ defaultValues: start });
  const texts = useWatch({ control: form.control }) as EntryTexts;
  const taken = useDeferredValue(texts);
  const kept = useMemo(() => revision && { figures: revision.figures, model: revision.model }, [revision]);
  const edited = useMemo(() => editedEntry(taken, kept, person.name), [taken, kept, person.name]);
  const isBehind = taken !== texts;
  const { undo, redo, take } = useUndo(form, start);
  const key = entryKey(person.id, revision?.id ?? null);
  const saving = useEntrySaving({ opened: revision, start, texts, edited, isBehind, key, take });
  const [open, setOpen] = useState(() => begun(start));
  const toggle = (way: SourceWay) =>
    setOpen((before) => (before.includes(way) ? before.filter((each) => each !== way) : [...before, way]));
  return (
    <EntryFormContext value={{ form, edited, isBehind, undo, redo, saving, personName: person.name }}>
      <CursorProvider>
        <form noValidate onSubmit={(event) => event.preventDefault()}>
          <EditorHead />
          <EntryConflict />
          <div className="mt-4 grid grid-cols-[216px_minmax(0,1fr)_372px] gap-x-7 gap-y-6 folded:grid-cols-[216px_minmax(0,1fr)] phone:grid-cols-1">
            <WayList open={open} toggle={toggle} />
            <div className="flex min-w-0 flex-col gap-6">
              <Particulars />
              {ways
                .filter((way) => open.includes(way))
                .map((way) => (
                  <div key={way} id={`way-${way}`} className="min-w-0">
                    {sections[way]()}
                  </div>
                ))}
            </div>
            <div className="min-w-0 folded:col-start-2 phone:col-start-1">
              <LiveAgreement />
            </div>
          </div>
        </form>
      </CursorProvider>
    </EntryFormContext>
  );
}
