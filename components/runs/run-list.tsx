"use client";

import { useInfiniteQuery } from "@tanstack/react-query";
import type { Route } from "next";
import Link from "next/link";
import { Button, ButtonLink } from "@/components/ui/button";
import { Figure } from "@/components/ui/figure";
import { StateMark, type MarkedState } from "@/components/ui/state-mark";
import { Cell, HeadCell, RowHead, Table } from "@/components/ui/table";
import { frequency, metres } from "@/lib/format/quantity";
import { call } from "@/lib/http/call";
import type { RunPage } from "@/lib/runs/query";
import type { RunItem, RunState } from "@/lib/runs/schema";
import { bandWords } from "@/lib/runs/sentences";

interface Props {
  first: RunPage;
  canStart: boolean;
}

const stateWords: Record<RunState, { mark: MarkedState; word: string }> = {
  draft: { mark: "none", word: "Draft" },
  issued: { mark: "pass", word: "Issued" },
  verified: { mark: "pass", word: "Verified" },
};

/** The runs of a team, the latest changed first. */
export function RunList({ first, canStart }: Props) {
  const pages = useInfiniteQuery({
    queryKey: ["runs"],
    queryFn: ({ pageParam, signal }) =>
      call<RunPage>(`/runs${pageParam ? `?cursor=${encodeURIComponent(pageParam)}` : ""}`, { signal }),
    initialPageParam: "",
    getNextPageParam: (page) => page.nextCursor,
    initialData: { pages: [first], pageParams: [""] },
    refetchOnMount: "always",
  });
  const runs = pages.data.pages.flatMap((page) => page.items);
  return (
    <>
      <div className="flex flex-wrap items-center justify-between gap-3">
        <h1 className="phone:sr-only">Runs</h1>
        {canStart && (
          <ButtonLink href="/runs/new" kind="main">
            Start a run
          </ButtonLink>
        )}
      </div>
      {pages.error && <p className="mt-3 text-fail">The list may be old: {pages.error.message}</p>}
      {runs.length === 0 ? <NoRuns canStart={canStart} /> : <Runs runs={runs} />}
      {pages.hasNextPage && (
        <Button
          className="mt-4"
          onClick={() => void pages.fetchNextPage()}
          refused={pages.isFetchingNextPage && "The next runs are on their way."}
        >
          Show more
        </Button>
      )}
    </>
  );
}

function Runs({ runs }: { runs: RunItem[] }) {
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

function NoRuns({ canStart }: { canStart: boolean }) {
  return (
    <div className="mt-10 max-w-140">
      <svg width="540" height="60" viewBox="0 0 540 60" aria-hidden="true" className="max-w-full">
        <circle cx="22" cy="30" r="15" fill="none" stroke="var(--ink)" strokeWidth="1.5" />
        <path d="M13 30c3-7 6-7 9 0s6 7 9 0" fill="none" stroke="var(--ink)" strokeWidth="1.5" />
        <path d="M37 30H60" stroke="var(--ink)" strokeWidth="1.5" />
        <rect
          x="60"
          y="17"
          width="420"
          height="26"
          fill="none"
          stroke="var(--rule)"
          strokeWidth="1.4"
          strokeDasharray="5 5"
        />
        <path d="M480 30H506V12M498 6L506 16L514 6" fill="none" stroke="var(--ink)" strokeWidth="1.5" />
      </svg>
      <p className="mt-3 text-row">
        {canStart
          ? "No run yet. A run starts with a source, a load and the first cable between them."
          : "No run has been given to you yet. When one is issued and assigned to you, it stands here."}
      </p>
    </div>
  );
}
