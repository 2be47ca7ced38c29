import { Button } from "@/components/ui/button";
import type { CatalogueAsked } from "@/lib/cables/address";
import type { Loosening } from "@/lib/cables/query";

interface Props {
  asked: CatalogueAsked;
  change: (part: Partial<CatalogueAsked>) => void;
  loosenings: Loosening[];
}

/** Nothing found is never the end: what to leave out, and how many cables that gives. */
export function NothingFound({ asked, change, loosenings }: Props) {
  const isFiltered = asked.families.length > 0 || asked.states.length > 0;
  return (
    <div className="mt-8 flex items-start gap-8">
      <svg width="110" height="86" viewBox="0 0 110 86" aria-hidden="true">
        <path d="M0 4H110" stroke="var(--ink)" strokeWidth="1.5" />
        <path d="M55 4V22" stroke="var(--rule)" strokeDasharray="2 3" />
        <circle cx="55" cy="52" r="30" fill="none" stroke="var(--rule)" strokeWidth="1.5" strokeDasharray="3 3" />
      </svg>
      <div className="flex flex-col items-start gap-2">
        <p className="text-row">
          No cable fits <b>“{asked.q.trim() || "these filters"}”</b>.
        </p>
        {loosenings.map(({ without, q, count }) => (
          <button key={without} type="button" className="link" onClick={() => change({ q, isExact: false })}>
            Without “{without}”: {count} {count === 1 ? "cable" : "cables"}
          </button>
        ))}
        {isFiltered && (
          <button type="button" className="link" onClick={() => change({ families: [], states: [] })}>
            Without the filters
          </button>
        )}
        {asked.q.trim() !== "" && (
          <Button kind="plain" size="small" onClick={() => change({ q: "", isExact: false, sort: "designation" })}>
            Show every approved cable
          </Button>
        )}
      </div>
    </div>
  );
}
