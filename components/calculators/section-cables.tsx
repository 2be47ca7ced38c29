"use client";

import { useQuery } from "@tanstack/react-query";
import { familyWords } from "@/components/cables/words";
import { SectionView } from "@/components/line/section-view";
import { Button } from "@/components/ui/button";
import { StateMark, StateNote } from "@/components/ui/state-mark";
import { Cell, HeadCell, RowHead, Table } from "@/components/ui/table";
import { rankedSections, sectionRequests, type SectionCandidate } from "@/lib/calculators/section-cables";
import type { CablePage } from "@/lib/cables/query";
import { digits } from "@/lib/format/quantity";
import { call } from "@/lib/http/call";

interface Props {
  neededOhm: number;
  sourceOhm: number;
  loadOhm: number;
}

/** Return loss from which a section is good for the job, dB. */
const goodDb = 20;

/** Whether the team has a cable for the section: the nearest ones, alone and two side by side. */
export function SectionCables({ neededOhm, sourceOhm, loadOhm }: Props) {
  const requests = sectionRequests(neededOhm);
  const search = useQuery({
    queryKey: ["cables", "section", ...requests.map(({ path }) => path)],
    queryFn: ({ signal }) =>
      Promise.all(
        requests.map(async ({ count, path }) => ({ count, items: (await call<CablePage>(path, { signal })).items })),
      ),
    placeholderData: (before) => before,
  });
  if (search.error)
    return (
      <div className="mt-2">
        <StateNote state="fail">The catalogue did not answer: {search.error.message}</StateNote>
        <Button size="small" className="mt-1" onClick={() => void search.refetch()}>
          Try again
        </Button>
      </div>
    );
  if (!search.data) return <p className="mt-2 text-label text-ink-2">Looking through your cables…</p>;
  const candidates = rankedSections(search.data, sourceOhm, loadOhm);
  return (
    <>
      <div className="mt-2">
        <Verdict best={candidates[0]} neededOhm={neededOhm} />
      </div>
      {candidates.length > 0 && <Candidates candidates={candidates} />}
    </>
  );
}

function Verdict({ best, neededOhm }: { best: SectionCandidate | undefined; neededOhm: number }) {
  const needed = `${digits(neededOhm, 1)}\u00a0Ω`;
  if (!best) return <StateNote state="none">There is no cable in your catalogue yet.</StateNote>;
  const name = best.count === 1 ? best.item.designation : `two of ${best.item.designation} side by side`;
  if (best.returnLossDb >= goodDb)
    return (
      <StateNote state="pass">
        Yes: {name}, {digits(best.sectionOhm, 1)}&nbsp;Ω for {needed}.
      </StateNote>
    );
  return (
    <StateNote state="warn">
      None comes near {needed}; {name} with {digits(best.sectionOhm, 1)}&nbsp;Ω is the nearest.
    </StateNote>
  );
}

function Candidates({ candidates }: { candidates: readonly SectionCandidate[] }) {
  return (
    <Table className="mt-1">
      <thead>
        <tr>
          <HeadCell aria-label="Drawing" className="w-9" />
          <HeadCell>Cable</HeadCell>
          <HeadCell isRight>section, Ω</HeadCell>
          <HeadCell isRight>reaches, dB</HeadCell>
        </tr>
      </thead>
      <tbody>
        {candidates.map(({ item, count, sectionOhm, returnLossDb }) => (
          <tr key={`${item.id} ${count}`}>
            <Cell>
              <span className="flex justify-center">
                <SectionView
                  construction={item.construction}
                  build={item.build}
                  outerDiameterMm={item.outerDiameterMm}
                  mmToPx={1}
                />
              </span>
            </Cell>
            <RowHead>
              {count === 1 ? item.designation : `2 × ${item.designation}`}
              <span className="ml-2 text-note text-ink-3">{familyWords[item.family].toLowerCase()}</span>
              {item.state === "restricted" && (
                <StateMark state="warn" className="ml-2">
                  restricted
                </StateMark>
              )}
            </RowHead>
            <Cell isRight className="figures">
              {digits(sectionOhm, 1)}
            </Cell>
            <Cell isRight className="figures">
              {Number.isFinite(returnLossDb) && returnLossDb < 60 ? digits(returnLossDb, 1) : "over 60"}
            </Cell>
          </tr>
        ))}
      </tbody>
    </Table>
  );
}
