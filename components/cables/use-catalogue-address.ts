"use client";

import { useSearchParams } from "next/navigation";
import { catalogueAddress, readCatalogueAddress, type CatalogueAsked } from "@/lib/cables/address";

/** What the address asks of the catalogue, and a way to ask otherwise. The address is the only place where it stands. */
export function useCatalogueAddress(): [CatalogueAsked, (part: Partial<CatalogueAsked>) => void] {
  const parameters = useSearchParams();
  function change(part: Partial<CatalogueAsked>) {
    // From the address as it is now: two changes in one moment must not undo each other.
    const now = readCatalogueAddress(new URLSearchParams(window.location.search));
    window.history.replaceState(null, "", catalogueAddress({ ...now, ...part }));
  }
  return [readCatalogueAddress(new URLSearchParams(parameters)), change];
}
