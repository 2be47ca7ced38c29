"use client";

import { useSearchParams } from "next/navigation";
import { entryAddress, readEntryAddress, type EntryAsked } from "@/lib/cables/entry-address";

/** Looks otherwise: with other parts, or with parts that follow from what is asked at that moment. */
export type ChangeLook = (part: Partial<EntryAsked> | ((now: EntryAsked) => Partial<EntryAsked>)) => void;

/** What an entry is looked at with, and a way to look otherwise. The address is the only place where it stands. */
export function useEntryAddress(cableId: string): [EntryAsked, ChangeLook] {
  const parameters = useSearchParams();
  const change: ChangeLook = (part) => {
    const now = readEntryAddress(new URLSearchParams(window.location.search));
    window.history.replaceState(
      null,
      "",
      entryAddress(cableId, { ...now, ...(typeof part === "function" ? part(now) : part) }),
    );
  };
  return [readEntryAddress(new URLSearchParams(parameters)), change];
}
