"use client";

import { CutDrawing } from "@/components/line/cut-drawing";
import { lookOf, SeriesSwatch } from "@/components/runs/series-swatch";
import { stripEnds } from "@/components/runs/strip-pieces";
import { useRunEditor } from "@/components/runs/run-editor";
import { useKeeping } from "@/components/runs/use-keeping";
import { Button } from "@/components/ui/button";
import { Figure } from "@/components/ui/figure";
import { StateMark } from "@/components/ui/state-mark";
import {
  decibels,
  digits,
  metres,
  ratio,
  scaled,
  significantDigits,
  type Figure as Shown,
} from "@/lib/format/quantity";
import type { Candidate } from "@/lib/line/match/match-request";
import { vswr } from "@/lib/line/reflection";
import type { MatchAsked } from "@/lib/runs/matching";

interface Props {
  candidate: Candidate;
  /** 0 to 3: its letter and its look */
  place: number;
  others: Candidate[];
  candidates: Candidate[];
  asked: MatchAsked;
}

/** A return loss as VSWR; a perfect match is 1. */
export function vswrOf(returnLossDb: number | null): number {
  return returnLossDb === null ? 1 : vswr(10 ** (-returnLossDb / 20));
}

interface Row {
  label: string;
  value: number;
  /** the smaller is the better, or the larger */
  better: "less" | "more";
  figure: Shown;
}

function rowsOf(candidate: Candidate, { returnLossDb }: MatchAsked): Row[] {
  const worst = vswrOf(candidate.worstReturnLossDb);
  const loss = candidate.worstTransducerLossDb ?? Infinity;
  return [
    { label: "Worst VSWR over the band", value: worst, better: "less", figure: ratio(worst) },
    {
      label: `Bandwidth at ${significantDigits(returnLossDb, 3)} dB`,
      value: candidate.bandwidthHz,
      better: "more",
      figure: scaled("frequency", candidate.bandwidthHz, 3),
    },
    { label: "Lost in the match", value: loss, better: "less", figure: decibels(candidate.worstTransducerLossDb, 3) },
    {
      label: "Return loss at the design frequency",
      value: candidate.designReturnLossDb ?? Infinity,
      better: "more",
      figure:
        candidate.designReturnLossDb === null
          ? { digits: "exact", unit: "", spoken: "" }
          : decibels(candidate.designReturnLossDb, 1),
    },
    {
      label: "Cable to cut",
      value: candidate.totalLengthM,
      better: "less",
      figure: candidate.totalLengthM > 0 ? metres(candidate.totalLengthM, 3) : { digits: "none", unit: "", spoken: "" },
    },
  ];
}

/** Best among those side by side, and not shared by all of them. */
function isBest(row: Row, index: number, columns: Row[][]): boolean {
  const values = columns.map((rows) => rows[index]?.value ?? NaN);
  const best = row.better === "less" ? Math.min(...values) : Math.max(...values);
  return columns.length > 1 && row.value === best && values.some((value) => value !== best);
}

/** One way to match: its cut drawing, its figures, what it needs, and keeping it. */
export function CandidateColumn({ candidate, place, others, candidates, asked }: Props) {
  const { draft, lines } = useRunEditor();
  const keeping = useKeeping(candidates);
  const isKept = keeping.isKept(candidate);
  const [kind, detail] = splitTitle(candidate.title);
  const letter = "ABCD"[place] ?? "";
  const columns = others.map((other) => rowsOf(other, asked));
  const isMet = (candidate.worstReturnLossDb ?? Infinity) >= asked.returnLossDb;
  const target = significantDigits(asked.returnLossDb, 3);
  return (
    <article
      aria-label={`${letter}: ${candidate.title}`}
      className={`flex min-w-0 flex-col border-t-[1.5px] pt-1.75 ${isKept ? "border-copper border-t-[3px] pt-1.25" : "border-ink"}`}
    >
      <div className="flex min-h-12 items-baseline gap-2.5">
        <SeriesSwatch look={lookOf(place)} />
        <h2>
          {letter}&ensp;{kind}
        </h2>
      </div>
      <p className="min-h-9 text-label text-ink-2">{detail}</p>
      <CutDrawing
        elements={candidate.elements}
        load={stripEnds(draft).load.kind}
        cableOf={(line) => (line.cableId === undefined ? undefined : lines.get(line.cableId))}
        name={candidate.title}
      />
      <dl className="mt-2">
        {rowsOf(candidate, asked).map((row, i) => {
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

/** "Shorted stub, 951 mm of C50-F10 …" is a kind and its detail. */
function splitTitle(title: string): [string, string] {
  const comma = title.indexOf(", ");
  return comma < 0 ? [title, ""] : [title.slice(0, comma), title.slice(comma + 2)];
}
