"use client";

import { useState } from "react";
import { useRunEditor } from "@/components/runs/run-editor";
import { Button } from "@/components/ui/button";
import { Field } from "@/components/ui/field";
import type { Target } from "@/lib/runs/schema";

interface Kind {
  label: (names: { sourceName: string; loadName: string }) => string;
  unit: string;
  quantity: Target["quantity"];
  at: "source" | "load" | null;
  bound: "atLeast" | "atMost";
  example: string;
}

const kinds: Kind[] = [
  {
    label: ({ sourceName }) => `Return loss at ${sourceName}, at least`,
    unit: "dB",
    quantity: "returnLoss",
    at: "source",
    bound: "atLeast",
    example: "14",
  },
  {
    label: ({ loadName }) => `VSWR at ${loadName}, at most`,
    unit: "",
    quantity: "vswr",
    at: "load",
    bound: "atMost",
    example: "1.5",
  },
  { label: () => "Total loss, at most", unit: "dB", quantity: "loss", at: null, bound: "atMost", example: "2.2" },
  {
    label: () => "Highest voltage, at most",
    unit: "V pk",
    quantity: "voltage",
    at: null,
    bound: "atMost",
    example: "300",
  },
];

function isOf(kind: Kind, target: Target): boolean {
  const place = target.plane && "at" in target.plane ? target.plane.at : "source";
  return target.quantity === kind.quantity && (kind.at === null || kind.at === place);
}

function withTarget(targets: readonly Target[], kind: Kind, value: number | null): Target[] {
  const others = targets.filter((target) => !isOf(kind, target));
  if (value === null) return others;
  return [...others, { quantity: kind.quantity, ...(kind.at && { plane: { at: kind.at } }), [kind.bound]: value }];
}

/** The least or greatest values a run must keep. An empty field is no target. */
export function TargetList() {
  const [isOpen, setOpen] = useState(false);
  return (
    <div>
      <Button size="small" aria-expanded={isOpen} onClick={() => setOpen(!isOpen)}>
        {isOpen ? "Close targets" : "Targets"}
      </Button>
      {isOpen && (
        <div className="mt-2 flex flex-wrap gap-3">
          {kinds.map((kind) => (
            <TargetField key={`${kind.quantity}-${kind.at}`} kind={kind} />
          ))}
        </div>
      )}
    </div>
  );
}

function TargetField({ kind }: { kind: Kind }) {
  const { draft, edit, canEdit, faults, setFault } = useRunEditor();
  const path = `targets.${kind.quantity}.${kind.at ?? "run"}`;
  const set = draft.targets.find((target) => isOf(kind, target))?.[kind.bound];
  const [text, setText] = useState(faults[path]?.text ?? (set === undefined ? "" : String(set)));
  function take(next: string) {
    setText(next);
    const value = next.trim() === "" ? null : Number(next.replace(",", "."));
    const isWrong = value !== null && !(value >= (kind.quantity === "vswr" ? 1 : 0) && value < 1e9);
    setFault(
      path,
      isWrong
        ? { text: next, message: kind.quantity === "vswr" ? "A number of 1 or more." : "A number of 0 or more." }
        : null,
    );
    if (!isWrong) edit({ ...draft, targets: withTarget(draft.targets, kind, value) }, path);
  }
  return (
    <Field
      label={kind.label(draft)}
      unit={kind.unit}
      isFigure
      inputMode="decimal"
      placeholder="none"
      value={text}
      disabled={!canEdit}
      error={faults[path]?.message}
      className="w-46 phone:w-full"
      onChange={(event) => take(event.target.value)}
    />
  );
}
