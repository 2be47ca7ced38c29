"use client";

import { useQuery } from "@tanstack/react-query";
import { useEffect, useId, useRef, useState } from "react";
import { SectionView } from "@/components/line/section-view";
import { useRunEditor } from "@/components/runs/run-editor";
import { fieldColours, fieldEdge } from "@/components/ui/field";
import { StateMark } from "@/components/ui/state-mark";
import { lineOf } from "@/lib/cables/line";
import type { Cable, CableItem } from "@/lib/cables/schema";
import { call } from "@/lib/http/call";

interface Props {
  cableId: string;
  choose: (cableId: string) => void;
  label?: string;
  /** choosing changes nothing in the run, so readers may */
  isAlwaysOpen?: boolean;
}

/** The cable of a piece: its name in a field; opened, a search of the catalogue with each cable drawn end-on. */
export function CablePicker({ cableId, choose, label = "Cable", isAlwaysOpen = false }: Props) {
  const { lines, addLine, canEdit } = useRunEditor();
  const [isOpen, setOpen] = useState(false);
  const [trouble, setTrouble] = useState<string | null>(null);
  const id = useId();
  const box = useRef<HTMLDivElement>(null);
  const line = lines.get(cableId);

  useEffect(() => {
    if (!isOpen) return;
    const close = (event: PointerEvent) => !box.current?.contains(event.target as Node) && setOpen(false);
    document.addEventListener("pointerdown", close);
    return () => document.removeEventListener("pointerdown", close);
  }, [isOpen]);

  async function take(chosen: string) {
    try {
      if (!lines.has(chosen)) addLine(lineOf(await call<Cable>(`/cables/${chosen}`)));
      choose(chosen);
      setTrouble(null);
      setOpen(false);
    } catch (error) {
      setTrouble((error as Error).message);
    }
  }
  return (
    <div
      ref={box}
      className="relative flex w-38 flex-col gap-0.5 phone:w-full"
      onKeyDown={(event) => event.key === "Escape" && isOpen && (event.stopPropagation(), setOpen(false))}
    >
      <span id={id} className="text-note text-ink-2">
        {label}
      </span>
      <button
        type="button"
        aria-labelledby={id}
        aria-describedby={`${id}-value`}
        aria-expanded={isOpen}
        disabled={!canEdit && !isAlwaysOpen}
        onClick={() => setOpen(!isOpen)}
        className={`${fieldEdge} ${fieldColours(false)} h-7.25 justify-between px-2 text-body phone:h-11 phone:text-section`}
      >
        <span id={`${id}-value`} className="truncate">
          {line?.designation ?? "Choose a cable"}
        </span>
        <svg width="8" height="6" aria-hidden="true">
          <path d="M0 0H8L4 6z" fill="var(--ink-2)" />
        </svg>
      </button>
      {trouble && <p className="text-note text-fail">{trouble}</p>}
      {isOpen && <Found current={cableId} take={take} />}
    </div>
  );
}

interface FoundProps {
  current: string;
  take: (cableId: string) => void;
}

function Found({ current, take }: FoundProps) {
  const [text, setText] = useState("");
  const list = useQuery({
    queryKey: ["cables", "picker", text],
    queryFn: ({ signal }) =>
      call<{ items: CableItem[]; readAs?: { text: string } }>(`/cables?limit=12&q=${encodeURIComponent(text)}`, {
        signal,
      }),
    placeholderData: (before) => before,
  });
  const items = list.data?.items ?? [];
  return (
    <div className="absolute top-full left-0 z-20 mt-1 w-80 rounded border border-ink bg-field p-2 phone:w-full">
      <input
        autoFocus
        value={text}
        onChange={(event) => setText(event.target.value)}
        placeholder="Search the catalogue"
        aria-label="Search the catalogue"
        className="mb-1 h-7.25 w-full border-b border-rule bg-transparent px-1 outline-none focus:border-copper phone:h-11 phone:text-section"
      />
      {text && list.data?.readAs && <p className="px-1 text-note text-ink-3">Read as {list.data.readAs.text}</p>}
      {list.error && <p className="p-1 text-label text-fail">{list.error.message}</p>}
      {list.data && items.length === 0 && (
        <p className="p-1 text-label text-ink-2">No approved cable fits. Try fewer words.</p>
      )}
      <ul className="max-h-72 overflow-y-auto">
        {items.map((item) => (
          <li key={item.id}>
            <button
              type="button"
              aria-current={item.id === current}
              onClick={() => take(item.id)}
              className="flex w-full items-center gap-2.5 px-1 py-1.5 text-left hover:bg-copper-wash aria-[current=true]:bg-copper-wash phone:min-h-11"
            >
              <span className="flex w-8 justify-center">
                <SectionView
                  construction={item.construction}
                  build={item.build}
                  outerDiameterMm={item.outerDiameterMm}
                  mmToPx={1}
                />
              </span>
              <span className="min-w-0 flex-1">
                <span className="block text-body font-[560]">{item.designation}</span>
                <span className="block truncate text-note text-ink-3">{item.name}</span>
              </span>
              {item.state === "restricted" && <StateMark state="warn">restricted</StateMark>}
            </button>
          </li>
        ))}
      </ul>
    </div>
  );
}
