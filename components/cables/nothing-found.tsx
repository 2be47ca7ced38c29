import type { Route } from "next";
import Link from "next/link";
import type { ChangeAsked } from "@/components/cables/use-catalogue-address";
import { stateWords } from "@/components/cables/words";
import { Button } from "@/components/ui/button";
import { Hook } from "@/components/ui/hook";
import { measureNames, usualSort, type CatalogueAsked, type Measure } from "@/lib/cables/address";
import type { CablePage, Facets } from "@/lib/cables/query";

interface Props {
  asked: CatalogueAsked;
  change: ChangeAsked;
  page: CablePage;
  /** whether the reader may add entries */
  canPropose: boolean;
}

interface Way {
  words: string;
  count: number;
  part: Partial<CatalogueAsked>;
}

const measureWords: Record<Measure, string> = {
  z0Ohm: "the range of impedance",
  velocityFactor: "the range of velocity",
  lossDbPer100m: "the range of loss",
  outerDiameterMm: "the range of diameter",
};

const sum = (counts: readonly { count: number }[]) => counts.reduce((total, { count }) => total + count, 0);

/** Each filter left out alone, with how many cables that gives: the counts of a facet are those without its own filter. */
function filterWays(asked: CatalogueAsked, facets: Facets): Way[] {
  const measures = measureNames.flatMap((name): Way[] => {
    const { [name]: range, ...rest } = asked.ranges;
    return range ? [{ words: `Without ${measureWords[name]}`, count: sum(facets[name]), part: { ranges: rest } }] : [];
  });
  const families =
    asked.families.length > 0
      ? [{ words: "Of every construction", count: sum(facets.family), part: { families: [] } }]
      : [];
  const states = facets.state.map(({ value, count }) => ({
    words: `${stateWords[value].word} ones`,
    count,
    part: { states: [...asked.states, ...(asked.states.length === 0 ? (["approved"] as const) : []), value] },
  }));
  return [...measures, ...families, ...states];
}

/** Nothing found is never the end: what to leave out, and how many cables that gives. */
export function NothingFound({ asked, change, page, canPropose }: Props) {
  const { loosenings = [], facets, outOf } = page;
  const words = loosenings.map(({ without, q, count }) => ({
    ...{ words: `Without “${without}”`, count },
    part: { q, isExact: false },
  }));
  const ways: Way[] = [...words, ...(facets ? filterWays(asked, facets) : [])]
    .filter(({ count }) => count > 0)
    .sort((a, b) => b.count - a.count);
  const text = asked.q.trim();
  const isNarrowed = text !== "" || Object.keys(asked.ranges).length > 0 || asked.families.length > 0;
  return (
    <div className="mt-8 flex items-start gap-8 phone:flex-col phone:gap-4">
      <Hook />
      <div className="flex flex-col items-start gap-2">
        <p className="text-row">
          {outOf === 0 ? (
            "The catalogue has nothing in it that you may see yet."
          ) : text ? (
            <>
              No cable fits <b>“{text}”</b>
              {isNarrowed && Object.keys(asked.ranges).length + asked.families.length > 0 && " within these filters"}.
            </>
          ) : (
            "No cable fits these filters."
          )}
        </p>
        {ways.map((way) => (
          <button key={way.words} type="button" className="link phone:min-h-11" onClick={() => change(way.part)}>
            {way.words}: {way.count} {way.count === 1 ? "cable" : "cables"}
          </button>
        ))}
        {canPropose && text && (
          <Link
            href={`/cables/new?designation=${encodeURIComponent(text.slice(0, 40))}` as Route}
            prefetch={false}
            className="link phone:min-h-11"
          >
            Add “{text}” as a draft
          </Link>
        )}
        {outOf > 0 && (
          <Button
            size="small"
            className="mt-1"
            onClick={() =>
              change({
                q: "",
                isExact: false,
                ranges: {},
                families: [],
                states: [],
                sort: usualSort(""),
                isReversed: false,
              })
            }
          >
            Show every approved cable
          </Button>
        )}
      </div>
    </div>
  );
}
