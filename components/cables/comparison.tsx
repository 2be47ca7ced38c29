"use client";

import type { Route } from "next";
import Link from "next/link";
import { useEffect, useRef } from "react";
import { comparisonRows, toldRows } from "@/components/cables/comparison-rows";
import { lookAt, percentWords, SeriesDash } from "@/components/cables/held-cable";
import { LossCurves } from "@/components/cables/loss-curves";
import type { HeldCable } from "@/components/cables/use-held";
import { stateWords } from "@/components/cables/words";
import { SectionView } from "@/components/line/section-view";
import { CursorProvider } from "@/components/plot/cursor";
import { Button, buttonClass } from "@/components/ui/button";
import { Figure } from "@/components/ui/figure";
import { StateMark } from "@/components/ui/state-mark";
import { Cell, HeadCell, RowHead, Table } from "@/components/ui/table";
import { compareFigures, differencePercent } from "@/lib/cables/compare";
import { entryAddress } from "@/lib/cables/entry-address";
import { outerDiameterMm } from "@/lib/cables/line";
import { isUsable } from "@/lib/cables/model";
import type { Cable } from "@/lib/cables/schema";

interface Props {
  isOpen: boolean;
  held: readonly HeldCable[];
  lossAtHz: number;
  canStartRun: boolean;
  putBack: (id: string) => void;
  close: () => void;
}

function ColumnHead({ cable, place, mmToPx, ...props }: ColumnProps) {
  const { word, mark } = stateWords[cable.state];
  return (
    <HeadCell className="min-w-40 pl-4 align-bottom phone:min-w-28 phone:pl-2 whitespace-normal">
      <span className="flex h-24 items-end pb-2">
        <SectionView
          construction={cable.construction}
          build={cable.build}
          family={cable.family}
          outerDiameterMm={outerDiameterMm(cable.construction)}
          mmToPx={mmToPx}
        />
      </span>
      <SeriesDash look={lookAt(place)} />
      <Link href={props.href} className="flared block text-row text-ink hover:text-copper">
        {cable.designation}
      </Link>
      <span className="block font-normal">{cable.name}</span>
      <StateMark state={mark}>{word}</StateMark>
      {cable.condition && <span className="block font-normal text-warn">{cable.condition}</span>}
    </HeadCell>
  );
}

interface ColumnProps {
  cable: Cable;
  place: number;
  mmToPx: number;
  href: Route;
}

function Figures({ cables, lossAtHz }: { cables: readonly Cable[]; lossAtHz: number }) {
  const figures = cables.map((cable) => compareFigures(cable, lossAtHz));
  return toldRows(comparisonRows(lossAtHz), figures).map(({ name, quantity, figure, isBare }) => (
    <tr key={quantity}>
      <RowHead className="whitespace-nowrap text-ink-2 phone:whitespace-normal">{name}</RowHead>
      {figures.map((each, i) => (
        <Cell key={i} className="pl-4 whitespace-nowrap phone:pl-2">
          <Figure {...figure(each[quantity])} className="text-control" />
          {i > 0 && !isBare && (
            <span className="figures ml-2 text-note text-ink-2 phone:ml-0 phone:block">
              {percentWords(differencePercent(each[quantity], figures[0]?.[quantity] ?? null))}
            </span>
          )}
        </Cell>
      ))}
    </tr>
  ));
}

function Ways({ cables, canStartRun, putBack }: { cables: readonly Cable[] } & Pick<Props, "canStartRun" | "putBack">) {
  return (
    <tr>
      <RowHead className="border-0">
        <span className="sr-only">What to do</span>
      </RowHead>
      {cables.map(({ id, designation, state }) => (
        <Cell key={id} className="border-0 pt-3 pl-4 phone:pl-2">
          <span className="flex flex-col items-start gap-2">
            {canStartRun && isUsable(state) && (
              <Link
                href={`/runs/new?cable=${encodeURIComponent(id)}` as Route}
                className={buttonClass("plain", "small")}
              >
                Use in a run<span className="sr-only">: {designation}</span>
              </Link>
            )}
            <button type="button" className="link min-h-6 text-label phone:min-h-11" onClick={() => putBack(id)}>
              Put {designation} back
            </button>
          </span>
        </Cell>
      ))}
    </tr>
  );
}

/** The held cables side by side: every figure, and how far it is from the first cable's. */
export function Comparison({ isOpen, held, lossAtHz, canStartRun, putBack, close }: Props) {
  const dialog = useRef<HTMLDialogElement>(null);
  const cables = held.flatMap(({ cable }) => cable ?? []);
  const ids = held.map(({ id }) => id);
  useEffect(() => {
    const element = dialog.current;
    if (isOpen && element && !element.open) element.showModal();
    if (!isOpen && element?.open) element.close();
  }, [isOpen]);
  const thickest = Math.max(1, ...cables.map(({ construction }) => outerDiameterMm(construction) ?? 0));
  const mmToPx = Math.min(6, 86 / thickest);
  return (
    <dialog
      ref={dialog}
      aria-label="Side by side"
      onClose={() => isOpen && close()}
      className="max-h-[calc(100dvh-2rem)] w-[min(76rem,calc(100vw-2rem))] max-w-none overflow-auto rounded border border-ink bg-paper p-6 phone:m-0 phone:h-dvh phone:max-h-none phone:w-screen phone:border-0 phone:p-4"
    >
      {isOpen && (
        <CursorProvider>
          <div className="flex items-baseline justify-between gap-4">
            <h2 className="text-[1.3125rem]">Side by side</h2>
            <Button onClick={close} autoFocus>
              Close
            </Button>
          </div>
          <p className="text-label text-ink-2">
            Sections drawn at one scale. 20 °C. Per cent are against {cables[0]?.designation ?? "the first"}.
          </p>
          <div className="overflow-x-auto">
            <Table className="mt-2 w-auto min-w-[60%]">
              <thead>
                <tr>
                  <HeadCell aria-label="Figure" />
                  {cables.map((cable) => (
                    <ColumnHead
                      key={cable.id}
                      cable={cable}
                      place={ids.indexOf(cable.id)}
                      mmToPx={mmToPx}
                      href={entryAddress(cable.id, { lossAtHz, held: ids }) as Route}
                    />
                  ))}
                </tr>
              </thead>
              <tbody>
                <Figures cables={cables} lossAtHz={lossAtHz} />
                <Ways cables={cables} canStartRun={canStartRun} putBack={putBack} />
              </tbody>
            </Table>
          </div>
          <div className="mt-6 max-w-180">
            <LossCurves
              cables={cables.map((cable) => ({ cable, look: lookAt(ids.indexOf(cable.id)) }))}
              lossAtHz={lossAtHz}
              height={280}
            />
          </div>
        </CursorProvider>
      )}
    </dialog>
  );
}
