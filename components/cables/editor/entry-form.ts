"use client";

import { createContext, useContext } from "react";
import type { UseFormReturn } from "react-hook-form";
import type { EntrySaving } from "@/components/cables/editor/use-entry-saving";
import type { Edited } from "@/lib/cables/editor/entry-draft";
import type { EntryTexts } from "@/lib/cables/editor/texts";

/** The entry being edited, for every part of the screen. */
export interface EntryForm {
  form: UseFormReturn<EntryTexts>;
  /** of the last texts React had time for */
  edited: Edited;
  /** the figures shown belong to the key before this one */
  isBehind: boolean;
  undo: (() => void) | null;
  redo: (() => void) | null;
  saving: EntrySaving;
  personName: string;
}

export const EntryFormContext = createContext<EntryForm | null>(null);

export function useEntryForm(): EntryForm {
  const entry = useContext(EntryFormContext);
  if (!entry) throw new Error("useEntryForm: not inside an EntryEditor");
  return entry;
}
