"use client";

import { Section } from "@/components/ui/section";
import { StateGlyph, StateNote } from "@/components/ui/state-mark";
import { Cell, HeadCell, RowHead, Table } from "@/components/ui/table";
import { digits, scaled, inWords } from "@/lib/format/quantity";
import type { Candidate, MatchMethod } from "@/lib/line/match/match-request";
import type { MatchesFound } from "@/lib/runs/matching";

export const methodWords: Record<MatchMethod, string> = {
  shuntStub: "Stub across the line",
  seriesStub: "Stub in the line",
  doubleStub: "Two stubs across the line",
  quarterWave: "Quarter-wave section",
  seriesSection: "Series section",
  parallelCables: "Cables in parallel",
  binomial: "Binomial transformer",
  equalRipple: "Equal-ripple transformer",
  alternatingSections: "Two alternating sections",
  lSection: "L-section",
  piNetwork: "Pi network",
  tNetwork: "T network",
  pad: "Resistive pad",
  notchStub: "Notch stub",
};

interface Props {
  found: MatchesFound;
  compared: Candidate[];
  toggle: (title: string) => void;
  refusal: string | null;
  returnLossDb: number;
}

/** Every way found, ranked, and every method that cannot work with its reason. */
export function CandidateList({ found, compared, toggle, refusal, returnLossDb }: Props) {
  const { candidates, refused, omitted } = found;
  return (
    <div className="mt-8 grid grid-cols-[minmax(0,1fr)_420px] gap-x-10 gap-y-8 folded:grid-cols-1">
      <Section
        title="All ways, best first"
        note="those that keep the asked return loss over the band, then by worst return loss, loss and bandwidth"
      >
        {refusal && (
          <div role="status" className="mt-2">
            <StateNote state="warn">{refusal}</StateNote>
          </div>
        )}
        <div className="overflow-x-auto">
          <Table className="mt-1">
            <thead>
              <tr>
                <HeadCell>
                  <span className="phone:sr-only">Compare</span>
                </HeadCell>
                <HeadCell>Match</HeadCell>
                <HeadCell isRight>Worst, dB</HeadCell>
                <HeadCell isRight className="phone:hidden">
                  Bandwidth
                </HeadCell>
                <HeadCell isRight>Lost, dB</HeadCell>
                <HeadCell isRight className="phone:hidden">
                  Cable, m
                </HeadCell>
              </tr>
            </thead>
            <tbody>
              {candidates.map((candidate) => (
                <Row
                  key={candidate.title}
                  candidate={candidate}
                  isCompared={compared.includes(candidate)}
                  toggle={toggle}
                  returnLossDb={returnLossDb}
                />
              ))}
            </tbody>
          </Table>
        </div>
        {omitted.map(({ method, count }) => (
          <p key={method} className="py-1 text-label text-ink-2">
            {methodWords[method]}: {count} more, worse than those above, are left out.
          </p>
        ))}
        {candidates.length === 0 && <p className="py-3 text-body">No way was found. The reasons stand beside.</p>}
      </Section>
      <Section title="What cannot work here">
        {refused.length === 0 && <p className="pt-2 text-label text-ink-2">Every method found a way.</p>}
        <dl className="mt-1">
          {refused.map(({ method, why }) => (
            <div key={method} className="border-b border-line py-2">
              <dt className="text-label font-[560]">{methodWords[method]}</dt>
              <dd className="text-label text-ink-2">{why}</dd>
            </div>
          ))}
        </dl>
      </Section>
    </div>
  );
}

interface RowProps {
  candidate: Candidate;
  isCompared: boolean;
  toggle: (title: string) => void;
  returnLossDb: number;
}

function Row({ candidate, isCompared, toggle, returnLossDb }: RowProps) {
  const isMet = (candidate.worstReturnLossDb ?? Infinity) >= returnLossDb;
  return (
    <tr className={isCompared ? "bg-copper-wash/60" : "hover:bg-sailcloth"}>
      <Cell>
        <input
          type="checkbox"
          aria-label={`Compare ${candidate.title}`}
          checked={isCompared}
          onChange={() => toggle(candidate.title)}
          className="ml-2 size-4 align-middle phone:size-6"
        />
      </Cell>
      <RowHead>
        {candidate.title}
        <span className="ml-2 text-note text-ink-3 phone:hidden">{methodWords[candidate.method]}</span>
      </RowHead>
      <Cell isRight className="figures whitespace-nowrap">
        <span className="mr-1.5 inline-block align-[-2px]">
          <StateGlyph state={isMet ? "pass" : "fail"} size={11} />
        </span>
        <span className="sr-only">{isMet ? "met: " : "missed: "}</span>
        {candidate.worstReturnLossDb === null ? "over 180" : digits(candidate.worstReturnLossDb, 1)}
      </Cell>
      <Cell isRight className="figures whitespace-nowrap phone:hidden">
        {inWords(scaled("frequency", candidate.bandwidthHz, 3))}
      </Cell>
      <Cell isRight className="figures">
        {digits(candidate.worstTransducerLossDb, 3)}
      </Cell>
      <Cell isRight className="figures phone:hidden">
        {candidate.totalLengthM > 0 ? digits(candidate.totalLengthM, 3) : ""}
      </Cell>
    </tr>
  );
}
