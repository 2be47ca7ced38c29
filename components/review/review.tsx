"use client";

import dynamic from "next/dynamic";
import type { Route } from "next";
import Link from "next/link";
import { ago } from "@/components/review/ago";
import { BeforeApproving } from "@/components/review/before-approving";
import { ChangedFields } from "@/components/review/changed-fields";
import { Decide } from "@/components/review/decide";
import { EffectOnRuns } from "@/components/review/effect-on-runs";
import { NewEntry } from "@/components/review/new-entry";
import { PairedSections } from "@/components/review/paired-sections";
import { QueueList } from "@/components/review/queue-list";
import { Talk } from "@/components/review/talk";
import { useDecision, type Refusals } from "@/components/review/use-decision";
import { stateWords } from "@/components/cables/words";
import { CursorProvider } from "@/components/plot/cursor";
import { Hook } from "@/components/ui/hook";
import type { ReviewQueue } from "@/lib/cables/queue/schema";
import type { CableRevision } from "@/lib/cables/revisions/schema";

const LossDifference = dynamic(
  () => import("@/components/review/loss-difference").then((file) => file.LossDifference),
  {
    ssr: false,
    loading: () => <div className="h-50" />,
  },
);

/** One revision in review, with what it takes the place of. */
export interface Reviewed {
  /** null for a new entry */
  before: CableRevision | null;
  after: CableRevision;
  refusals: Refusals;
}

interface Props {
  queue: ReviewQueue;
  reviewed: Reviewed | null;
  canDecide: boolean;
  /** when the page was made, ISO 8601 */
  now: string;
}

const lossAtHz = 100e6;

function Head({ queue, canDecide, now }: Pick<Props, "queue" | "canDecide" | "now">) {
  const { waiting, waitingTotal } = queue;
  const [oldest] = waiting;
  return (
    <div className="flex flex-wrap items-baseline gap-x-4 gap-y-1">
      <h1 className="phone:sr-only">Review</h1>
      <p className="text-ink-2">
        {oldest
          ? `${waitingTotal} waiting, oldest ${ago(oldest.submittedAt, now)}.`
          : "Nothing is waiting for a reviewer."}{" "}
        {canDecide ? "You cannot review your own changes." : "You are reading; your role decides nothing."}
      </p>
    </div>
  );
}

function Empty() {
  return (
    <div className="flex flex-wrap items-center gap-6 pt-6">
      <Hook />
      <p className="max-w-100 text-body">
        Nothing is in review. A draft comes here when its author sends it.{" "}
        <Link href={"/cables?state=draft" as Route} className="link">
          Drafts in the catalogue
        </Link>
      </p>
    </div>
  );
}

/** "approved 2026-01-19"; another state is named beside it. */
function standsSince({ state, approvedAt }: CableRevision): string {
  const word = stateWords[state].word.toLowerCase();
  if (!approvedAt) return word;
  const approved = `approved ${approvedAt.slice(0, 10)}`;
  return state === "approved" ? approved : `${word}, ${approved}`;
}

/** Which revisions are held side by side, who wrote them and why. */
function Standing({ before, after }: Reviewed) {
  const sent = (after.submittedAt ?? after.createdAt).slice(0, 10);
  return (
    <div className="border-t-[1.5px] border-ink pt-1.75">
      <div className="flex flex-wrap items-baseline justify-between gap-x-4">
        <h2>
          <Link href={`/cables/${encodeURIComponent(after.id)}` as Route} className="hover:text-copper">
            {after.designation}
          </Link>
        </h2>
        <p className="text-label text-ink-2">
          {before && `revision ${before.revision}, ${standsSince(before)}  →  `}
          revision {after.revision}, sent by {after.authorName} {sent}
        </p>
      </div>
      <p className="mt-1 text-body">{after.reason}</p>
    </div>
  );
}

function One({ before, after, refusals, canDecide }: Reviewed & { canDecide: boolean }) {
  const decision = useDecision(after, refusals);
  return (
    <>
      <div className="flex min-w-0 flex-col gap-6">
        <Standing {...{ before, after, refusals }} />
        <PairedSections before={before} after={after} />
        {before ? (
          <>
            <ChangedFields before={before} after={after} lossAtHz={lossAtHz} />
            <LossDifference before={before} after={after} />
          </>
        ) : (
          <NewEntry revision={after} />
        )}
      </div>
      <div className="flex min-w-0 flex-col gap-7 folded:col-start-2 phone:col-start-1">
        <EffectOnRuns cableId={after.id} revision={after.revision} />
        <Talk cableId={after.id} revision={after.revision} canSay={canDecide} />
        <BeforeApproving
          revision={after}
          decision={decision}
          condition={before?.condition ?? null}
          canDecide={canDecide}
        />
        {canDecide && <Decide revision={after.revision} decision={decision} />}
      </div>
    </>
  );
}

/** What waits for a reviewer, and one of it with all that a decision needs. */
export function Review({ queue, reviewed, canDecide, now }: Props) {
  return (
    <CursorProvider>
      <Head {...{ queue, canDecide, now }} />
      <div className="mt-6 grid grid-cols-[276px_minmax(0,1fr)_340px] gap-x-8 gap-y-7 folded:grid-cols-[276px_minmax(0,1fr)] phone:grid-cols-1">
        <div className="min-w-0 folded:row-span-2 phone:contents">
          <QueueList queue={queue} shown={reviewed?.after.id ?? null} now={now} />
        </div>
        {reviewed ? (
          <One key={`${reviewed.after.id} ${reviewed.after.version}`} {...reviewed} canDecide={canDecide} />
        ) : (
          <Empty />
        )}
      </div>
    </CursorProvider>
  );
}
