"use client";

import { useState } from "react";
import type { LineScale } from "@/components/line/line-scale";
import { Strip } from "@/components/line/strip";
import { useLineScale } from "@/components/line/use-line-scale";
import { EndButtons } from "@/components/runs/end-buttons";
import { LineDown } from "@/components/runs/line-down";
import { LeafPanel, nearestLine } from "@/components/runs/leaf-panel";
import { PowerLedger } from "@/components/runs/power-ledger";
import { ReturnLossChart } from "@/components/runs/return-loss-chart";
import { useRunEditor, type Selected } from "@/components/runs/run-editor";
import { RunFrame } from "@/components/runs/run-frame";
import { RunParticulars } from "@/components/runs/run-particulars";
import { RunReadings } from "@/components/runs/run-readings";
import { pieceName, stripEnds, stripPieces } from "@/components/runs/strip-pieces";
import { useAnalysis } from "@/components/runs/use-analysis";
import { useLineKeys } from "@/components/runs/use-line-keys";
import { Verdicts } from "@/components/runs/verdicts";
import { WaveChart } from "@/components/runs/wave-chart";
import { Button } from "@/components/ui/button";
import { StateNote } from "@/components/ui/state-mark";
import { useIsPhone } from "@/components/ui/use-is-phone";
import { insertAt, move, newElement } from "@/lib/runs/edit";

/** The run as its line: the strip, the leaf of what is selected, and under them everything that depends on place. */
export function LineView() {
  const { draft, lines, faults } = useRunEditor();
  const { analysis, trouble, isBehind } = useAnalysis();
  useLineKeys();
  const names = draft.circuit.elements.map((_, i) => pieceName(draft.circuit.elements, i, lines));
  const isPartial = Object.keys(faults).length > 0;
  return (
    <RunFrame head={<RunReadings analysis={analysis} />}>
      <div className="mt-4">
        <LinePanel analysis={analysis} isBehind={isBehind} />
      </div>
      {isPartial && <Partial />}
      {trouble && (
        <div className="mt-4">
          <StateNote state="warn">{trouble} What each piece does alone is still shown on the strip.</StateNote>
        </div>
      )}
      {analysis && (
        <div
          className={`mt-5 grid grid-cols-[minmax(0,1fr)_448px] gap-x-10 gap-y-6 folded:grid-cols-1 ${isBehind ? "opacity-60" : ""}`}
        >
          <ReturnLossChart analysis={analysis} />
          <div>
            <PowerLedger
              analysis={analysis}
              names={names}
              designHz={draft.designHz}
              sourceName={draft.sourceName}
              loadName={draft.loadName}
            />
            <Verdicts analysis={analysis} />
          </div>
        </div>
      )}
      <RunParticulars />
    </RunFrame>
  );
}

/** A field that cannot be read: said once in words, and what the figures then stand for. */
function Partial() {
  const { draft, faults, lines, select } = useRunEditor();
  const [path = "", fault] = Object.entries(faults)[0] ?? [];
  const index = Number(/^elements\.(\d+)\./.exec(path)?.[1] ?? NaN);
  const where = Number.isNaN(index) ? "A condition of the run" : pieceName(draft.circuit.elements, index, lines);
  return (
    <div className="mt-3" role="status">
      <StateNote state="fail">
        <b>{where}:</b> {fault?.message} Until then the figures are those of the last value that could be read.{" "}
        {!Number.isNaN(index) && (
          <button type="button" className="link" onClick={() => select(index)}>
            Show the field
          </button>
        )}
      </StateNote>
    </div>
  );
}

interface LinePanelProps {
  analysis: ReturnType<typeof useAnalysis>["analysis"];
  isBehind: boolean;
}

function LinePanel({ analysis, isBehind }: LinePanelProps) {
  const { draft, lines, faults, selected, select, edit, canEdit } = useRunEditor();
  const { elements } = draft.circuit;
  const pieces = stripPieces(draft, lines, faults, analysis?.pieces);
  const { ref, width, scale } = useLineScale(pieces);
  const isPhone = useIsPhone();
  const put = (next: typeof elements) => edit({ ...draft, circuit: { ...draft.circuit, elements: next } });
  const index = typeof selected === "number" ? selected : null;
  const strip = {
    pieces,
    ...stripEnds(draft),
    selected: index,
    onSelect: (next: number | null) => select(next === selected ? null : next),
    onMove: canEdit ? (from: number, to: number) => put(move(elements, from, to)) : undefined,
    onOpen: select,
  };
  const wave = analysis?.wave ?? null;
  return (
    <div ref={ref}>
      {isPhone !== true && (
        <div className="relative phone:hidden">
          <Strip {...strip} scale={scale} width={width} />
          <EndButtons
            source={{ width: scale.startX - 4 }}
            load={{ left: scale.endX + 8, width: Math.max(24, width - scale.endX - 8) }}
          />
        </div>
      )}
      {isPhone !== false && (
        <div className="hidden phone:block">
          <LineDown {...strip} wave={wave} availablePowerW={draft.availablePowerW} />
        </div>
      )}
      <LeafPanel notchX={notchOf(selected, scale)} figures={index === null ? undefined : analysis?.pieces[index]} />
      {canEdit && <AddPiece put={put} />}
      {isPhone !== true && (
        <div className={`mt-3 phone:hidden ${isBehind ? "opacity-60" : ""}`}>
          <WaveChart wave={wave} scale={scale} width={width} />
        </div>
      )}
    </div>
  );
}

/** Where the leaf points: the middle of what is selected. */
function notchOf(selected: Selected, scale: LineScale): number {
  if (selected === "source") return scale.startX - 24;
  if (selected === "load") return scale.endX + 24;
  const place = selected === null ? undefined : scale.places[selected];
  return place ? (place.fromX + place.toX) / 2 : 0;
}

type Elements = ReturnType<typeof useRunEditor>["draft"]["circuit"]["elements"];

/** The first piece of an empty line, or one more at its load end. */
function AddPiece({ put }: { put: (next: Elements) => void }) {
  const { draft, lines, select, selected } = useRunEditor();
  const [isTold, setTold] = useState(false);
  const { elements } = draft.circuit;
  if (selected !== null) return null;
  const line = nearestLine(elements, elements.length, [...lines.keys()][0]);
  const add = (kind: "cable" | "joint") => {
    if (!line) return setTold(true);
    put(insertAt(elements, elements.length, [newElement(kind, line, 50)]));
    select(elements.length);
  };
  return (
    <div className="mt-2 flex flex-wrap items-center gap-3">
      <Button kind={elements.length === 0 ? "main" : "quiet"} size="small" onClick={() => add("cable")}>
        {elements.length === 0 ? "Add the first cable" : "Add a cable at the load end"}
      </Button>
      {elements.length > 0 && (
        <Button kind="quiet" size="small" onClick={() => add("joint")}>
          Add a joint
        </Button>
      )}
      <span className="text-note text-ink-3">Select a piece, the source or the load to change it.</span>
      {isTold && <StateNote state="warn">The catalogue has no approved cable yet.</StateNote>}
    </div>
  );
}
