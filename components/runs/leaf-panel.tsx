"use client";

import { useState } from "react";
import { Leaf } from "@/components/line/leaf";
import { LeafForm } from "@/components/runs/leaf-form";
import { useRunEditor } from "@/components/runs/run-editor";
import { pieceName } from "@/components/runs/strip-pieces";
import { Button } from "@/components/ui/button";
import { Field } from "@/components/ui/field";
import { Figure } from "@/components/ui/figure";
import { decibels, impedance, nanoseconds, significantDigits, type Figure as Shown } from "@/lib/format/quantity";
import type { PieceFigures } from "@/lib/runs/analysis";
import { insertAt, newElement, removeAt, replaceAt, split } from "@/lib/runs/edit";
import { elementFields } from "@/lib/runs/leaf/element-fields";
import { elementKinds } from "@/lib/runs/leaf/element-kinds";
import { terminationFields } from "@/lib/runs/leaf/termination-fields";
import type { Termination } from "@/lib/line/element";
import type { Element, LineRef } from "@/lib/runs/circuit-schema";

interface Props {
  notchX: number;
  figures: PieceFigures | undefined;
}

/** The editor of whatever is selected on the strip. */
export function LeafPanel({ notchX, figures }: Props) {
  const { selected } = useRunEditor();
  if (selected === null) return null;
  if (selected === "source" || selected === "load") return <EndLeaf key={selected} end={selected} notchX={notchX} />;
  return <PieceLeaf key={selected} index={selected} notchX={notchX} figures={figures} />;
}

function EndLeaf({ end, notchX }: { end: "source" | "load"; notchX: number }) {
  const { draft, edit, canEdit } = useRunEditor();
  const nameKey = end === "source" ? "sourceName" : "loadName";
  return (
    <Leaf name={end === "source" ? "The source" : "The load"} notchX={notchX}>
      <div className="flex flex-wrap items-start gap-3">
        <Field
          label="Name"
          value={draft[nameKey]}
          maxLength={40}
          disabled={!canEdit}
          className="w-32 phone:w-full"
          onChange={(event) => edit({ ...draft, [nameKey]: event.target.value }, nameKey)}
        />
        <LeafForm<Termination>
          fields={terminationFields(end === "load")}
          edited={draft.circuit[end]}
          path={`circuit.${end}`}
          write={(next, tag) => edit({ ...draft, circuit: { ...draft.circuit, [end]: next } }, tag)}
        />
      </div>
    </Leaf>
  );
}

/** The cable most likely meant by a new piece: the neighbour's, else any of the run's, else the first at hand. */
export function nearestLine(elements: readonly Element[], index: number, fallback: string | undefined): LineRef | null {
  const near = [...elements.slice(0, index).reverse(), ...elements.slice(index)];
  for (const element of near) {
    if (element.kind === "cable" || element.kind === "stub") return element.line;
    if (element.kind === "parallel" && element.branches[0]) return element.branches[0].line;
  }
  return fallback === undefined ? null : { cableId: fallback };
}

function PieceLeaf({ index, notchX, figures }: Props & { index: number }) {
  const { draft, edit, select, canEdit, lines } = useRunEditor();
  const { elements } = draft.circuit;
  const element = elements[index];
  if (!element) return null;
  const put = (next: Element[], tag: string | null = null) =>
    edit({ ...draft, circuit: { ...draft.circuit, elements: next } }, tag);
  const setName = (name: string) => {
    const { name: _before, ...rest } = element;
    put(replaceAt(elements, index, name === "" ? rest : { ...rest, name }), `elements.${index}.name`);
  };
  return (
    <Leaf name={pieceName(elements, index, lines)} notchX={notchX}>
      <div className="flex flex-wrap items-start gap-x-3 gap-y-2">
        <Field
          label="Piece"
          value={element.name ?? ""}
          placeholder={pieceName(elements, index, lines)}
          maxLength={80}
          disabled={!canEdit}
          className="w-28 phone:w-full"
          onChange={(event) => setName(event.target.value)}
        />
        <LeafForm<Element>
          fields={elementFields(element.kind)}
          edited={element}
          path={`elements.${index}`}
          write={(next, tag) => put(replaceAt(elements, index, next), tag)}
        />
        {figures && <Derived figures={figures} />}
        {canEdit && (
          <div className="ml-auto flex items-center gap-3 self-center phone:ml-0">
            {element.kind === "cable" && (
              <Button kind="quiet" onClick={() => put(split(elements, index))}>
                Split
              </Button>
            )}
            <InsertBefore index={index} insert={(added) => put(insertAt(elements, index, [added]))} />
            <Button kind="quiet" onClick={() => (put(removeAt(elements, index)), select(null))}>
              Remove
            </Button>
          </div>
        )}
      </div>
    </Leaf>
  );
}

function InsertBefore({ index, insert }: { index: number; insert: (element: Element) => void }) {
  const { draft, lines } = useRunEditor();
  const [isOpen, setOpen] = useState(false);
  const line = nearestLine(draft.circuit.elements, index, [...lines.keys()][0]);
  const { source } = draft.circuit;
  const reference = source.kind === "constant" && source.reOhm > 0 ? source.reOhm : 50;
  if (!isOpen)
    return (
      <Button kind="quiet" aria-expanded={false} onClick={() => setOpen(true)}>
        Insert before
      </Button>
    );
  return (
    <div role="group" aria-label="Insert before" className="flex flex-wrap items-center gap-2">
      {elementKinds.map(({ kind, label }) => (
        <Button
          key={kind}
          size="small"
          refused={!line && (kind === "cable" || kind === "stub") && "Choose a first cable for the run."}
          onClick={() => (insert(newElement(kind, line ?? { cableId: "" }, reference)), setOpen(false))}
        >
          {label}
        </Button>
      ))}
      <Button kind="quiet" size="small" onClick={() => setOpen(false)}>
        Cancel
      </Button>
    </div>
  );
}

function Derived({ figures }: { figures: PieceFigures }) {
  const wave = figures.electricalLength;
  const rows: [string, Shown][] = [
    ...(figures.delayS === null ? [] : ([["Delay", nanoseconds(figures.delayS, 2)]] as [string, Shown][])),
    ...(wave === null
      ? []
      : ([["Electrical length", { digits: significantDigits(wave, 4), unit: "λ", spoken: "wavelengths" }]] as [
          string,
          Shown,
        ][])),
    ["Matched loss", decibels(figures.matchedLossDb, 3)],
    ["Z at its input", impedance(figures.impedance)],
  ];
  return (
    <dl className="flex flex-wrap gap-x-4 gap-y-1 border-l border-rule pl-3 phone:border-0 phone:pl-0">
      {rows.map(([label, figure]) => (
        <div key={label}>
          <dt className="text-note text-ink-2">{label}</dt>
          <dd className="mt-1 text-body">
            <Figure {...figure} />
          </dd>
        </div>
      ))}
    </dl>
  );
}
