import type { Route } from "next";
import Link from "next/link";
import { Figure } from "@/components/ui/figure";
import { StateMark, type MarkedState } from "@/components/ui/state-mark";
import { Cell, HeadCell, RowHead, Table } from "@/components/ui/table";
import { frequency, metres } from "@/lib/format/quantity";
import type { RunItem, RunState } from "@/lib/runs/schema";
import { bandWords } from "@/lib/runs/sentences";

const stateWords: Record<RunState, { mark: MarkedState; word: string }> = {
  draft: { mark: "none", word: "Draft" },
  issued: { mark: "pass", word: "Issued" },
  verified: { mark: "pass", word: "Verified" },
};

/** The rows of the run list. */
export function RunRows({ runs }: { runs: RunItem[] }) {
  return (
    <Table className="mt-4">
      <thead className="phone:sr-only">
        <tr>
          <HeadCell className="w-16">Sheet</HeadCell>
          <HeadCell>Run</HeadCell>
          <HeadCell>Cables</HeadCell>
          <HeadCell isRight>Length</HeadCell>
          <HeadCell isRight>Band</HeadCell>
          <HeadCell className="pl-8">Owner</HeadCell>
          <HeadCell>State</HeadCell>
          <HeadCell isRight>Changed</HeadCell>
        </tr>
      </thead>
      <tbody>
        {runs.map((run) => (
          <RunRow key={run.id} run={run} />
        ))}
      </tbody>
    </Table>
  );
}

function RunRow({ run }: { run: RunItem }) {
  const { mark, word } = stateWords[run.state];
  const place = [run.site, run.folder].filter(Boolean).join(" / ");
  return (
    <tr className="hover:bg-sailcloth phone:grid phone:grid-cols-[1fr_auto] phone:border-b phone:border-line phone:py-2 [&>*]:phone:border-0 [&>*]:phone:p-0">
      <Cell className="figures phone:hidden">{run.number}</Cell>
      <RowHead className="py-2.5">
        <Link
          href={`/runs/${run.id}` as Route}
          className="flared text-row text-ink hover:text-copper phone:flex phone:min-h-11 phone:items-center"
        >
          <span className="hidden phone:mr-2 phone:inline">{run.number}</span>
          <span className="line-clamp-2 break-words">{run.name}</span>
        </Link>
        {place && <span className="block text-note text-ink-3">{place}</span>}
      </RowHead>
      <Cell className="max-w-80 text-label text-ink-2 phone:col-span-2 phone:row-start-2">
        {run.cables.join(", ") || "no cable yet"}
      </Cell>
      <Cell isRight className="phone:hidden">
        <Figure {...metres(run.totalLengthM)} />
      </Cell>
      <Cell isRight className="phone:hidden">
        {run.bandHz ? (
          <span className="figures">{bandWords(run.bandHz)}</span>
        ) : (
          <Figure {...frequency(run.designHz)} />
        )}
      </Cell>
      <Cell className="pl-8 phone:hidden">{run.ownerName}</Cell>
      <Cell>
        <StateMark state={run.condition ? "warn" : mark}>{word}</StateMark>
        {run.condition && <span className="block text-note text-ink-3">{run.condition}</span>}
      </Cell>
      <Cell isRight className="text-label text-ink-2 phone:hidden">
        <time dateTime={run.changedAt}>{run.changedAt.slice(0, 10)}</time>
      </Cell>
    </tr>
  );
}
