import { seriesColour, seriesDash, type SeriesLook } from "@/components/plot/series";

/** The look of the n-th thing compared, counted from 0. */
export function lookOf(place: number): SeriesLook {
  return Math.min(4, place + 1) as SeriesLook;
}

/** Its letter. */
export function letterOf(place: number): string {
  return "ABCD"[place] ?? "";
}

/** A stroke in a series' colour and dash, for where a name stands away from its curve. */
export function SeriesSwatch({ look }: { look: SeriesLook }) {
  return (
    <svg width="26" height="6" aria-hidden="true" className="shrink-0">
      <path d="M0 3H26" stroke={seriesColour[look]} strokeWidth="2" strokeDasharray={seriesDash[look]} />
    </svg>
  );
}
