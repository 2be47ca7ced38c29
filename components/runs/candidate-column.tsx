"use client";

import { CutDrawing } from "@/components/line/cut-drawing";
import { isBest, rowsOf } from "@/components/runs/candidate-rows";
import { letterOf, lookOf, SeriesSwatch } from "@/components/runs/series-swatch";
import { stripEnds } from "@/components/runs/strip-pieces";
import { useRunEditor } from "@/components/runs/run-editor";
import { useKeeping } from "@/components/runs/use-keeping";
import { Button } from "@/components/ui/button";
import { Figure } from "@/components/ui/figure";
import { StateMark } from "@/components/ui/state-mark";
import { digits, significantDigits } from "@/lib/format/quantity";
import type { Element, Line } from "@/lib/line/element";
import type { Candidate } from "@/lib/line/match/match-request";
import { cutSentence } from "@/lib/runs/match-cuts";
import type { AtLimits } from "@/lib/runs/match-limits";
import type { MatchAsked } from "@/lib/runs/matching";

interface Props {
  candidate: Candidate;
  /** 0 to 3: its letter and its look */
  place: number;
  others: Candidate[];
  /** of the others, in their order */
  limits: (AtLimits | null)[];
  candidates: Candidate[];
  asked: MatchAsked;
}

/** One way to match: its cut drawing, its figures, what it needs, and keeping it. */
export function CandidateColumn({ candidate, place, others, limits, candidates, asked }: Props) {
  const { draft, lines } = useRunEditor();
  const keeping = useKeeping(candidates, asked.behind.length);
  const isKept = keeping.isKept(candidate);
  const [kind, detail] = splitTitle(candidate.title);
  const letter = letterOf(place);
  const hasLimits = limits.some((each) => each !== null);
  const columns = others.map((other, i) => rowsOf(other, asked, hasLimits ? (limits[i] ?? null) : undefined));
  const cableOf = (line: Line) => (line.cableId === undefined ? undefined : lines.get(line.cableId));
  const onward = firstLine(asked.behind);
  const isMet = (candidate.worstReturnLossDb ?? Infinity) >= asked.returnLossDb;
  const target = significantDigits(asked.returnLossDb, 3);
  return (
    <article
      aria-label={`${letter}: ${candidate.title}`}
      className={`flex min-w-0 flex-col border-t-[1.5px] pt-1.75 ${isKept ? "border-copper border-t-[3px] pt-1.25" : "border-ink"}`}
    >
      <div className="flex items-baseline gap-2.5">
        <SeriesSwatch look={lookOf(place)} />
        <h2>
          {letter}&ensp;{kind}
        </h2>
      </div>
      <p className="min-h-10 pt-1 text-label text-ink-2">{detail}</p>
      <CutDrawing
        elements={candidate.elements}
        load={stripEnds(draft).load.kind}
        cableOf={cableOf}
        onward={onward && cableOf(onward)}
        name={candidate.title}
      />
      <dl className="mt-2">
        {(columns[place] ?? []).map((row, i) => {
          const best = isBest(row, i, columns);
          return (
            <div
              key={row.label}
              className="flex items-baseline justify-between gap-3 border-b border-line py-1.25 text-body"
            >
              <dt className="text-ink-2">{row.label}</dt>
              <dd className="whitespace-nowrap">
                {best && <span className="mr-2 text-note font-[560] text-copper">best</span>}
                <Figure {...row.figure} isStrong={best} unitSlot={2.6} />
              </dd>
            </div>
          );
        })}
        <div className="flex items-baseline justify-between gap-3 py-1.25 text-label">
          <dt className="text-ink-2">Needs</dt>
          <dd className="text-right">{candidate.needs.join(", ")}</dd>
        </div>
      </dl>
      <details className="mb-2 text-label text-ink-2">
        <summary className="link w-fit">Before you cut</summary>
        <ul className="mt-1 flex flex-col gap-1">
          {candidate.cuts.map((cut, i) => (
            <li key={i}>{cutSentence(cut)}</li>
          ))}
          {candidate.notes.map((note) => (
            <li key={note}>{note}</li>
          ))}
          <li>
            Stub ends and parts can carry far more than the feeder&rsquo;s voltage: power off before touching, and check
            each rating.
          </li>
        </ul>
      </details>
      <div className="mt-auto flex flex-wrap items-center justify-between gap-2 pt-1">
        <StateMark state={isMet ? "pass" : "fail"}>
          {isMet ? `keeps ${target} dB` : `misses ${target} dB: ${digits(candidate.worstReturnLossDb, 1)}`}
        </StateMark>
        {isKept ? (
          <span className="flex items-center gap-3">
            <span className="text-label font-[560] text-copper">✓ Chosen for this run</span>
            {keeping.canEdit && (
              <Button kind="quiet" size="small" onClick={keeping.takeOut}>
                Take out
              </Button>
            )}
          </span>
        ) : (
          <Button size="small" refused={keeping.cannotEditBecause} onClick={() => keeping.keep(candidate)}>
            Choose {letter}
          </Button>
        )}
      </div>
    </article>
  );
}

/** The cable that leads on from a match before some of the run. */
function firstLine(behind: readonly Element[]): Line | undefined {
  return behind.find((element) => element.kind === "cable")?.line;
}

/** "Shorted stub, 951 mm of C50-F10 …" is a kind and its detail. */
function splitTitle(title: string): [string, string] {
  const comma = title.indexOf(", ");
  return comma < 0 ? [title, ""] : [title.slice(0, comma), title.slice(comma + 2)];
}
