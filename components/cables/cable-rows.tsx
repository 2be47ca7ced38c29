import type { Route } from "next";
import Link from "next/link";
import { SectionView } from "@/components/line/section-view";
import { RangeBar, RangeBarScale } from "@/components/plot/range-bar";
import { StateMark } from "@/components/ui/state-mark";
import { Cell, HeadCell, RowHead, Table } from "@/components/ui/table";
import { buildWords, stateWords } from "@/components/cables/words";
import type { CableItem } from "@/lib/cables/schema";
import { digits, frequency, inWords } from "@/lib/format/quantity";

interface Props {
  items: CableItem[];
  lossAtHz: number;
  canStartRun: boolean;
}

/** px per millimetre on a desk: the thickest cable in common use still fits its row. */
const mmToPx = 2.6;
const barDomain = [0.1, 200] as const;
const barWidth = 118;

function Scale() {
  return (
    <svg width={10 * mmToPx + 2} height="8" aria-hidden="true" className="mx-auto block">
      <path d={`M1 1v6M1 4h${10 * mmToPx}m0 -3v6`} fill="none" stroke="var(--ink-2)" />
    </svg>
  );
}

function Head({ lossAtHz }: { lossAtHz: number }) {
  const unit = (text: string) => <span className="block font-normal">{text}</span>;
  return (
    <thead className="phone:hidden">
      <tr className="[&>th]:border-ink [&>th]:align-top">
        <HeadCell className="w-16 text-center">
          <span className="block font-normal">10 mm</span>
          <Scale />
        </HeadCell>
        <HeadCell>Cable</HeadCell>
        <HeadCell isRight>
          Z<sub>0</sub>
          {unit("Ω")}
        </HeadCell>
        <HeadCell isRight>Velocity{unit("factor")}</HeadCell>
        <HeadCell isRight className="w-22">
          dB/100 m{unit(inWords(frequency(lossAtHz)))}
        </HeadCell>
        <HeadCell className="w-34 pl-5 folded:hidden">
          10 MHz to 1 GHz
          <RangeBarScale domain={barDomain} width={barWidth} />
        </HeadCell>
        <HeadCell isRight className="folded:hidden">
          Delay{unit("ns/m")}
        </HeadCell>
        <HeadCell isRight>Outer{unit("mm")}</HeadCell>
        <HeadCell isRight className="folded:hidden">
          In runs
        </HeadCell>
        <HeadCell className="pl-6">State</HeadCell>
        <HeadCell aria-label="Use" />
      </tr>
    </thead>
  );
}

/** The rows of the catalogue: each cable end-on, to one scale, with its figures. */
export function CableRows({ items, lossAtHz, canStartRun }: Props) {
  return (
    <Table className="mt-1">
      <Head lossAtHz={lossAtHz} />
      <tbody>
        {items.map((item) => (
          <CableRow key={item.id} item={item} lossAtHz={lossAtHz} canStartRun={canStartRun} />
        ))}
      </tbody>
    </Table>
  );
}

function CableRow({ item, lossAtHz, canStartRun }: { item: CableItem; lossAtHz: number; canStartRun: boolean }) {
  const { word, mark } = stateWords[item.state];
  const isUsable = item.state === "approved" || item.state === "restricted";
  const [low, high] = item.lossRangeDbPer100m;
  const figure = (value: number | null, decimals: number) => <span className="figures">{digits(value, decimals)}</span>;
  return (
    <tr className="hover:bg-copper-wash/50 phone:grid phone:grid-cols-[76px_minmax(0,1fr)_auto] phone:gap-x-3 phone:border-b phone:border-line phone:py-3 [&>*]:align-middle [&>*]:phone:border-0 [&>*]:phone:p-0">
      <Cell className="h-13 w-16 phone:row-span-3 phone:h-auto">
        <span className="flex items-center justify-center">
          <SectionView
            construction={item.construction}
            build={item.build}
            family={item.family}
            outerDiameterMm={item.outerDiameterMm}
            mmToPx={mmToPx}
          />
        </span>
      </Cell>
      <RowHead className="max-w-0 min-w-56 phone:max-w-none phone:min-w-0">
        <span className="flared block truncate text-row">
          {item.designation}
          {item.preferred && <span className="ml-2 text-note font-normal text-copper">preferred</span>}
        </span>
        <span className="block truncate text-label text-ink-2" title={`${item.name}. ${buildWords(item.build)}`}>
          {item.name}. {buildWords(item.build)}
        </span>
      </RowHead>
      <Cell isRight className="phone:hidden">
        {figure(item.z0Ohm, 1)}
      </Cell>
      <Cell isRight className="phone:hidden">
        {figure(item.velocityFactor, 3)}
      </Cell>
      <Cell isRight className="phone:col-start-3 phone:row-start-1 phone:text-figure">
        <b className="figures">{digits(item.lossDbPer100m, 2)}</b>
        <span className="unit hidden phone:block phone:text-note">dB/100 m at {inWords(frequency(lossAtHz))}</span>
      </Cell>
      <Cell className="pl-5 folded:hidden">
        <RangeBar range={[low, high]} at={item.lossDbPer100m} domain={barDomain} width={barWidth} height={30} />
      </Cell>
      <Cell isRight className="folded:hidden">
        {figure(item.delaySPerM * 1e9, 2)}
      </Cell>
      <Cell isRight className="phone:hidden">
        {figure(item.outerDiameterMm, 1)}
      </Cell>
      <Cell isRight className="folded:hidden">
        {figure(item.usedInRuns, 0)}
      </Cell>
      <Cell className="hidden phone:col-start-2 phone:row-start-2 phone:block">
        <span className="figures">{digits(item.z0Ohm, 1)}</span>
        <span className="unit"> Ω</span> <span className="figures">{digits(item.velocityFactor, 3)}</span>{" "}
        <span className="figures">{digits(item.outerDiameterMm, 1)}</span>
        <span className="unit"> mm</span>
      </Cell>
      <Cell className="pl-6 phone:col-start-2 phone:row-start-3">
        <StateMark state={mark}>{word}</StateMark>
        {item.condition && <span className="block max-w-40 text-note text-ink-3">{item.condition}</span>}
      </Cell>
      <Cell isRight className="phone:col-start-3 phone:row-start-3">
        {canStartRun && isUsable && (
          <Link
            href={`/runs/new?cable=${encodeURIComponent(item.id)}` as Route}
            className="link text-label whitespace-nowrap phone:flex phone:min-h-11 phone:items-center"
          >
            Use in a run
          </Link>
        )}
      </Cell>
    </tr>
  );
}
