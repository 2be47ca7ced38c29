import type { Route } from "next";
import Link from "next/link";
import type { HeldCable } from "@/components/cables/use-held";
import { SectionDrawing, sectionRadius } from "@/components/line/section-view";
import { seriesColour, seriesDash, type SeriesLook } from "@/components/plot/series";
import { Figure } from "@/components/ui/figure";
import type { CompareFigures } from "@/lib/cables/compare";
import { differencePercent } from "@/lib/cables/compare";
import { digits } from "@/lib/format/quantity";

/** Diameter a section may have in the tray, px. */
export const roomPx = 72;
/** The look of a held cable's curve: the first is the reference. */
export const lookAt = (place: number) => (place + 1) as SeriesLook;
const railY = 22;
const middleY = 67;

interface HungProps {
  held: HeldCable;
  mmToPx: number;
  width: number;
  height: number;
}

/** A cable hung from the rail by a hook, end-on. */
export function Hung({ held: { cable }, mmToPx, width, height }: HungProps) {
  const x = width / 2;
  const drawn = {
    construction: cable?.construction ?? null,
    build: cable?.build ?? null,
    family: cable?.family,
    outerDiameterMm: cable?.construction?.outerDiameterMm ?? null,
  };
  const y = (height * middleY) / 148;
  const rail = (height * railY) / 148;
  return (
    <svg width={width} height={height} aria-hidden="true" className="block shrink-0 overflow-visible">
      <path d={`M${x} ${rail}V${y - sectionRadius(drawn, mmToPx)}`} stroke="var(--ink)" strokeWidth="1.2" />
      <circle cx={x} cy={rail} r="2.6" fill="var(--ink)" />
      <SectionDrawing x={x} y={y} mmToPx={mmToPx} {...drawn} />
    </svg>
  );
}

/** The dash of a series in the chart. */
export function SeriesDash({ look }: { look: SeriesLook }) {
  return (
    <svg width="36" height="4" aria-hidden="true" className="inline-block align-middle">
      <path d="M0 2h36" stroke={seriesColour[look]} strokeWidth="1.75" strokeDasharray={seriesDash[look]} />
    </svg>
  );
}

/** "+34 %", or that there is nothing to tell. */
export function percentWords(percent: number | null): string {
  if (percent === null) return "–";
  const rounded = Math.round(percent);
  return `${rounded > 0 ? "+" : ""}${digits(rounded, 0)}\u202f%`;
}

interface Props {
  held: HeldCable;
  figures: CompareFigures | undefined;
  /** the figures of the first; undefined for the first itself */
  reference: CompareFigures | undefined;
  look: SeriesLook;
  mmToPx: number;
  href: Route;
  putBack: () => void;
}

/** One cable of the tray, with what it is compared by. */
export function HeldInTray({ held, figures, reference, look, mmToPx, href, putBack }: Props) {
  const name = held.cable?.designation ?? held.id;
  const difference = reference ? differencePercent(figures?.lossDbPer100m ?? null, reference.lossDbPer100m) : null;
  return (
    <li className="relative flex min-w-0 flex-1">
      <div className="relative w-21 shrink-0">
        <Hung held={held} mmToPx={mmToPx} width={84} height={148} />
        <div className="absolute inset-x-0 top-28 flex flex-col items-center text-note text-ink-2">
          <SeriesDash look={look} />
          <span className={reference ? "figures" : ""} title={reference ? "loss against the first" : undefined}>
            {reference ? percentWords(difference) : "reference"}
          </span>
        </div>
      </div>
      <div className="min-w-0 pt-9 text-label">
        <p className="flex items-center gap-1">
          <Link href={href} prefetch={false} className="truncate text-control font-[560] text-ink hover:text-copper">
            {name}
          </Link>
          <button
            type="button"
            onClick={putBack}
            aria-label={`Put ${name} back`}
            title="Put back"
            className="flex size-6 shrink-0 items-center justify-center text-ink-3 hover:text-ink"
          >
            <svg width="9" height="9" aria-hidden="true">
              <path d="M1 1l7 7M8 1l-7 7" stroke="currentColor" strokeWidth="1.4" />
            </svg>
          </button>
        </p>
        {held.trouble && <p className="text-note text-fail">{held.trouble}</p>}
        {figures && (
          <ul>
            <li>
              <Figure digits={digits(figures.lossDbPer100m, 2)} unit="dB/100 m" />
            </li>
            <li>
              <Figure digits={digits(figures.delaySPerM * 1e9, 2)} unit="ns/m" />
            </li>
            <li>
              <Figure digits={digits(figures.outerDiameterMm, 1)} unit="mm" />
            </li>
            <li>
              <Figure digits={digits(figures.minBendMm, 0)} unit="mm bend" />
            </li>
          </ul>
        )}
      </div>
    </li>
  );
}
