"use client";

import type { ChangeAsked } from "@/components/cables/use-catalogue-address";
import { fieldColours, fieldEdge } from "@/components/ui/field";
import { KeyCap } from "@/components/ui/key-cap";
import { useDraft } from "@/components/ui/use-draft";
import type { CatalogueAsked } from "@/lib/cables/address";
import { usualSort } from "@/lib/cables/address";
import type { CablePage } from "@/lib/cables/query";

interface Props {
  asked: CatalogueAsked;
  change: ChangeAsked;
}

/** What is searched for, as it is typed. Esc clears it, the arrow down goes to the first cable found. */
export function SearchField({ asked, change }: Props) {
  const search = useDraft(asked.q, (q) => {
    const isNewKind = (q.trim() === "") !== (asked.q.trim() === "");
    change({ q, isExact: false, ...(isNewKind && { sort: usualSort(q), isReversed: false }) });
  });
  return (
    <span className={`${fieldEdge} ${fieldColours(false)} h-8.5 w-118 px-2.5 folded:w-full phone:h-11`}>
      <input
        type="search"
        value={search.shown}
        maxLength={200}
        onChange={(event) => search.change(event.target.value)}
        onBlur={search.settle}
        onKeyDown={(event) => {
          if (event.key === "Escape") search.change("");
          if (event.key !== "ArrowDown") return;
          event.preventDefault();
          document.querySelector<HTMLElement>("[data-cable] a")?.focus();
        }}
        aria-label="Search the catalogue"
        placeholder="Name, construction, 75 ohm, 7 mm"
        className="w-full min-w-0 bg-transparent text-row outline-none placeholder:text-ink-3 phone:text-section [&::-webkit-search-cancel-button]:hidden"
      />
      {search.shown && (
        <span className="phone:hidden">
          <KeyCap>Esc</KeyCap>
        </span>
      )}
    </span>
  );
}

/** How the search was read, and a way to have it exactly. */
export function ReadAs({ asked, change, page }: Props & { page: CablePage | undefined }) {
  if (!asked.q.trim() || !page?.readAs) return <p className="h-5 phone:hidden" />;
  const corrected = page.corrected ?? [];
  return (
    <p className="min-h-5 pt-1 text-label text-ink-2">
      Read as <b className="text-ink">{page.readAs}</b>.{" "}
      {corrected.length > 0 && (
        <button type="button" className="link" onClick={() => change({ isExact: true })}>
          Search for “{corrected.map(({ typed }) => typed).join(" ")}” exactly
        </button>
      )}
      {asked.isExact && (
        <button type="button" className="link" onClick={() => change({ isExact: false })}>
          Search forgivingly again
        </button>
      )}
    </p>
  );
}
