"use client";

import { useInfiniteQuery } from "@tanstack/react-query";
import { useState, useSyncExternalStore } from "react";
import { Button, ButtonLink } from "@/components/ui/button";
import { Field } from "@/components/ui/field";
import { RunRows } from "@/components/runs/run-rows";
import { StateNote } from "@/components/ui/state-mark";
import { Select } from "@/components/ui/select";
import { call } from "@/lib/http/call";
import { countHeld } from "@/lib/runs/held";
import type { RunPage } from "@/lib/runs/query";
import type { RunState } from "@/lib/runs/schema";

interface Props {
  /** who is looking: what their browser holds is theirs */
  personId: string;
  first: RunPage;
  canStart: boolean;
}

/** What is held changes only on the run's own page, so a look when the list is drawn is enough. */
const noChange = () => () => undefined;

const stateChoices: { value: RunState | ""; label: string }[] = [
  { value: "", label: "Every state" },
  { value: "draft", label: "Draft" },
  { value: "issued", label: "Issued" },
  { value: "verified", label: "Verified" },
];

function address(q: string, state: RunState | "", cursor: string): string {
  const parameters = new URLSearchParams();
  if (q.trim()) parameters.set("q", q.trim());
  if (state) parameters.set("state", state);
  if (cursor) parameters.set("cursor", cursor);
  return parameters.size > 0 ? `/runs?${parameters}` : "/runs";
}

/** The runs of a team, the latest changed first. */
export function RunList({ personId, first, canStart }: Props) {
  const held = useSyncExternalStore(
    noChange,
    () => countHeld(personId),
    () => 0,
  );
  const [q, setQ] = useState("");
  const [state, setState] = useState<RunState | "">("");
  const isWhole = q.trim() === "" && state === "";
  const pages = useInfiniteQuery({
    queryKey: ["runs", "list", q.trim(), state],
    queryFn: ({ pageParam, signal }) => call<RunPage>(address(q, state, pageParam), { signal }),
    initialPageParam: "",
    getNextPageParam: (page) => page.nextCursor,
    initialData: isWhole ? { pages: [first], pageParams: [""] } : undefined,
    placeholderData: (before) => before,
    refetchOnMount: "always",
  });
  const runs = pages.data?.pages.flatMap((page) => page.items) ?? [];
  const total = pages.data?.pages[0]?.total;
  return (
    <>
      <div className="flex flex-wrap items-end gap-x-6 gap-y-3">
        <h1 className="w-50 phone:sr-only">Runs</h1>
        <Field
          label="Find a run"
          isLabelHidden
          type="search"
          placeholder="Number, name, site or folder"
          value={q}
          maxLength={120}
          onChange={(event) => setQ(event.target.value)}
          className="w-80 phone:w-full"
        />
        <Select
          label="State"
          isLabelHidden
          value={state}
          onChange={(event) => setState(event.target.value as RunState | "")}
          className="w-36"
        >
          {stateChoices.map(({ value, label }) => (
            <option key={value} value={value}>
              {label}
            </option>
          ))}
        </Select>
        <p role="status" className="pb-1.5 text-label text-ink-2">
          {total !== undefined && (
            <>
              <b className="figures text-ink">{total}</b> {total === 1 ? "run" : "runs"}
            </>
          )}
        </p>
        {canStart && (
          <ButtonLink href="/runs/new" kind="main" className="ml-auto">
            Start a run
          </ButtonLink>
        )}
      </div>
      {held > 0 && (
        <div className="mt-3">
          <StateNote state="none">
            <b>
              {held} {held === 1 ? "run has a change" : "runs have changes"} held in this browser.
            </b>{" "}
            Open {held === 1 ? "it" : "them"} and the change goes to the team. Nobody else can see it yet.
          </StateNote>
        </div>
      )}
      {pages.error && <p className="mt-3 text-fail">The list may be old: {pages.error.message}</p>}
      {runs.length > 0 && <RunRows runs={runs} />}
      {total === 0 &&
        (isWhole ? <NoRuns canStart={canStart} /> : <NoneFound showAll={() => (setQ(""), setState(""))} />)}
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

function NoneFound({ showAll }: { showAll: () => void }) {
  return (
    <p className="mt-8 text-row">
      No run fits.{" "}
      <button type="button" className="link" onClick={showAll}>
        Show every run
      </button>
    </p>
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
