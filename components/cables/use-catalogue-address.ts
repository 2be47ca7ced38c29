"use client";

import { useSearchParams } from "next/navigation";
import { catalogueAddress, readCatalogueAddress, type CatalogueAsked } from "@/lib/cables/address";

/** Asks otherwise: with other parts, or with parts that follow from what is asked at that moment. */
export type ChangeAsked = (part: Partial<CatalogueAsked> | ((now: CatalogueAsked) => Partial<CatalogueAsked>)) => void;

/** What the address asks of the catalogue, and a way to ask otherwise. The address is the only place where it stands. */
export function useCatalogueAddress(): [CatalogueAsked, ChangeAsked] {
  const parameters = useSearchParams();
  const change: ChangeAsked = (part) => {
    // From the address as it is now, not as it was last drawn: two changes in one moment must not undo each other.
    const now = readCatalogueAddress(new URLSearchParams(window.location.search));
    window.history.replaceState(
      null,
      "",
      catalogueAddress({ ...now, ...(typeof part === "function" ? part(now) : part) }),
    );
  };
  return [readCatalogueAddress(new URLSearchParams(parameters)), change];
}
