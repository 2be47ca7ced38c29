"use client";

import { useMemo } from "react";
import { useRunEditor } from "@/components/runs/run-editor";
import { pieceName } from "@/components/runs/strip-pieces";
import type { Matching } from "@/components/runs/use-matches";
import { Figure } from "@/components/ui/figure";
import { frequency, impedance, inWords, significantDigits } from "@/lib/format/quantity";
import { seenAt } from "@/lib/runs/matching";
import { bandWords } from "@/lib/runs/sentences";

/** What is matched, to what, and how many ways there are. */
export function MatchAskedFor({ matching }: { matching: Matching }) {
  const { draft, lines } = useRunEditor();
  const { asked, found } = matching;
  const { loadName, designHz, bandHz, circuit } = draft;
  const { elements } = circuit;
  const place = asked.behind.length;
  const seen = useMemo(() => seenAt(asked), [asked]);
  const what = place === 0 ? loadName : `Before ${pieceName(elements, elements.length - place, lines)} the run shows`;
  const count = found?.candidates.length ?? 0;
  const meets = found?.candidates.filter((c) => (c.worstReturnLossDb ?? Infinity) >= asked.returnLossDb).length ?? 0;
  return (
    <p className="max-w-140 pt-3.5 text-row text-ink-2 folded:pt-0">
      {what}{" "}
      {seen && (
        <b className="text-ink">
          <Figure {...impedance(seen)} />
        </b>
      )}{" "}
      at {inWords(frequency(designHz))}. {count} {count === 1 ? "way" : "ways"} to bring it to{" "}
      {significantDigits(asked.targetOhm, 3)} Ω; {meets} {meets === 1 ? "keeps" : "keep"}{" "}
      {significantDigits(asked.returnLossDb, 3)} dB over {bandHz ? bandWords(bandHz) : "the frequency"}.
    </p>
  );
}
