"use client";

import { useInfiniteQuery } from "@tanstack/react-query";
import { useEffect, useState } from "react";
import { CableRows } from "@/components/cables/cable-rows";
import { CatalogueFilters } from "@/components/cables/catalogue-filters";
import { NothingFound } from "@/components/cables/nothing-found";
import { Button } from "@/components/ui/button";
import { fieldColours, fieldEdge } from "@/components/ui/field";
import { KeyCap } from "@/components/ui/key-cap";
import { Select } from "@/components/ui/select";
import { StateNote } from "@/components/ui/state-mark";
import { cableRequest, catalogueAddress, type CatalogueAsked, type CatalogueSort } from "@/lib/cables/address";
import type { CablePage } from "@/lib/cables/query";
import { frequency, inWords } from "@/lib/format/quantity";
import { call } from "@/lib/http/call";

interface Props {
  asked: CatalogueAsked;
  canStartRun: boolean;
}

/** The team's cables: searched as typed, filtered, each drawn end-on to one scale. */
export function Catalogue({ asked: first, canStartRun }: Props) {
  const [asked, setAsked] = useState(first);
  const pages = useInfiniteQuery({
    queryKey: ["cables", "catalogue", asked],
    queryFn: ({ pageParam, signal }) => call<CablePage>(cableRequest(asked, pageParam), { signal }),
    initialPageParam: null as string | null,
    getNextPageParam: (page) => page.nextCursor,
    placeholderData: (before) => before,
  });
  // The address follows the search without a visit to the server for every letter.
  useEffect(() => window.history.replaceState(null, "", catalogueAddress(asked)), [asked]);

  const change = (part: Partial<CatalogueAsked>) => setAsked((before) => ({ ...before, ...part }));
  const page = pages.data?.pages[0];
  const items = pages.data?.pages.flatMap((each) => each.items) ?? [];
  return (
    <div className="grid grid-cols-[252px_minmax(0,1fr)] gap-x-9 folded:grid-cols-1">
      <div className="pt-1 folded:order-2 folded:hidden">
        <h1>Catalogue</h1>
        <CatalogueFilters asked={asked} change={change} facets={page?.facets} />
      </div>
      <div className="min-w-0">
        <h1 className="sr-only hidden folded:block">Catalogue</h1>
        <div className="flex flex-wrap items-center gap-x-6 gap-y-2">
          <SearchField
            text={asked.q}
            change={(q) => change({ q, isExact: false, sort: q.trim() ? "relevance" : "designation" })}
          />
          <p role="status" className="text-label text-ink-2">
            {page && (
              <>
                <b className="figures text-ink">{page.total}</b> {page.total === 1 ? "cable" : "cables"}
              </>
            )}
          </p>
          <div className="ml-auto flex items-center gap-2 phone:ml-0">
            <span className="text-label text-ink-2">Sort</span>
            <Select
              label="Sort"
              isLabelHidden
              value={asked.sort}
              className="w-42"
              onChange={(event) => change({ sort: event.target.value as CatalogueSort })}
            >
              {asked.q.trim() && <option value="relevance">Best fit</option>}
              <option value="designation">Designation</option>
              <option value="loss">Loss at {inWords(frequency(asked.lossAtHz))}</option>
              <option value="z0">Impedance</option>
              <option value="velocityFactor">Velocity factor</option>
              <option value="outerDiameter">Outer diameter</option>
            </Select>
          </div>
        </div>
        <ReadAs asked={asked} page={page} change={change} />
        <details className="mt-2 hidden folded:block">
          <summary className="link text-label">Loss frequency, construction, state</summary>
          <CatalogueFilters asked={asked} change={change} facets={page?.facets} />
        </details>
        {pages.error && (
          <div className="mt-4">
            <StateNote state="fail">{pages.error.message}</StateNote>
            <Button className="mt-2" onClick={() => void pages.refetch()}>
              Try again
            </Button>
          </div>
        )}
        {page && page.total === 0 && <NothingFound asked={asked} change={change} loosenings={page.loosenings ?? []} />}
        {items.length > 0 && (
          <div className={pages.isPlaceholderData ? "opacity-60" : ""}>
            <CableRows items={items} lossAtHz={asked.lossAtHz} canStartRun={canStartRun} />
          </div>
        )}
        {pages.hasNextPage && (
          <Button
            className="mt-4"
            onClick={() => void pages.fetchNextPage()}
            refused={pages.isFetchingNextPage && "The next cables are on their way."}
          >
            Show more
          </Button>
        )}
      </div>
    </div>
  );
}

function SearchField({ text, change }: { text: string; change: (text: string) => void }) {
  return (
    <span className={`${fieldEdge} ${fieldColours(false)} h-8.5 w-118 px-2.5 folded:w-full phone:h-11`}>
      <input
        type="search"
        value={text}
        maxLength={200}
        onChange={(event) => change(event.target.value)}
        onKeyDown={(event) => event.key === "Escape" && change("")}
        aria-label="Search the catalogue"
        placeholder="Name, construction, 75 ohm, 7 mm"
        className="w-full min-w-0 bg-transparent text-row outline-none placeholder:text-ink-3 phone:text-section [&::-webkit-search-cancel-button]:hidden"
      />
      {text && <KeyCap>Esc</KeyCap>}
    </span>
  );
}

interface ReadAsProps {
  asked: CatalogueAsked;
  page: CablePage | undefined;
  change: (part: Partial<CatalogueAsked>) => void;
}

/** How the search was read, and a way to have it exactly. */
function ReadAs({ asked, page, change }: ReadAsProps) {
  if (!asked.q.trim() || !page?.readAs) return <p className="h-5" />;
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
