"use client";

import { useEffect, useState } from "react";
import { Button } from "@/components/ui/button";
import { strands } from "@/components/ui/strands";

interface WorkingProps {
  /** "Working out 160 draws" */
  label: string;
  /** how many are done, when that is known */
  done?: number;
  total?: number;
  onStop?: () => void;
}

/** Work that is over sooner than this is not shown at all. */
const patienceMs = 300;

const width = 466;
const lay = strands({ fromX: 0, toX: width, middleY: 24, amplitude: 9, pitch: 22.9 });

/** Strands laid as far as the work has come; the rest still lies open. */
function Laying({ share }: { share: number }) {
  const at = Math.round(width * Math.max(0.06, Math.min(1, share)));
  const rest = width - at;
  return (
    <svg viewBox={`0 0 ${width} 48`} width={width} height="48" aria-hidden="true" fill="none" className="max-w-full">
      <g opacity="0.35" strokeWidth="7">
        <path d={`M${at} 15C${at + rest * 0.2} 4 ${at + rest * 0.45} 6 ${width} 6`} stroke="var(--jacket)" />
        <path d={`M${at} 33C${at + rest * 0.2} 43 ${at + rest * 0.45} 42 ${width} 42`} stroke="var(--copper-fill)" />
      </g>
      <svg width={at} height="48" className="overflow-hidden">
        <g strokeWidth="6">
          <path d={lay.second} stroke="var(--jacket)" />
          <path d={lay.first} stroke="var(--paper)" strokeWidth="9.5" />
          <path d={lay.first} stroke="var(--copper-fill)" />
          <path d={lay.secondGap} stroke="var(--paper)" strokeWidth="9.5" />
          <path d={lay.secondRising} stroke="var(--jacket)" />
        </g>
      </svg>
    </svg>
  );
}

/** Goes round while nobody can say how far the work is; stands still where motion is not wanted. */
function useRound(isCounted: boolean): number {
  const [share, setShare] = useState(0.45);
  useEffect(() => {
    const isStill = window.matchMedia("(prefers-reduced-motion: reduce)").matches;
    if (isCounted || isStill) return undefined;
    const timer = setInterval(() => setShare((at) => (at >= 1 ? 0.06 : at + 0.02)), 50);
    return () => clearInterval(timer);
  }, [isCounted]);
  return share;
}

/** Long work under way: after 0.3 s the strands are laid, with a count and a way to stop. */
export function Working({ label, done, total, onStop }: WorkingProps) {
  const [isDue, setDue] = useState(false);
  useEffect(() => {
    const timer = setTimeout(() => setDue(true), patienceMs);
    return () => clearTimeout(timer);
  }, []);
  const isCounted = done !== undefined && total !== undefined && total > 0;
  const round = useRound(isCounted);
  if (!isDue) return null;
  return (
    <div className="text-label text-ink-2">
      <Laying share={isCounted ? done / total : round} />
      <p className="mt-1">
        <span role="status">{label}</span>
        {done !== undefined && (
          <>
            , <span className="figures text-ink">{done}</span> done
          </>
        )}
      </p>
      {onStop && (
        <Button size="small" className="mt-2" onClick={onStop}>
          Stop
        </Button>
      )}
    </div>
  );
}
