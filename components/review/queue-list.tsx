import type { Route } from "next";
import Link from "next/link";
import { ago } from "@/components/review/ago";
import { enlargementFor } from "@/components/cables/section-parts";
import { cableShape } from "@/components/line/cable-shape";
import { SectionView } from "@/components/line/section-view";
import { Section } from "@/components/ui/section";
import { StateMark } from "@/components/ui/state-mark";
import type { DueEntry, ReviewQueue, SettledRevision, WaitingRevision } from "@/lib/cables/queue/schema";

const room = 28;

function Waiting({
  item,
  isShown,
  mmToPx,
  now,
}: {
  item: WaitingRevision;
  isShown: boolean;
  mmToPx: number;
  now: string;
}) {
  const { cableId, designation, revision, changedFields, authorName, submittedAt, ...drawn } = item;
  const fields = changedFields === 1 ? "1 field" : `${changedFields} fields`;
  return (
    <li className={`border-b border-line ${isShown ? "border-l-2 border-l-copper bg-copper-wash" : ""}`}>
      <Link
        href={`/review?cable=${encodeURIComponent(cableId)}` as Route}
        aria-current={isShown ? "true" : undefined}
        className="flex min-h-14 items-center gap-3 px-3 py-2 text-ink no-underline hover:bg-sailcloth"
      >
        <SectionView {...drawn} mmToPx={mmToPx} box={room + 4} />
        <span className="min-w-0 flex-1">
          <b className="block truncate text-body">{designation}</b>
          <span className="text-label text-ink-2">
            {changedFields === null ? "New entry" : `Revision ${revision}, ${fields}`}
          </span>
        </span>
        <span className="text-right text-label text-ink-2">
          {authorName}
          <br />
          <time dateTime={submittedAt}>{ago(submittedAt, now)}</time>
        </span>
      </Link>
    </li>
  );
}

function Settled({ item }: { item: SettledRevision }) {
  const isApproved = item.step === "approve";
  return (
    <li className="flex justify-between gap-3 border-b border-line py-1.25 text-label">
      <span className="min-w-0">
        <Link href={`/cables/${encodeURIComponent(item.cableId)}` as Route} prefetch={false} className="link">
          {item.designation}
        </Link>
        , revision {item.revision}
        <br />
        <span className="text-ink-2">by {item.personName}</span>
      </span>
      <span className="text-right">
        <StateMark state={isApproved ? "pass" : "fail"}>{isApproved ? "Approved" : "Returned"}</StateMark>
        <br />
        <time dateTime={item.at} className="text-ink-2">
          {item.at.slice(0, 10)}
        </time>
      </span>
    </li>
  );
}

function Due({ item }: { item: DueEntry }) {
  return (
    <li className="flex justify-between gap-3 border-b border-line py-1.25 text-label">
      <Link href={`/cables/${encodeURIComponent(item.cableId)}` as Route} prefetch={false} className="link">
        {item.designation}
      </Link>
      <span className={item.isOverdue ? "text-warn" : "text-ink-2"}>
        {item.isOverdue ? "overdue since" : "by"} {item.reviewDueAt.slice(0, 10)}
      </span>
    </li>
  );
}

interface Props {
  queue: ReviewQueue;
  /** id of the cable whose revision is shown */
  shown: string | null;
  /** ISO 8601 */
  now: string;
}

/** What waits, the longest first; what was settled lately; what is due and what was reported. */
export function QueueList({ queue, shown, now }: Props) {
  const { waiting, settled, due, reports } = queue;
  const outer = Math.max(1, ...waiting.map((item) => cableShape(item)?.outerMm ?? 0));
  const { mmToPx } = enlargementFor(outer, room);
  return (
    <div className="flex flex-col gap-7 phone:contents">
      <ul aria-label="Waiting for a reviewer" className="border-t-[1.5px] border-ink">
        {waiting.map((item) => (
          <Waiting key={item.cableId} {...{ item, mmToPx, now }} isShown={item.cableId === shown} />
        ))}
      </ul>
      <div className="flex flex-col gap-7 phone:order-last">
        {reports.length > 0 && (
          <Section title="Problems reported" rule="light">
            <ul>
              {reports.map(({ id, cableId, designation, personName, text }) => (
                <li key={id} className="border-b border-line py-1.25 text-label">
                  <Link href={`/cables/${encodeURIComponent(cableId)}` as Route} prefetch={false} className="link">
                    {designation}
                  </Link>
                  <span className="text-ink-2">, {personName}</span>
                  <p className="break-words">{text}</p>
                </li>
              ))}
            </ul>
          </Section>
        )}
        {due.length > 0 && (
          <Section title="Due for another look" rule="light">
            <ul>
              {due.map((item) => (
                <Due key={item.cableId} item={item} />
              ))}
            </ul>
          </Section>
        )}
        {settled.length > 0 && (
          <Section title="Settled lately" rule="light">
            <ul>
              {settled.map((item) => (
                <Settled key={`${item.cableId} ${item.at} ${item.step}`} item={item} />
              ))}
            </ul>
          </Section>
        )}
      </div>
    </div>
  );
}
