"use client";

import { useQuery } from "@tanstack/react-query";
import { useRef, useState, type KeyboardEvent } from "react";
import { SectionView } from "@/components/line/section-view";
import { StateMark } from "@/components/ui/state-mark";
import type { CablePage } from "@/lib/cables/query";
import type { CableItem } from "@/lib/cables/schema";
import { call } from "@/lib/http/call";

interface Props {
  current: string;
  take: (cableId: string) => void;
  besides?: { label: string; choose: () => void };
}

const row =
  "flex w-full items-center gap-2.5 px-1 py-1.5 text-left hover:bg-copper-wash aria-[current=true]:bg-copper-wash phone:min-h-11";

/** A search of the catalogue in a small panel; arrow keys go through what it finds. */
export function CableFinder({ current, take, besides }: Props) {
  const [text, setText] = useState("");
  const panel = useRef<HTMLDivElement>(null);
  const list = useQuery({
    queryKey: ["cables", "picker", text],
    queryFn: ({ signal }) => call<CablePage>(`/cables?limit=12&q=${encodeURIComponent(text)}`, { signal }),
    placeholderData: (before) => before,
  });
  const items = list.data?.items ?? [];
  // What was found before stands there greyed until the answer comes, and cannot be taken for it.
  const isStale = list.isPlaceholderData;

  function step(event: KeyboardEvent) {
    const by = { ArrowDown: 1, ArrowUp: -1 }[event.key];
    const stops = [...(panel.current?.querySelectorAll<HTMLElement>("input, button") ?? [])];
    const to = stops[stops.indexOf(event.target as HTMLElement) + (by ?? 0)];
    if (!by || !to) return;
    event.preventDefault();
    if (isStale) return;
    to.focus();
  }
  return (
    <div
      ref={panel}
      onKeyDown={step}
      className="absolute top-full left-0 z-20 mt-1 w-80 rounded border border-ink bg-field p-2 phone:w-full"
    >
      <input
        autoFocus
        value={text}
        maxLength={200}
        onChange={(event) => setText(event.target.value)}
        placeholder="Search the catalogue"
        aria-label="Search the catalogue"
        className="mb-1 h-7.25 w-full border-b border-rule bg-transparent px-1 outline-none focus:border-copper phone:h-11 phone:text-section"
      />
      {text.trim() && list.data?.readAs && <p className="px-1 text-note text-ink-3">Read as {list.data.readAs}</p>}
      {list.error && <p className="p-1 text-label text-fail">{list.error.message}</p>}
      {list.data && items.length === 0 && (
        <p className="p-1 text-label text-ink-2">No approved cable fits. Try fewer words.</p>
      )}
      {besides && (
        <button type="button" onClick={besides.choose} className={`${row} link text-label`}>
          {besides.label}
        </button>
      )}
      <ul aria-busy={isStale} className="max-h-72 overflow-y-auto aria-busy:opacity-60">
        {items.map((item) => (
          <li key={item.id}>
            <button
              type="button"
              disabled={isStale}
              aria-current={item.id === current}
              onClick={() => take(item.id)}
              className={row}
            >
              <FoundCable item={item} />
            </button>
          </li>
        ))}
      </ul>
    </div>
  );
}

function FoundCable({ item }: { item: CableItem }) {
  const { construction, build, outerDiameterMm } = item;
  return (
    <>
      <span className="flex w-8 justify-center">
        <SectionView {...{ construction, build, outerDiameterMm }} mmToPx={1} />
      </span>
      <span className="min-w-0 flex-1">
        <span className="block text-body font-[560]">{item.designation}</span>
        <span className="block truncate text-note text-ink-3">{item.name}</span>
      </span>
      {item.state === "restricted" && <StateMark state="warn">restricted</StateMark>}
    </>
  );
}
