"use client";

import dynamic from "next/dynamic";
import { CableRows } from "@/components/cables/cable-rows";
import { CatalogueFiles, type FilesAllowed } from "@/components/cables/catalogue-files";
import { CatalogueFacets } from "@/components/cables/catalogue-facets";
import { FacetCards } from "@/components/cables/facet-cards";
import { ListOrder } from "@/components/cables/list-order";
import { NothingFound } from "@/components/cables/nothing-found";
import { PutBack } from "@/components/cables/put-back";
import { ReadAs, SearchField } from "@/components/cables/search-field";
import { useCablePages, type FirstPage } from "@/components/cables/use-cable-pages";
import { useCatalogueAddress } from "@/components/cables/use-catalogue-address";
import { useHeld } from "@/components/cables/use-held";
import { Button, ButtonLink } from "@/components/ui/button";
import { useKeys } from "@/components/ui/keys";
import { StateNote } from "@/components/ui/state-mark";
import { useMedia } from "@/components/ui/use-media";
import { Working } from "@/components/ui/working";
import { cableRequest } from "@/lib/cables/request";
import type { CablePage } from "@/lib/cables/query";
import type { CableItem } from "@/lib/cables/schema";
import { frequency, inWords } from "@/lib/format/quantity";

// Fetched when the first cable is held up.
const Tray = dynamic(() => import("@/components/cables/tray").then((file) => file.Tray));
const Comparison = dynamic(() => import("@/components/cables/comparison").then((file) => file.Comparison));

interface Props {
  first: FirstPage;
  canStartRun: boolean;
  files: FilesAllowed;
  /** whether the reader may add entries */
  canPropose: boolean;
}

/** Thickest cable when nobody has one: a row's drawing is then to the usual scale. */
const usualThickestMm = 16;

function Count({ page }: { page: CablePage | undefined }) {
  return (
    <p role="status" className="text-label whitespace-nowrap text-ink-2">
      {page && (
        <>
          <b className="figures text-ink">{page.total}</b> of <span className="figures">{page.outOf}</span>{" "}
          {page.outOf === 1 ? "cable" : "cables"}
        </>
      )}
    </p>
  );
}

/** The server did not answer. What was found before stays, greyed. */
function Trouble({ pages }: { pages: ReturnType<typeof useCablePages> }) {
  const isNext = pages.isFetchNextPageError;
  return (
    <div className="my-3 flex flex-wrap items-center gap-3" role="alert">
      <StateNote state="fail">
        {pages.error?.message} {!isNext && pages.data && "The list below is of the search before."}
      </StateNote>
      <Button size="small" onClick={() => void (isNext ? pages.fetchNextPage() : pages.refetch())}>
        Try again
      </Button>
    </div>
  );
}

/** Holds or puts back the cable whose row has the focus, else the one under the pointer. */
function useHoldKey(items: readonly CableItem[], toggle: (item: CableItem) => void) {
  function run() {
    const row = document.activeElement?.closest("[data-cable]") ?? document.querySelector("[data-cable]:hover");
    const item = items.find(({ id }) => id === row?.getAttribute("data-cable"));
    if (item) toggle(item);
  }
  useKeys([
    { key: "ArrowUp ArrowDown", does: "previous, next cable" },
    { key: "Enter", does: "open its entry" },
    { key: "h", does: "hold it to compare, or put it back", run },
  ]);
}

/** The team's cables: searched as typed, narrowed by figures, held up to compare. All of it stands in the address. */
export function Catalogue({ first, canStartRun, canPropose, files }: Props) {
  const [asked, change] = useCatalogueAddress();
  const pages = useCablePages(cableRequest(asked), first);
  const { held, waiting, toggle, putBack, exchange } = useHeld(asked.held, change);
  const [isFolded, isPhone] = [useMedia("folded"), useMedia("phone")];
  const page = pages.data?.pages[0];
  const items = pages.data?.pages.flatMap((each) => each.items) ?? [];
  useHoldKey(items, toggle);
  const facets = { asked, change, facets: page?.facets };
  const next = () => {
    if (pages.hasNextPage && !pages.isFetchingNextPage && !pages.isFetchNextPageError) void pages.fetchNextPage();
  };
  return (
    <div className="grid grid-cols-[252px_minmax(0,1fr)] gap-x-9 folded:grid-cols-1">
      <div
        className={`sticky top-0 -mx-2 self-start overflow-x-hidden overflow-y-auto px-2 pt-0.5 pb-2 folded:hidden ${asked.held.length > 0 ? "max-h-[calc(100dvh-148px)]" : "max-h-dvh"}`}
      >
        <h1>Catalogue</h1>
        {!isFolded && <CatalogueFacets {...facets} />}
      </div>
      <div className="min-w-0">
        <h1 className="sr-only hidden folded:block">Catalogue</h1>
        <div className="flex flex-wrap items-center gap-x-6 gap-y-2">
          <SearchField asked={asked} change={change} />
          <Count page={page} />
          <ListOrder asked={asked} change={change} />
          <CatalogueFiles {...files} />
          {canPropose && <ButtonLink href="/cables/new">New cable</ButtonLink>}
        </div>
        <ReadAs asked={asked} change={change} page={page} />
        {isFolded && !isPhone && (
          <details className="mt-2">
            <summary className="link text-label">Impedance, velocity, loss, diameter, construction, state</summary>
            <div className="max-w-90">
              <CatalogueFacets {...facets} />
            </div>
          </details>
        )}
        {isPhone && <FacetCards {...facets} />}
        {pages.error && !pages.isFetchNextPageError && <Trouble pages={pages} />}
        {pages.isPending && !page && <Working label="Looking through the catalogue" />}
        {page && page.total === 0 && <NothingFound {...{ asked, change, page, canPropose }} />}
        {items.length > 0 && (
          <p className="mt-2 hidden justify-between border-b border-rule pb-1 text-label text-ink-2 phone:flex">
            <span>to scale</span>
            <span>dB/100 m at {inWords(frequency(asked.lossAtHz))}</span>
          </p>
        )}
        {page && items.length > 0 && (
          <div className={pages.isBehind ? "opacity-60 transition-opacity delay-200" : ""}>
            <CableRows
              items={items}
              total={page.total}
              thickestMm={page.facets?.outerDiameterMm.at(-1)?.to ?? usualThickestMm}
              lossAtHz={asked.lossAtHz}
              canStartRun={canStartRun}
              held={asked.held}
              toggleHold={toggle}
              onEnd={next}
            />
          </div>
        )}
        {pages.isFetchNextPageError && <Trouble pages={pages} />}
        {pages.hasNextPage && !pages.error && (
          <p className="py-3 text-label text-ink-3">
            {items.length} of {page?.total} so far; more come as you scroll.
          </p>
        )}
        <p role="status" className="sr-only">
          {asked.held.length > 0 && `${asked.held.length} held up to compare`}
        </p>
        {asked.held.length > 0 && <div className="h-40 phone:h-24" />}
      </div>
      <PutBack waiting={waiting} held={held} exchange={exchange} />
      {asked.held.length > 0 && (
        <Tray held={held} lossAtHz={asked.lossAtHz} putBack={putBack} compare={() => change({ isCompared: true })} />
      )}
      {asked.isCompared && (
        <Comparison
          isOpen
          held={held}
          lossAtHz={asked.lossAtHz}
          canStartRun={canStartRun}
          putBack={putBack}
          close={() => change({ isCompared: false })}
        />
      )}
    </div>
  );
}
