"use client";

import type { Route } from "next";
import { HeldInTray, Hung, lookAt, roomPx } from "@/components/cables/held-cable";
import { LossCurves } from "@/components/cables/loss-curves";
import type { HeldCable } from "@/components/cables/use-held";
import { CursorProvider } from "@/components/plot/cursor";
import { Button } from "@/components/ui/button";
import { KeyCap } from "@/components/ui/key-cap";
import { mostHeld } from "@/lib/cables/address";
import { compareFigures } from "@/lib/cables/compare";
import { entryAddress } from "@/lib/cables/entry-address";
import { outerDiameterMm } from "@/lib/cables/line";

interface Props {
  held: readonly HeldCable[];
  lossAtHz: number;
  putBack: (id: string) => void;
  /** opens them side by side */
  compare: () => void;
}

const mostMmToPx = 4.2;

/** px per millimetre at which the thickest of the held cables still has room. */
function scaleFor(held: readonly HeldCable[], room: number): number {
  const thickest = Math.max(1, ...held.map(({ cable }) => (cable && outerDiameterMm(cable.construction)) ?? 0));
  return Math.min(mostMmToPx, room / thickest);
}

function FreePlace({ left }: { left: number }) {
  return (
    <li className="hidden min-w-0 flex-1 min-[1250px]:flex">
      <svg width="84" height="148" aria-hidden="true" className="block shrink-0" fill="none">
        <path d="M42 22V46" stroke="var(--rule)" strokeWidth="1.2" strokeDasharray="2 3" />
        <circle cx="42" cy="67" r="21" stroke="var(--rule)" strokeWidth="1.4" strokeDasharray="3 4" />
      </svg>
      <p className="pt-13 text-note text-ink-2">
        {left === 1 ? "One place" : `${left === 2 ? "Two" : "Three"} places`}
        <br />
        left
      </p>
    </li>
  );
}

function PhoneTray({ held, compare }: Pick<Props, "held" | "compare">) {
  return (
    <div className="hidden items-center justify-between gap-3 px-4 phone:flex">
      <div className="relative flex flex-1 before:absolute before:inset-x-0 before:top-[12px] before:h-[1.5px] before:bg-ink">
        {held.map((one) => (
          <Hung key={one.id} held={one} mmToPx={scaleFor(held, 40)} width={56} height={80} />
        ))}
      </div>
      <Button kind="main" size="touch" onClick={compare}>
        Compare {held.length}
      </Button>
    </div>
  );
}

/** What is held up to compare, hung at the foot of the page. */
export function Tray({ held, lossAtHz, putBack, compare }: Props) {
  const figures = held.map(({ cable }) => cable && compareFigures(cable, lossAtHz));
  const ids = held.map(({ id }) => id);
  const shown = held.flatMap(({ cable }, i) => (cable ? [{ cable, look: lookAt(i) }] : []));
  return (
    <aside
      aria-label="Held up to compare"
      className="fixed inset-x-0 bottom-0 z-10 border-t-[1.5px] border-ink bg-sailcloth phone:bottom-13.5 print:hidden"
    >
      <PhoneTray held={held} compare={compare} />
      <div className="page-margin flex h-37 gap-7 phone:hidden">
        <div className="w-45 shrink-0 pt-3">
          <h2>Held up to compare</h2>
          <p className="mt-1.25 mb-2.5 text-label text-ink-2">
            Sections drawn at one scale. Press <KeyCap>H</KeyCap> on a row to hold it.
          </p>
          <Button size="small" onClick={compare}>
            Open side by side
          </Button>
        </div>
        <ul className="relative flex min-w-0 flex-1 before:absolute before:inset-x-0 before:top-[22px] before:h-[1.5px] before:bg-ink">
          {held.map((one, i) => (
            <HeldInTray
              key={one.id}
              held={one}
              figures={figures[i]}
              reference={i === 0 ? undefined : figures[0]}
              look={lookAt(i)}
              mmToPx={scaleFor(held, roomPx)}
              href={entryAddress(one.id, { lossAtHz, held: ids }) as Route}
              putBack={() => putBack(one.id)}
            />
          ))}
          {held.length < mostHeld && <FreePlace left={mostHeld - held.length} />}
        </ul>
        <div className="w-100 shrink-0 overflow-hidden pt-1 folded:hidden [&_[role=group]]:max-h-30">
          {shown.length > 0 && (
            <CursorProvider>
              <LossCurves cables={shown} lossAtHz={lossAtHz} height={122} />
            </CursorProvider>
          )}
        </div>
      </div>
    </aside>
  );
}
