"use client";

import { useEffect, useRef } from "react";
import type { HeldCable } from "@/components/cables/use-held";
import { SectionView } from "@/components/line/section-view";
import { Button } from "@/components/ui/button";

interface Props {
  /** the cable for which there is no room */
  waiting: { designation: string } | null;
  held: readonly HeldCable[];
  exchange: (id: string | null) => void;
}

/** Four are held: which goes back for the fifth? */
export function PutBack({ waiting, held, exchange }: Props) {
  const dialog = useRef<HTMLDialogElement>(null);
  useEffect(() => {
    const element = dialog.current;
    if (waiting && element && !element.open) element.showModal();
    if (!waiting && element?.open) element.close();
  }, [waiting]);
  return (
    <dialog
      ref={dialog}
      aria-label="Which cable goes back?"
      onClose={() => exchange(null)}
      className="w-[min(26rem,calc(100vw-2rem))] rounded border border-ink bg-paper p-5"
    >
      <h2>Four are held. Which goes back for {waiting?.designation}?</h2>
      <ul className="mt-3">
        {held.map(({ id, cable }) => (
          <li key={id} className="border-t border-line">
            <button
              type="button"
              onClick={() => exchange(id)}
              className="flex min-h-11 w-full items-center gap-3 px-1 py-1.5 text-left hover:bg-copper-wash"
            >
              <span className="flex w-12 shrink-0 justify-center">
                {cable && (
                  <SectionView
                    construction={cable.construction}
                    build={cable.build}
                    family={cable.family}
                    outerDiameterMm={cable.construction?.outerDiameterMm ?? null}
                    mmToPx={1.5}
                  />
                )}
              </span>
              <span className="min-w-0 truncate">
                <b>{cable?.designation ?? id}</b>
                {cable && <span className="text-ink-2">, {cable.name}</span>}
              </span>
            </button>
          </li>
        ))}
      </ul>
      <div className="mt-4 flex justify-end">
        <Button onClick={() => exchange(null)}>Keep these four</Button>
      </div>
    </dialog>
  );
}
