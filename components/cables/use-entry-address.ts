"use client";

import { useSearchParams } from "next/navigation";
import { entryAddress, readEntryAddress, type EntryAsked } from "@/lib/cables/entry-address";

/** What an entry is looked at with, and a way to look otherwise. The address is the only place where it stands. */
export function useEntryAddress(cableId: string): [EntryAsked, (part: Partial<EntryAsked>) => void] {
  const parameters = useSearchParams();
  function change(part: Partial<EntryAsked>) {
    const now = readEntryAddress(new URLSearchParams(window.location.search));
    window.history.replaceState(null, "", entryAddress(cableId, { ...now, ...part }));
  }
  return [readEntryAddress(new URLSearchParams(parameters)), change];
}
