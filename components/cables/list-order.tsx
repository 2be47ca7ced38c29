import type { ChangeAsked } from "@/components/cables/use-catalogue-address";
import { Select } from "@/components/ui/select";
import type { CatalogueAsked, CatalogueSort } from "@/lib/cables/address";
import { frequency, inWords } from "@/lib/format/quantity";

interface Props {
  asked: CatalogueAsked;
  change: ChangeAsked;
}

/** What the list is ordered by, and which end of it comes first. */
export function ListOrder({ asked, change }: Props) {
  const isFit = asked.sort === "relevance";
  return (
    <div className="ml-auto flex items-center gap-2 phone:ml-0 phone:w-full">
      <span className="text-label text-ink-2" aria-hidden="true">
        Sort
      </span>
      <Select
        label="Sort"
        isLabelHidden
        value={asked.sort}
        className="w-42 phone:flex-1"
        onChange={(event) => change({ sort: event.target.value as CatalogueSort, isReversed: false })}
      >
        {asked.q.trim() && <option value="relevance">Best fit</option>}
        <option value="designation">Designation</option>
        <option value="loss">Loss at {inWords(frequency(asked.lossAtHz))}</option>
        <option value="z0">Impedance</option>
        <option value="velocityFactor">Velocity factor</option>
        <option value="outerDiameter">Outer diameter</option>
      </Select>
      {!isFit && (
        <button
          type="button"
          aria-pressed={asked.isReversed}
          aria-label="The last first"
          title={asked.isReversed ? "The last first" : "The first first"}
          onClick={() => change({ isReversed: !asked.isReversed })}
          className="flex size-7.25 items-center justify-center rounded border border-rule text-ink-2 hover:bg-hemp phone:size-11"
        >
          <svg width="10" height="12" aria-hidden="true" fill="none" stroke="currentColor" strokeWidth="1.6">
            <path d={asked.isReversed ? "M5 11V1M1 5l4-4 4 4" : "M5 1v10M1 7l4 4 4-4"} />
          </svg>
        </button>
      )}
    </div>
  );
}
