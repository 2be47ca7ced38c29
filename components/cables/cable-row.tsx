import type { Route } from "next";
import Link from "next/link";
import { HoldButton } from "@/components/cables/hold-button";
import { buildWords, stateWords } from "@/components/cables/words";
import { SectionView } from "@/components/line/section-view";
import { RangeBar } from "@/components/plot/range-bar";
import { Figure } from "@/components/ui/figure";
import { StateMark } from "@/components/ui/state-mark";
import { Cell, RowHead } from "@/components/ui/table";
import type { CableItem } from "@/lib/cables/schema";
import { digits } from "@/lib/format/quantity";

export const barDomain = [0.1, 200] as const;
export const barWidth = 118;

interface Props {
  item: CableItem;
  index: number;
  /** address of the entry */
  href: Route;
  canStartRun: boolean;
  isHeld: boolean;
  toggleHold: () => void;
  mmToPx: number;
}

function Names({ item, href }: Pick<Props, "item" | "href">) {
  const words = `${item.name}. ${buildWords(item.build)}`;
  return (
    <>
      <Link
        href={href}
        // A search is looked through quickly: an entry is fetched when it is opened.
        prefetch={false}
        className="flared block truncate text-row text-ink after:absolute after:inset-0 hover:text-copper focus-visible:outline-offset-0"
      >
        {item.designation}
        {item.preferred && <span className="ml-2 text-note font-normal text-copper">preferred</span>}
      </Link>
      <span className="block truncate text-label text-ink-2" title={words}>
        {words}
      </span>
    </>
  );
}

function PhoneFigures({ item }: { item: CableItem }) {
  return (
    <span className="hidden truncate text-label phone:block">
      <Figure digits={digits(item.z0Ohm, 1)} unit="Ω" />
      <Figure digits={digits(item.velocityFactor, 3)} className="ml-2" />
      {item.outerDiameterMm !== null && <Figure digits={digits(item.outerDiameterMm, 1)} unit="mm" className="ml-2" />}
      {item.state !== "approved" && <b className="ml-2 font-[560] text-warn">{stateWords[item.state].word}</b>}
    </span>
  );
}

/** A cable of the catalogue: end-on to the list's scale, with its figures. The whole row opens its entry. */
export function CableRow({ item, index, href, canStartRun, isHeld, toggleHold, mmToPx }: Props) {
  const { word, mark } = stateWords[item.state];
  const isUsable = item.state === "approved" || item.state === "restricted";
  const figure = (value: number | null, decimals: number) => <span className="figures">{digits(value, decimals)}</span>;
  return (
    <tr
      data-cable={item.id}
      data-index={index}
      aria-rowindex={index + 2}
      className={`relative h-13 phone:grid phone:h-21 phone:grid-cols-[76px_minmax(0,1fr)_auto] phone:grid-rows-[42px_41px] phone:gap-x-3 phone:border-b phone:px-4 phone:border-line [&>*]:align-middle [&>*]:phone:border-0 [&>*]:phone:p-0 ${isHeld ? "bg-copper-wash" : "hover:bg-copper-wash/50"}`}
    >
      <Cell className="w-16 p-0! phone:row-span-2 phone:self-center">
        <span className="flex max-h-12 items-center justify-center overflow-hidden phone:max-h-20">
          <SectionView
            construction={item.construction}
            build={item.build}
            family={item.family}
            outerDiameterMm={item.outerDiameterMm}
            mmToPx={mmToPx}
          />
        </span>
      </Cell>
      <RowHead className="max-w-0 min-w-56 phone:row-span-2 phone:max-w-none phone:min-w-0 phone:self-center">
        <Names item={item} href={href} />
        <PhoneFigures item={item} />
      </RowHead>
      <Cell isRight className="py-0 phone:hidden">
        {figure(item.z0Ohm, 1)}
      </Cell>
      <Cell isRight className="py-0 phone:hidden">
        {figure(item.velocityFactor, 3)}
      </Cell>
      <Cell isRight className="py-0 phone:col-start-3 phone:row-start-1 phone:self-end phone:text-figure">
        <b className="figures">{digits(item.lossDbPer100m, 2)}</b>
      </Cell>
      <Cell className="py-0 pl-5 folded:hidden">
        <RangeBar
          range={item.lossRangeDbPer100m}
          at={item.lossDbPer100m}
          domain={barDomain}
          width={barWidth}
          height={30}
        />
      </Cell>
      <Cell isRight className="py-0 folded:hidden">
        {figure(item.delaySPerM * 1e9, 2)}
      </Cell>
      <Cell isRight className="py-0 phone:hidden">
        {figure(item.outerDiameterMm, 1)}
      </Cell>
      <Cell isRight className="py-0 folded:hidden">
        {figure(item.usedInRuns, 0)}
      </Cell>
      <Cell className="max-w-34 pl-6 phone:hidden">
        <StateMark state={mark}>{word}</StateMark>
        {item.condition && (
          <span className="block truncate text-note text-ink-3" title={item.condition}>
            {item.condition}
          </span>
        )}
      </Cell>
      <Cell isRight className="py-0 whitespace-nowrap phone:hidden">
        {canStartRun && isUsable && (
          <Link
            href={`/runs/new?cable=${encodeURIComponent(item.id)}` as Route}
            prefetch={false}
            className="link relative z-1 text-label"
          >
            Use in a run
          </Link>
        )}
      </Cell>
      <Cell isRight className="w-12 phone:col-start-3 phone:row-start-2 phone:w-auto phone:self-start">
        <HoldButton designation={item.designation} isHeld={isHeld} toggle={toggleHold} />
      </Cell>
    </tr>
  );
}
